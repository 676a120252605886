import 'server-only';
import { eq } from 'drizzle-orm';
import { cardEvents } from '@/db/schema/books';
import { applyRefund } from '@/lib/books/commands/refunds';
import type { CardEvent } from '@/lib/infra/cards';
import type { SystemCtx } from '@/lib/infra/context';
import { applyPayment } from './apply-payment';

/**
 * Takes one event of the card processor. Its id only saves work: it is written down after its news was applied, so that
 * an event whose handling failed is handled when it comes again.
 */
export async function receiveEvent(ctx: SystemCtx, event: CardEvent): Promise<void> {
  const known = await ctx.db.select({ id: cardEvents.id }).from(cardEvents).where(eq(cardEvents.id, event.id)).limit(1);
  if (known.length > 0) return;
  if (event.session) await applyPayment(ctx, event.session);
  if (event.refund) await applyRefund(ctx, event.refund);
  await ctx.db.insert(cardEvents).values({ id: event.id, kind: event.kind, objectId: event.objectId, receivedAt: ctx.now }).onConflictDoNothing();
}
