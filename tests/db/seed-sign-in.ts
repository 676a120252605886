import { verify } from '@node-rs/argon2';
import { eq } from 'drizzle-orm';
import { getDb } from '@/db/client';
import { accounts, passwords } from '@/db/schema/people';
import { firstOrNull } from '@/lib/core/only';

/** Whether an address and a password belong together. */
export async function signInWithPassword(email: string, password: string): Promise<boolean> {
  const row = firstOrNull(await getDb().select({ hash: passwords.hash }).from(passwords).innerJoin(accounts, eq(accounts.id, passwords.accountId)).where(eq(accounts.email, email)));
  return row !== null && verify(row.hash, password.normalize('NFKC'));
}
