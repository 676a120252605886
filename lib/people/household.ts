import 'server-only';
import { and, desc, eq } from 'drizzle-orm';
import type { z } from 'zod';
import { contactDetails, households, people } from '@/db/schema/people';
import { recordChange } from '@/lib/club/commands';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { MemberCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import type { contactInput } from './schema';

/** The acting household and its people, the contact first, with how each is reached: only its own. One query. */
export async function myHousehold({ db, actor }: MemberCtx) {
  const rows = await db.select({
    household: households.name, memberNumber: households.memberNumber, joinedOn: households.joinedOn,
    id: people.id, givenName: people.givenName, familyName: people.familyName, age: people.age, isContact: people.isContact,
    email: contactDetails.email, phone: contactDetails.phone, street: contactDetails.street, town: contactDetails.town, postcode: contactDetails.postcode,
  })
    .from(people).innerJoin(households, eq(households.id, people.householdId)).leftJoin(contactDetails, eq(contactDetails.personId, people.id))
    .where(eq(people.householdId, actor.householdId)).orderBy(desc(people.isContact), people.age, people.givenName).limit(20);
  const first = rows[0];
  if (!first) throw new Refusal('not_found');
  return { name: first.household, memberNumber: first.memberNumber, joinedOn: first.joinedOn, people: rows };
}

/** Changes how one person of the acting household is reached. A stranger's person is not found. */
export async function saveContact(ctx: MemberCtx, input: z.output<typeof contactInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const person = firstOrNull(await tx.select({ id: people.id }).from(people)
      .where(and(eq(people.id, input.personId), eq(people.householdId, ctx.actor.householdId))).for('no key update'));
    if (!person) throw new Refusal('not_found');
    const values = { email: input.email, phone: input.phone, street: input.street, town: input.town, postcode: input.postcode };
    await tx.insert(contactDetails).values({ personId: person.id, ...values }).onConflictDoUpdate({ target: contactDetails.personId, set: values });
    await recordChange(tx, ctx, { action: 'changed contact details', subjectKind: 'person', subjectId: person.id }); // what they were stays out of the trail
  });
}
