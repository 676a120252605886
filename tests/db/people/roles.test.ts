import { and, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { auditTrail } from '@/db/schema/club';
import { letters } from '@/db/schema/letters';
import { rolesHeld } from '@/db/schema/people';
import { giveRole, inviteOfficer, takeRole } from '@/lib/people/commands/roles';
import { findAccountActor } from '@/lib/people/queries';
import { aClub, anAccount, ben, ctxOf, nell } from '@/tests/support/cast';

describe('giving and taking roles', () => {
  beforeAll(() => aClub());

  it('gives a role to an address, writes to them and keeps an audit line', async () => {
    const administrator = await nell();

    const accountId = await inviteOfficer(await ctxOf(administrator), { name: 'Ira', email: 'ira@testvalley.example', role: 'treasurer' });

    expect(await getDb().select({ role: rolesHeld.role }).from(rolesHeld).where(eq(rolesHeld.accountId, accountId))).toEqual([{ role: 'treasurer' }]);
    expect(await getDb().select({ id: letters.id }).from(letters).where(eq(letters.kind, 'invitation'))).toHaveLength(1);
    expect(await getDb().select({ by: auditTrail.accountId }).from(auditTrail).where(and(eq(auditTrail.action, 'gave a role'), eq(auditTrail.subjectId, accountId))))
      .toEqual([{ by: administrator.accountId }]);
  });

  it('says so when the role is held already, and leaves one row', async () => {
    const administrator = await nell();
    const member = await ben();
    await giveRole(await ctxOf(administrator), { accountId: member.accountId, role: 'secretary' });

    await expect(giveRole(await ctxOf(administrator), { accountId: member.accountId, role: 'secretary' })).rejects.toMatchObject({ code: 'role_held' });
  });

  it('takes a role at once: the next request finds it gone', async () => {
    const administrator = await nell();
    const officer = await anAccount('Cleo Once', ['coordinator']);

    await takeRole(await ctxOf(administrator), { accountId: officer.accountId, role: 'coordinator' });

    expect((await findAccountActor(getDb(), officer.signInId))?.roles).toEqual([]);
  });

  it('keeps one administrator, though two take each other’s role at the same moment', async () => {
    await getDb().update(rolesHeld).set({ takenAt: new Date() }).where(eq(rolesHeld.role, 'administrator'));
    const [first, second] = [await nell(), await nell()];
    const [asFirst, asSecond] = [await ctxOf(first), await ctxOf(second)];

    const outcomes = await Promise.allSettled([
      takeRole(asFirst, { accountId: second.accountId, role: 'administrator' }),
      takeRole(asSecond, { accountId: first.accountId, role: 'administrator' }),
    ]);

    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual(['fulfilled', 'rejected']);
  });
});
