import 'server-only';
import { eq } from 'drizzle-orm';
import type { Queryable } from '@/db/client';
import { openDays, stops } from '@/db/schema/opendays';
import { gateDevices, gatePasses } from '@/db/schema/people';
import { firstOrNull } from '@/lib/core/only';
import { Refusal } from '@/lib/core/refusal';
import type { GateActor } from '@/lib/infra/context';

/** The gate phone that a device key's hash belongs to; refuses an unknown or revoked pass, and one whose day is long over. */
export async function findGateActor(db: Queryable, keyHash: string, now: Date): Promise<GateActor> {
  const rows = await db.select({ deviceId: gateDevices.id, passId: gatePasses.id, stopId: stops.id, openDayId: stops.openDayId, revokedAt: gatePasses.revokedAt, closesAt: openDays.closesAt })
    .from(gateDevices)
    .innerJoin(gatePasses, eq(gatePasses.id, gateDevices.passId))
    .innerJoin(stops, eq(stops.id, gatePasses.stopId))
    .innerJoin(openDays, eq(openDays.id, stops.openDayId))
    .where(eq(gateDevices.keyHash, keyHash)).limit(1);
  const row = firstOrNull(rows);
  if (!row || now.getTime() > row.closesAt.getTime() + 36 * 3_600_000) throw new Refusal('pass_unknown');
  if (row.revokedAt !== null) throw new Refusal('pass_revoked');
  return { kind: 'gate', deviceId: row.deviceId, passId: row.passId, stopId: row.stopId, openDayId: row.openDayId };
}
