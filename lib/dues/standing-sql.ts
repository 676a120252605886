import 'server-only';
import { sql } from 'drizzle-orm';
import { charges, membershipClasses, terms } from '@/db/schema/dues';
import { payments } from '@/db/schema/books';
import { households } from '@/db/schema/people';
import type { Day } from '@/lib/core/time';
import type { Standing } from './rules/standing';

/** The last day that a household's terms pay for. */
export const termEnd = sql<string | null>`(select max(upper(${terms.during}) - 1)::text from ${terms} where ${terms.householdId} = ${households.id})`;

/** What a household owes over all its charges, less what has come. */
export const owedMinor = sql<number>`(select coalesce(sum(c.amount_minor - coalesce((select sum(p.amount_minor) from ${payments} p where p.charge_id = c.id), 0)), 0)::int
  from ${charges} c where c.household_id = ${households.id} and c.waived_at is null)`;

/** The class of a household's latest term, or of its latest charge. */
export const classKey = sql<string | null>`coalesce((select t.class_key from ${terms} t where t.household_id = ${households.id} order by upper(t.during) desc limit 1),
  (select c.class_key from ${charges} c where c.household_id = ${households.id} order by c.term_to desc limit 1))`;

/** The kind of a household's standing, for filters and counts: `standingOf`'s decision in SQL, held to it by a test. */
export const standingKind = (today: Day, keptOnDays: number) => sql<Standing['kind']>`case
  when ${households.leftOn} <= ${today}::date then 'left'
  when ${membershipClasses.isForLife} then 'life'
  when ${termEnd} is null then 'new'
  when ${termEnd}::date >= ${today}::date then 'paid'
  when ${termEnd}::date + 1 + ${keptOnDays}::int >= ${today}::date then 'kept'
  else 'lapsed' end`;
