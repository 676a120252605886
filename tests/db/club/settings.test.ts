import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { auditTexts, auditTrail } from '@/db/schema/club';
import { auditPage } from '@/lib/club/audit-queries';
import { getClub } from '@/lib/club/queries';
import { auditInput, settingsInput } from '@/lib/club/schema';
import { saveSettings } from '@/lib/club/settings';
import { only } from '@/lib/core/only';
import { aClub, ctxOf, nell } from '@/tests/support/cast';

const form = {
  name: 'Test Valley Garden Railway Society', footLine: 'founded in a shed', holdMinutes: '12', holdsMayBeExtended: 'on', partyPeopleMax: '9', partyVisitsMax: '7', addressReleaseHours: '72',
  changesEndMinutes: '60', duesKeptOnDays: '45', hourCycle: 'h23', visitRules: 'Stay on the path.', refundRules: [{ hoursBefore: '168', percent: '100' }, { hoursBefore: '1', percent: '50' }],
};

describe('the club\'s settings', () => {
  beforeAll(() => aClub());

  it('hold from the moment they are kept, with what was so before in the audit trail', async () => {
    const administrator = await nell();

    await saveSettings(await ctxOf(administrator), settingsInput.parse(form));

    expect(await getClub(getDb())).toMatchObject({ holdMinutes: 12, babesTakePlace: false, refundRules: [{ hoursBefore: 168, percent: 100 }, { hoursBefore: 1, percent: 50 }] });
    const line = only(await getDb().select({ by: auditTrail.accountId, before: auditTexts.before, after: auditTexts.after }).from(auditTrail).innerJoin(auditTexts, eq(auditTexts.lineId, auditTrail.id)).where(eq(auditTrail.action, 'changed the settings')));
    expect(line).toMatchObject({ by: administrator.accountId, before: { holdMinutes: 10 }, after: { holdMinutes: 12 } });
  });

  it('are all of one or all of the other when two are kept at the same moment', async () => {
    const ctx = await ctxOf(await nell());
    const [one, two] = [settingsInput.parse({ ...form, holdMinutes: '5', partyPeopleMax: '5' }), settingsInput.parse({ ...form, holdMinutes: '20', partyPeopleMax: '20' })];

    await Promise.all([saveSettings(ctx, one), saveSettings(ctx, two)]);

    const { holdMinutes, partyPeopleMax } = await getClub(getDb());
    expect(holdMinutes).toBe(partyPeopleMax);
  });

  it('take a refund step away when its boxes are emptied', () => {
    const read = settingsInput.parse({ ...form, refundRules: [...form.refundRules, { hoursBefore: '', percent: '' }] });

    expect(read.refundRules).toEqual([{ hoursBefore: 168, percent: 100 }, { hoursBefore: 1, percent: 50 }]);
    expect(settingsInput.safeParse({ ...form, refundRules: [{ hoursBefore: '24', percent: '' }] }).success).toBe(false);
  });

  it.each([
    { wrong: { holdMinutes: '0' }, field: 'holdMinutes' },
    { wrong: { holdMinutes: '61' }, field: 'holdMinutes' },
    { wrong: { partyVisitsMax: '15' }, field: 'partyVisitsMax' },
    { wrong: { refundRules: [{ hoursBefore: '1', percent: '50' }, { hoursBefore: '168', percent: '100' }] }, field: 'refundRules' },
    { wrong: { refundRules: [{ hoursBefore: '1', percent: '101' }] }, field: 'refundRules' },
  ])('are not kept with a wrong $field', ({ wrong, field }) => {
    const read = settingsInput.safeParse({ ...form, ...wrong });

    expect(read.success).toBe(false);
    expect(read.error?.issues.map((issue) => issue.path[0])).toContain(field);
  });

  it('show on the trail, found by what was done, in either order', async () => {
    const ctx = await ctxOf(await nell());
    await saveSettings(ctx, settingsInput.parse(form));

    const newest = await auditPage(ctx, auditInput.parse({ find: 'settings' }));
    const oldest = await auditPage(ctx, auditInput.parse({ find: 'settings', order: 'asc' }), 'all');

    expect(newest.total).toBe(newest.rows.length);
    expect(oldest.rows.map((row) => row.id)).toEqual(newest.rows.map((row) => row.id).reverse());
    expect((await auditPage(ctx, auditInput.parse({ find: '100 %' }))).total).toBe(0);
  });
});
