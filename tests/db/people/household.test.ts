import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { auditTexts, auditTrail } from '@/db/schema/club';
import { contactDetails, passwords } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import type { AccountActor, MemberActor } from '@/lib/infra/context';
import { accountPage } from '@/lib/people/account-queries';
import { setPassword } from '@/lib/people/commands/password';
import { myHousehold, saveContact } from '@/lib/people/household';
import { findHousehold } from '@/lib/people/roll-household';
import { ada, aClub, ben, ctxOf, dov, wren } from '@/tests/support/cast';
import { refusalOf } from '../bookings/hold-cast';

const asMember = ({ personId, householdId, ...actor }: AccountActor): MemberActor & { personId: Id<'person'> } => {
  if (personId === null || householdId === null) throw new Error('a member has a person and a household');
  return { ...actor, personId, householdId };
};
const details = { email: 'new@testvalley.example', phone: '0555 0111', street: '1 Mill Row', town: 'Alder Fork', postcode: 'AF1' };

describe('a household\'s own contact details', () => {
  beforeAll(() => aClub());

  it('are changed by one of its own, and stay out of the audit trail', async () => {
    const member = asMember(await ada());

    await saveContact(await ctxOf(member), { personId: member.personId, ...details });

    expect((await myHousehold(await ctxOf(member))).people).toMatchObject([{ email: 'new@testvalley.example', street: '1 Mill Row' }]);
    const lines = await getDb().select({ by: auditTrail.accountId, before: auditTexts.before, after: auditTexts.after }).from(auditTrail).innerJoin(auditTexts, eq(auditTexts.lineId, auditTrail.id)).where(eq(auditTrail.subjectId, member.personId));
    expect(lines).toEqual([{ by: member.accountId, before: null, after: null }]);
  });

  it('cannot be changed by a stranger, whose try changes nothing', async () => {
    const [member, stranger] = [asMember(await ada()), asMember(await ben())];

    expect(await refusalOf(saveContact(await ctxOf(stranger), { personId: member.personId, ...details, email: 'stolen@elsewhere.example' }))).toBe('not_found');

    const [kept] = await getDb().select({ email: contactDetails.email }).from(contactDetails).where(eq(contactDetails.personId, member.personId));
    expect(kept?.email).toBe(member.email);
  });

  it('are shown on the roll to the secretary, and not to the treasurer', async () => {
    const member = asMember(await ada());

    const [forSecretary, forTreasurer] = [await findHousehold(await ctxOf(await wren()), member.householdId), await findHousehold(await ctxOf(await dov()), member.householdId)];

    expect(forSecretary?.people[0]?.reached).toContain(member.email);
    expect(forTreasurer?.people[0]?.reached).toBeNull();
  });
});

describe('the account page', () => {
  beforeAll(() => aClub());

  it('says that one has a password only when it is one\'s own', async () => {
    const [member, other] = [await ada(), await ben()];
    await setPassword(await ctxOf(other), { password: 'four plain words together' });

    expect((await accountPage(await ctxOf(member))).hasPassword).toBe(false);
    expect((await accountPage(await ctxOf(other))).hasPassword).toBe(true);
    expect(await getDb().select({ id: passwords.accountId }).from(passwords)).toHaveLength(1);
  });
});
