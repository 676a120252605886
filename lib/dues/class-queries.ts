import 'server-only';
import { asc, sql } from 'drizzle-orm';
import { classDues, membershipClasses } from '@/db/schema/dues';
import { dayOf } from '@/lib/core/time';
import type { Actor, Ctx } from '@/lib/infra/context';

/** The membership classes with what each pays for a year now, in the club's order. One query. */
export async function membershipOffer({ db, now, club }: Ctx<Actor>) {
  const today = dayOf(now, club.timeZone);
  return db.select({
    key: membershipClasses.key, name: membershipClasses.name, about: membershipClasses.about, isForLife: membershipClasses.isForLife,
    amountMinor: sql<number | null>`(select d.amount_minor from ${classDues} d where d.class_key = ${membershipClasses.key} and d.from_on <= ${today}::date order by d.from_on desc limit 1)`,
  }).from(membershipClasses).orderBy(asc(membershipClasses.position)).limit(20);
}
