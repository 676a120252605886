import 'server-only';
import { and, asc, desc, eq, ilike, or, sql, type SQL } from 'drizzle-orm';
import { membershipClasses } from '@/db/schema/dues';
import { gardens } from '@/db/schema/gardens';
import { contactDetails, households, people } from '@/db/schema/people';
import { likeOf, PAGE_ROWS, type Listing } from '@/lib/core/listing';
import { dayOf } from '@/lib/core/time';
import type { AccountCtx } from '@/lib/infra/context';
import { may } from '@/lib/people/rules/capabilities';
import { standingOf, type Standing } from './rules/standing';
import type { RollFilter, RollSort } from './schema';
import { classKey, owedMinor, standingKind, termEnd } from './standing-sql';
import type { RollLine } from './views';

type Asked = Listing<RollSort> & { standing: RollFilter };

/** The most lines that one file of the roll holds. */
export const ROLL_FILE_ROWS = 20_000;

const railways = sql<string[]>`coalesce((select array_agg(g.railway_name order by g.railway_name) from ${gardens} g where g.household_id = ${households.id} and g.withdrawn_at is null), '{}')`;

const SORTS: Record<RollSort, SQL> = {
  name: sql`lower(${households.name})`,
  class: sql`${membershipClasses.position}`,
  since: sql`${households.joinedOn}`,
  number: sql`${households.memberNumber}`,
  owed: owedMinor,
};

/** One page of the roll (or all of it, for a file), with how many lines there are. One query. */
export async function rollLines(ctx: AccountCtx, asked: Asked, extent: 'page' | 'all' = 'page'): Promise<{ lines: RollLine[]; total: number }> {
  const { db, now, club } = ctx;
  const today = dayOf(now, club.timeZone);
  const order = SORTS[asked.sort];
  const limit = extent === 'page' ? PAGE_ROWS : ROLL_FILE_ROWS;
  const rows = await db.select({
    id: households.id, name: households.name, memberNumber: households.memberNumber, joinedOn: households.joinedOn, leftOn: households.leftOn,
    className: membershipClasses.name, isForLife: sql<boolean>`coalesce(${membershipClasses.isForLife}, false)`, termEnd, owedMinor, railways, total: sql<number>`count(*) over ()::int`,
  })
    .from(households).leftJoin(membershipClasses, eq(membershipClasses.key, classKey))
    .where(and(matching(asked.find, may(ctx.actor.roles, 'people.see')), asked.standing === 'all' ? undefined : eq(standingKind(today, club.duesKeptOnDays), asked.standing)))
    .orderBy(asked.order === 'asc' ? asc(order) : desc(order), asc(households.memberNumber))
    .limit(limit).offset(extent === 'page' ? (asked.page - 1) * PAGE_ROWS : 0);
  const lines = rows.map((row): RollLine => ({
    id: row.id, name: row.name, memberNumber: row.memberNumber, className: row.className ?? 'none yet', standing: standingOf(row, today, club.duesKeptOnDays),
    railways: row.railways, joinedOn: row.joinedOn, since: Number(row.joinedOn.slice(0, 4)), owedMinor: row.owedMinor,
  }));
  return { lines, total: rows[0]?.total ?? 0 };
}

/* By name, railway or number; by street and e-mail only for who may see them, or finding would tell where somebody lives. */
function matching(find: string, seesContacts: boolean): SQL | undefined {
  const like = likeOf(find);
  if (like === null) return undefined;
  return or(
    ilike(households.name, like),
    /^\d{1,6}$/.test(find) ? eq(households.memberNumber, Number(find)) : undefined,
    sql`exists (select from ${gardens} g where g.household_id = ${households.id} and g.railway_name ilike ${like})`,
    sql`exists (select from ${people} p where p.household_id = ${households.id} and p.given_name || ' ' || p.family_name ilike ${like})`,
    seesContacts ? sql`exists (select from ${people} p join ${contactDetails} c on c.person_id = p.id where p.household_id = ${households.id} and (c.email ilike ${like} or c.street ilike ${like}))` : undefined,
  );
}

/** How many households stand in each way, and how many people there are. One query. */
export async function rollSums({ db, now, club }: AccountCtx): Promise<{ households: number; people: number; by: Record<Standing['kind'], number> }> {
  const kind = standingKind(dayOf(now, club.timeZone), club.duesKeptOnDays);
  const rows = await db.select({ kind: kind.as('kind'), households: sql<number>`count(*)::int`, people: sql<number>`coalesce(sum((select count(*) from ${people} p where p.household_id = ${households.id})), 0)::int` })
    .from(households).leftJoin(membershipClasses, eq(membershipClasses.key, classKey)).groupBy(sql`1`);
  const by = { left: 0, life: 0, paid: 0, kept: 0, lapsed: 0, new: 0 };
  for (const row of rows) by[row.kind] = row.households;
  const members = rows.filter((row) => row.kind !== 'left');
  return { households: members.reduce((sum, row) => sum + row.households, 0), people: members.reduce((sum, row) => sum + row.people, 0), by };
}
