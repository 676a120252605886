import 'server-only';
import { asc, eq, sql } from 'drizzle-orm';
import { gardenPlants, gardens, plants } from '@/db/schema/gardens';
import { dayOf } from '@/lib/core/time';
import type { Ctx } from '@/lib/infra/context';
import { monthOf } from './rules/bloom';
import type { FlowerView } from './views';

/** What members' planting lists say is in flower today, the rarest first, at most four: for the foot of pages of no one garden. */
export async function inFlowerNow({ db, now, club }: Ctx): Promise<FlowerView[]> {
  const month = monthOf(dayOf(now, club.timeZone));
  const rows = await db.select({ plantKey: plants.drawing, name: plants.commonName })
    .from(plants).innerJoin(gardenPlants, eq(gardenPlants.plantKey, plants.key)).innerJoin(gardens, eq(gardens.id, gardenPlants.gardenId))
    .where(sql`${month} = any(${plants.bloomMonths}) and ${gardens.publishedAt} is not null and ${gardens.withdrawnAt} is null`)
    .groupBy(plants.key).orderBy(asc(sql`count(distinct ${gardens.id})`), asc(plants.commonName)).limit(4);
  return rows.map((row) => ({ ...row, name: row.name.toLowerCase(), gardens: [] }));
}
