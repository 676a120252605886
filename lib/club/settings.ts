import 'server-only';
import { sql } from 'drizzle-orm';
import type { z } from 'zod';
import { club } from '@/db/schema/club';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import { recordChange } from './commands';
import { getClub } from './queries';
import type { settingsInput } from './schema';

/** Changes the club's settings, with what was so before in the audit trail. Locks the club's row. */
export async function saveSettings(ctx: AccountCtx, input: z.output<typeof settingsInput>): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    await tx.execute(sql`select 1 from ${club} for no key update`);
    const before = await getClub(tx);
    await tx.update(club).set({
      name: input.name, footLine: input.footLine, holdMinutes: input.holdMinutes, holdsMayBeExtended: input.holdsMayBeExtended, partyPeopleMax: input.partyPeopleMax,
      partyVisitsMax: input.partyVisitsMax, babesTakePlace: input.babesTakePlace, addressReleaseHours: input.addressReleaseHours, changesEndMinutes: input.changesEndMinutes,
      duesKeptOnDays: input.duesKeptOnDays, hourCycle: input.hourCycle, visitRules: input.visitRules, refundRules: input.refundRules,
    });
    await recordChange(tx, ctx, { action: 'changed the settings', subjectKind: 'club', before: Object.fromEntries(Object.keys(input).map((key) => [key, Reflect.get(before, key)])), after: { ...input } });
  });
}
