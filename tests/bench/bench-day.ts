import { Client } from 'pg';

export type BenchDay = { openDayId: string; /** Entry time ids by garden, then by start, half an hour apart. */ times: string[][] };

/** An open day in four weeks with 12 gardens × 12 entry times of 500 places each, at half-hour starts; the gardens are the demo club's. */
export async function aBenchDay(url: string): Promise<BenchDay> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    const day = await client.query<{ id: string }>(`
      insert into open_days (slug, title, place_line, held_on, opens_at, closes_at, published_at)
      select 'bench-day', 'Bench Day', 'in the valley', on_day::date, on_day, on_day + interval '8 hours', now() - interval '1 day'
      from (select date_trunc('day', now()) + interval '28 days 15 hours' as on_day) d returning id`);
    const openDayId = day.rows[0]?.id ?? '';
    await client.query(`insert into stops (open_day_id, garden_id, number, stay_minutes, heads_limit)
      select $1, id, row_number() over (order by slug), 20, 100 from (select id, slug from gardens order by slug limit 12) g`, [openDayId]);
    await client.query(`insert into entry_times (stop_id, open_day_id, opens_at, grace_until, capacity)
      select s.id, s.open_day_id, o.opens_at + n * interval '30 minutes', o.opens_at + n * interval '30 minutes' + interval '15 minutes', 500
      from stops s join open_days o on o.id = s.open_day_id, generate_series(0, 11) n where s.open_day_id = $1`, [openDayId]);
    await client.query(`insert into prices (open_day_id, kind, amount_minor) values ($1, 'adult', 800), ($1, 'child', 400), ($1, 'babe', 0)`, [openDayId]);
    const { rows } = await client.query<{ times: string[] }>(`select array_agg(e.id order by e.opens_at) as times from entry_times e join stops s on s.id = e.stop_id where e.open_day_id = $1 group by s.number order by s.number`, [openDayId]);
    return { openDayId, times: rows.map((row) => row.times) };
  } finally {
    await client.end();
  }
}

/** How many entry times hold more than they may, or another number than their live visits say. */
export async function oversoldIn(url: string, openDayId: string): Promise<number> {
  const client = new Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query<{ wrong: number }>(`
    select count(*)::int as wrong from entry_times e
    left join (select v.entry_time_id, sum(v.heads)::int as heads from visits v join bookings b on b.id = v.booking_id where v.given_back_at is null and b.released_at is null group by 1) v on v.entry_time_id = e.id
    where e.open_day_id = $1 and (e.taken > e.capacity or coalesce(v.heads, 0) > e.capacity or e.taken <> coalesce(v.heads, 0))`, [openDayId]);
  await client.end();
  return rows[0]?.wrong ?? NaN;
}
