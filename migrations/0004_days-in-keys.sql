-- A day in the keys says what two triggers said before, and says it in fewer look-ups: a visit is on the day of its booking
-- and of its entry time, an entry time on the day of its stop.
ALTER TABLE "bookings" ADD CONSTRAINT "bookings_id_with_day" UNIQUE("id","open_day_id");--> statement-breakpoint
ALTER TABLE "entry_times" ADD CONSTRAINT "entry_times_id_with_day" UNIQUE("id","open_day_id");--> statement-breakpoint
ALTER TABLE "stops" ADD CONSTRAINT "stops_id_with_day" UNIQUE("id","open_day_id");--> statement-breakpoint
ALTER TABLE "visits" DROP CONSTRAINT "visits_booking_id_bookings_id_fk";--> statement-breakpoint
ALTER TABLE "visits" DROP CONSTRAINT "visits_open_day_id_open_days_id_fk";--> statement-breakpoint
ALTER TABLE "visits" DROP CONSTRAINT "visits_entry_time_id_entry_times_id_fk";--> statement-breakpoint
ALTER TABLE "entry_times" DROP CONSTRAINT "entry_times_stop_id_stops_id_fk";--> statement-breakpoint
ALTER TABLE "entry_times" DROP CONSTRAINT "entry_times_open_day_id_open_days_id_fk";--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_on_bookings_day" FOREIGN KEY ("booking_id","open_day_id") REFERENCES "public"."bookings"("id","open_day_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_on_times_day" FOREIGN KEY ("entry_time_id","open_day_id") REFERENCES "public"."entry_times"("id","open_day_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entry_times" ADD CONSTRAINT "entry_times_on_stops_day" FOREIGN KEY ("stop_id","open_day_id") REFERENCES "public"."stops"("id","open_day_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
DROP TRIGGER same_open_day ON "visits";--> statement-breakpoint
DROP TRIGGER same_open_day ON "entry_times";--> statement-breakpoint
DROP FUNCTION same_open_day();--> statement-breakpoint
-- All that the rules must know of some entry times, their open day, the club's settings for holds and the minutes between
-- the areas; null when there is no such day. A stop's own price counts before the open day's, and no price is nothing.
CREATE OR REPLACE FUNCTION wish_facts(p_open_day uuid, ids uuid[]) RETURNS json LANGUAGE plpgsql STABLE AS $$
BEGIN
  RETURN (SELECT json_build_object(
    'club', (SELECT json_build_object('timeZone', c.time_zone, 'locale', c.locale, 'hourCycle', c.hour_cycle, 'currency', c.currency, 'holdMinutes', c.hold_minutes,
      'partyPeopleMax', c.party_people_max, 'partyVisitsMax', c.party_visits_max, 'babesTakePlace', c.babes_take_place) FROM club c),
    'day', json_build_object('openDayId', d.id, 'publishedAt', d.published_at, 'calledOffAt', d.called_off_at, 'partyPeopleMax', d.party_people_max),
    'entries', (SELECT coalesce(json_agg(json_build_object(
        'entryTimeId', e.id, 'openDayId', e.open_day_id, 'gardenId', s.garden_id, 'gardenName', g.short_name, 'opensAt', e.opens_at, 'graceUntil', e.grace_until,
        'closedAt', e.closed_at, 'stopClosedAt', s.closed_at, 'stayMinutes', s.stay_minutes, 'adultMinor', p.adult, 'childMinor', p.child, 'babeMinor', p.babe)), '[]')
      FROM entry_times e JOIN stops s ON s.id = e.stop_id JOIN gardens g ON g.id = s.garden_id
      CROSS JOIN LATERAL (SELECT
          coalesce(max(q.amount_minor) FILTER (WHERE q.kind = 'adult' AND q.stop_id = s.id), max(q.amount_minor) FILTER (WHERE q.kind = 'adult' AND q.stop_id IS NULL), 0) AS adult,
          coalesce(max(q.amount_minor) FILTER (WHERE q.kind = 'child' AND q.stop_id = s.id), max(q.amount_minor) FILTER (WHERE q.kind = 'child' AND q.stop_id IS NULL), 0) AS child,
          coalesce(max(q.amount_minor) FILTER (WHERE q.kind = 'babe' AND q.stop_id = s.id), max(q.amount_minor) FILTER (WHERE q.kind = 'babe' AND q.stop_id IS NULL), 0) AS babe
        FROM prices q WHERE q.open_day_id = s.open_day_id AND (q.stop_id = s.id OR q.stop_id IS NULL)) p
      WHERE e.id = ANY (ids)),
    'minutes', CASE WHEN cardinality(ids) < 2 THEN '[]'::json ELSE (
      WITH asked AS (SELECT DISTINCT s.garden_id FROM entry_times e JOIN stops s ON s.id = e.stop_id WHERE e.id = ANY (ids))
      SELECT coalesce(json_agg(json_build_object('fromGardenId', m.from_garden_id, 'toGardenId', m.to_garden_id, 'minutes', m.minutes)), '[]')
      FROM asked a JOIN area_minutes m ON m.from_garden_id = a.garden_id JOIN asked b ON b.garden_id = m.to_garden_id) END)
    FROM open_days d WHERE d.id = p_open_day);
END $$;
