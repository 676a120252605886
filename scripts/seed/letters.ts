import { createHash } from 'node:crypto';
import type { letters, letterTexts, sendings } from '@/db/schema/letters';
import type { Id } from '@/lib/core/ids';
import { addMinutes } from '@/lib/core/time';
import type { LetterFacts, LetterKind } from '@/lib/letters/schema';
import { seedId } from './ids';

/** A letter of the demo club that was sent long since. `failedFirst`: the mail server was down at the first try. */
export type SeedLetter<K extends LetterKind = LetterKind> = {
  key: string; kind: K; to: { name: string; address: string }; at: Date; facts: LetterFacts<K>;
  openDayId?: Id<'openDay'>; bookingId?: Id<'booking'>; householdId?: Id<'household'>; failedFirst?: true;
};

export type LetterRows = { letters: (typeof letters.$inferInsert)[]; texts: (typeof letterTexts.$inferInsert)[]; sendings: (typeof sendings.$inferInsert)[] };

/** The rows of letters that were sent, each with its tries. */
export function letterRows(all: readonly SeedLetter[]): LetterRows {
  return {
    letters: all.map(({ key, kind, to, at, facts, openDayId, bookingId, householdId }) => ({
      id: seedId<'letter'>(`letter ${key}`), key, kind, madeAt: at, hash: createHash('sha256').update(JSON.stringify([key, kind, to, facts])).digest('base64url'),
      openDayId: openDayId ?? null, bookingId: bookingId ?? null, householdId: householdId ?? null,
    })),
    texts: all.map(({ key, to, facts }) => ({ letterId: seedId<'letter'>(`letter ${key}`), toName: to.name, toAddress: to.address, facts })),
    sendings: all.flatMap(({ key, at, failedFirst }) => {
      const letterId = seedId<'letter'>(`letter ${key}`);
      const tried = (minutes: number, outcome: 'sent' | 'failed', detail: string | null) => ({ id: seedId(`sending ${key} ${minutes}`), letterId, triedAt: addMinutes(at, minutes), outcome, detail });
      return failedFirst ? [tried(1, 'failed', 'the mail server did not answer'), tried(6, 'sent', null)] : [tried(1, 'sent', null)];
    }),
  };
}
