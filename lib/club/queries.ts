import 'server-only';
import type { Db, Queryable } from '@/db/client';
import { club } from '@/db/schema/club';
import type { ClubSettings } from '@/lib/infra/context';
import { firstOrNull } from '@/lib/core/only';

/** The club's settings; an empty database is a mistake in setting up, said so. */
export async function getClub(db: Queryable): Promise<ClubSettings> {
  const found = firstOrNull(await ('$client' in db ? prepared(db).execute() : db.select(settings).from(club).limit(1)));
  if (!found) throw new Error('The club is not set up: the table club is empty.');
  return found;
}

const settings = {
  name: club.name, footLine: club.footLine, email: club.email, timeZone: club.timeZone, currency: club.currency, locale: club.locale,
  hourCycle: club.hourCycle, holdMinutes: club.holdMinutes, holdsMayBeExtended: club.holdsMayBeExtended, partyPeopleMax: club.partyPeopleMax,
  partyVisitsMax: club.partyVisitsMax, babesTakePlace: club.babesTakePlace, addressReleaseHours: club.addressReleaseHours,
  changesEndMinutes: club.changesEndMinutes, refundRules: club.refundRules, duesKeptOnDays: club.duesKeptOnDays, visitRules: club.visitRules,
  coniferInk: club.coniferInk,
};

/** Every request begins with this one: the query is built once a process, and planned once a connection. */
const known = new WeakMap<Db, ReturnType<typeof prepare>>();
const prepare = (db: Db) => db.select(settings).from(club).limit(1).prepare('club');
function prepared(db: Db): ReturnType<typeof prepare> {
  const query = known.get(db) ?? prepare(db);
  known.set(db, query);
  return query;
}
