import 'server-only';
import { and, eq } from 'drizzle-orm';
import type { z } from 'zod';
import { prices, stops } from '@/db/schema/opendays';
import { recordChange } from '@/lib/club/commands';
import { parseMoney } from '@/lib/core/money';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import { PERSON_KINDS, type PersonKind } from '@/lib/core/words';
import type { AccountCtx } from '@/lib/infra/context';
import { inTransaction } from '@/lib/infra/transaction';
import type { stopPricesInput } from '../schema';

/** Sets what a visit costs at one stop; a kind left empty pays the open day's own price again. Places already kept keep theirs. */
export async function setStopPrices(ctx: AccountCtx, input: z.output<typeof stopPricesInput>): Promise<void> {
  const amounts = PERSON_KINDS.map((kind) => ({ kind, amountMinor: read(ctx, kind, input[kind]) }));
  await inTransaction(ctx.db, async (tx) => {
    const stop = firstOrNull(await tx.select({ openDayId: stops.openDayId }).from(stops).where(eq(stops.id, input.stopId)).for('no key update'));
    if (!stop) throw new Refusal('not_found');
    const before = await tx.select({ kind: prices.kind, amountMinor: prices.amountMinor }).from(prices).where(eq(prices.stopId, input.stopId));
    for (const { kind, amountMinor } of amounts) {
      if (amountMinor === null) await tx.delete(prices).where(and(eq(prices.stopId, input.stopId), eq(prices.kind, kind)));
      else {
        await tx.insert(prices).values({ openDayId: stop.openDayId, stopId: input.stopId, kind, amountMinor })
          .onConflictDoUpdate({ target: [prices.openDayId, prices.stopId, prices.kind], set: { amountMinor } });
      }
    }
    await recordChange(tx, ctx, { action: 'set a stop’s own prices', subjectKind: 'stop', subjectId: input.stopId, before: byKind(before), after: byKind(amounts) });
  });
}

function read({ club }: AccountCtx, kind: PersonKind, typed: string): number | null {
  if (typed === '') return null;
  const amountMinor = parseMoney(typed, club.currency);
  if (amountMinor === null) throw new Refusal('wrong_amount', { fields: { [kind]: 'Type a price like 8.00; 0 is free. Leave it empty for the day’s own.' } });
  return amountMinor;
}

const byKind = (rows: readonly { kind: PersonKind; amountMinor: number | null }[]) => Object.fromEntries(rows.map((row) => [row.kind, row.amountMinor]));
