import 'server-only';
import type { Tx } from '@/db/client';
import { auditTexts, auditTrail } from '@/db/schema/club';
import type { Actor } from '@/lib/infra/context';
import { only } from '@/lib/core/only';

/** What changed: the action in the words of a command, the row it touched, and what was so before and after. */
export type Change = {
  action: string;
  subjectKind: string;
  subjectId?: string;
  before?: Record<string, unknown>;
  after?: Record<string, unknown>;
};

/** Writes one audit line, in the transaction of the change itself. */
export async function recordChange(tx: Tx, { actor, now }: { actor: Actor; now: Date }, change: Change): Promise<void> {
  const line = only(await tx.insert(auditTrail).values({
    at: now,
    actorKind: actor.kind,
    accountId: actor.kind === 'account' ? actor.accountId : null,
    action: change.action,
    subjectKind: change.subjectKind,
    subjectId: change.subjectId ?? null,
  }).returning({ id: auditTrail.id }));
  await tx.insert(auditTexts).values({ lineId: line.id, before: change.before ?? null, after: change.after ?? null });
}
