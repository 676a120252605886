import 'server-only';
import type { Tx } from '@/db/client';
import { planChanges } from '@/db/schema/opendays';
import type { Id } from '@/lib/core/ids';
import type { AccountCtx } from '@/lib/infra/context';

type Note = { openDayId: Id<'openDay'>; stopId: Id<'stop'> | null; note: string };

/** Pencils a note with the officer's initials into an open day's margin, in the caller's transaction. */
export async function pencil(tx: Tx, { actor, now }: AccountCtx, { openDayId, stopId, note }: Note): Promise<void> {
  await tx.insert(planChanges).values({ openDayId, stopId, at: now, accountId: actor.accountId, initials: initialsOf(actor.name), note });
}

const initialsOf = (name: string): string => name.split(/\s+/).slice(0, 4).map((part) => `${Array.from(part)[0] ?? ''}.`).join(' ');
