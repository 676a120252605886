-- The hold's hot path in functions whose plans are kept: a function written in SQL alone is planned again at every call.
CREATE OR REPLACE FUNCTION move_places(ids uuid[], deltas integer[]) RETURNS integer LANGUAGE plpgsql AS $$
DECLARE answer integer;
BEGIN
  WITH wanted AS (SELECT w.id, sum(w.delta)::integer AS delta FROM unnest(ids, deltas) AS w(id, delta) GROUP BY w.id),
  locked AS MATERIALIZED (SELECT e.id FROM entry_times e WHERE e.id = ANY (ids) ORDER BY e.id FOR NO KEY UPDATE),
  moved AS (
    UPDATE entry_times e SET taken = e.taken + w.delta
    FROM locked l JOIN wanted w ON w.id = l.id
    WHERE e.id = l.id AND e.taken + w.delta <= e.capacity AND (w.delta <= 0 OR e.closed_at IS NULL)
    RETURNING e.id
  )
  SELECT count(*)::integer INTO answer FROM moved;
  RETURN answer;
END $$;--> statement-breakpoint

CREATE OR REPLACE FUNCTION ended_holds_at(ids uuid[], p_now timestamptz) RETURNS uuid[] LANGUAGE plpgsql STABLE AS $$
BEGIN
  RETURN (SELECT coalesce(array_agg(DISTINCT b.id), '{}') FROM visits v JOIN bookings b ON b.id = v.booking_id
    WHERE v.entry_time_id = ANY (ids) AND v.given_back_at IS NULL
      AND b.confirmed_at IS NULL AND b.released_at IS NULL AND b.held_until <= p_now
      AND NOT EXISTS (SELECT FROM payment_attempts a WHERE a.booking_id = b.id AND a.ended_at IS NULL));
END $$;--> statement-breakpoint

-- All that the rules must know of some entry times, their open day and the minutes between their areas; null when there
-- is no such day. A stop's own price counts before the open day's, and no price is nothing.
CREATE FUNCTION wish_facts(p_open_day uuid, ids uuid[]) RETURNS json LANGUAGE plpgsql STABLE AS $$
BEGIN
  RETURN (SELECT json_build_object(
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
