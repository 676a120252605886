import { and, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { auditTexts, auditTrail } from '@/db/schema/club';
import { gateDevices, gatePasses } from '@/db/schema/people';
import { addMinutes } from '@/lib/core/time';
import { findGateActor } from '@/lib/gate/access';
import { exchangePass, makeGatePass, revokeGatePass } from '@/lib/gate/commands';
import { hashSecret, newSecret } from '@/lib/infra/secrets';
import { newId } from '@/lib/core/ids';
import { aClub, anOpenDay, aStop, cleo, ctxOf, MAY_15, onTheDay } from '@/tests/support/cast';

const aPass = async (devices = 2) => {
  const day = await anOpenDay();
  const stop = await aStop(day.id);
  const office = await ctxOf(await cleo());
  const pass = await makeGatePass(office, { stopId: stop.id, helper: 'Gus', devices });
  return { stop, office, ...pass };
};

describe('a gate pass', () => {
  beforeAll(() => aClub());

  it('is made with its secret told once and only a hash kept, and the audit trail says for whom, never the secret', async () => {
    const { gatePassId, secret } = await aPass();

    const [row] = await getDb().select().from(gatePasses).where(eq(gatePasses.id, gatePassId));
    expect(row).toMatchObject({ helper: 'Gus', devicesAllowed: 2, revokedAt: null, secretHash: hashSecret(secret) });
    const [line] = await getDb().select({ after: auditTexts.after }).from(auditTrail).innerJoin(auditTexts, eq(auditTexts.lineId, auditTrail.id))
      .where(and(eq(auditTrail.action, 'made a gate pass'), eq(auditTrail.subjectId, gatePassId)));
    expect(line?.after).toMatchObject({ helper: 'Gus' });
    expect(JSON.stringify([row, line])).not.toContain(secret);
  });

  it('is for a stop that exists', async () => {
    const office = await ctxOf(await cleo());

    await expect(makeGatePass(office, { stopId: newId(), helper: 'Gus', devices: 1 })).rejects.toMatchObject({ code: 'not_found' });
  });

  it('makes a phone a device of its own stop and day', async () => {
    const { stop, office, secret } = await aPass();
    const deviceKey = newSecret();

    expect(await exchangePass(office, { secret, deviceKey })).toEqual({ number: 1 });

    expect(await findGateActor(getDb(), hashSecret(deviceKey), onTheDay(0))).toMatchObject({ kind: 'gate', stopId: stop.id });
  });

  it('costs one phone however often the same phone asks: its first answer may be lost', async () => {
    const { office, secret, gatePassId } = await aPass(1);
    const deviceKey = newSecret();

    await exchangePass(office, { secret, deviceKey });
    expect(await exchangePass(office, { secret, deviceKey })).toEqual({ number: 1 });

    expect(await getDb().select({ id: gateDevices.id }).from(gateDevices).where(eq(gateDevices.passId, gatePassId))).toHaveLength(1);
  });

  it('opens on as many phones as it allows and no more', async () => {
    const { office, secret } = await aPass(2);
    await exchangePass(office, { secret, deviceKey: newSecret() });
    expect(await exchangePass(office, { secret, deviceKey: newSecret() })).toEqual({ number: 2 });

    await expect(exchangePass(office, { secret, deviceKey: newSecret() })).rejects.toMatchObject({ code: 'pass_full' });
  });

  it('opens for one of 25 phones that ask for its last place at once, and tells the others so', async () => {
    const { office, secret } = await aPass(1);

    const outcomes = await Promise.all(Array.from({ length: 25 }, () => exchangePass(office, { secret, deviceKey: newSecret() }).then(() => 'opened', (error: { code: string }) => error.code)));

    expect(outcomes.sort()).toEqual(['opened', ...Array(24).fill('pass_full')]);
  });

  it('that nobody made opens nothing', async () => {
    const office = await ctxOf(await cleo());

    await expect(exchangePass(office, { secret: newSecret(), deviceKey: newSecret() })).rejects.toMatchObject({ code: 'pass_unknown' });
  });

  it('cannot be tried for ever', async () => {
    const office = await ctxOf(await cleo());
    const secret = newSecret();
    const tries = Array.from({ length: 31 }, () => exchangePass(office, { secret, deviceKey: newSecret() }).catch((error: { code: string }) => error.code));

    expect(await Promise.all(tries)).toContain('too_many_tries');
  });

  it('taken back opens nothing and refuses the phones it has, from the next request on', async () => {
    const { office, secret, gatePassId } = await aPass();
    const deviceKey = newSecret();
    await exchangePass(office, { secret, deviceKey });

    await revokeGatePass(office, { gatePassId, why: null });

    await expect(findGateActor(getDb(), hashSecret(deviceKey), onTheDay(0))).rejects.toMatchObject({ code: 'pass_revoked' });
    await expect(exchangePass(office, { secret, deviceKey: newSecret() })).rejects.toMatchObject({ code: 'pass_revoked' });
  });

  it('taken back twice is taken back once', async () => {
    const { office, gatePassId } = await aPass();
    await revokeGatePass(office, { gatePassId, why: null });

    await revokeGatePass({ ...office, now: addMinutes(office.now, 5) }, { gatePassId, why: null });

    expect(await getDb().select({ id: auditTrail.id }).from(auditTrail).where(and(eq(auditTrail.action, 'took a gate pass back'), eq(auditTrail.subjectId, gatePassId)))).toHaveLength(1);
  });

  it('is over when its day is long over', async () => {
    const { office, secret } = await aPass();
    const deviceKey = newSecret();
    await exchangePass(office, { secret, deviceKey });

    await expect(findGateActor(getDb(), hashSecret(deviceKey), addMinutes(MAY_15.closesAt, 60 * 24 * 3))).rejects.toMatchObject({ code: 'pass_unknown' });
  });
});
