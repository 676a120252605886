-- All that the rules must know of some entry times, their open day, the club's settings for holds and the minutes between
-- the areas; null when there is no such day. The day's prices are handed over as they are: which of them counts at a stop
-- is a rule, and working it out here took longer than all the rest.
CREATE OR REPLACE FUNCTION wish_facts(p_open_day uuid, ids uuid[]) RETURNS json LANGUAGE plpgsql STABLE AS $$
BEGIN
  RETURN (SELECT json_build_object(
    'club', (SELECT json_build_object('timeZone', c.time_zone, 'locale', c.locale, 'hourCycle', c.hour_cycle, 'currency', c.currency, 'holdMinutes', c.hold_minutes,
      'partyPeopleMax', c.party_people_max, 'partyVisitsMax', c.party_visits_max, 'babesTakePlace', c.babes_take_place) FROM club c),
    'day', json_build_object('openDayId', d.id, 'publishedAt', d.published_at, 'calledOffAt', d.called_off_at, 'partyPeopleMax', d.party_people_max),
    'entries', (SELECT coalesce(json_agg(json_build_object(
        'entryTimeId', e.id, 'openDayId', e.open_day_id, 'gardenId', s.garden_id, 'gardenName', g.short_name, 'opensAt', e.opens_at, 'graceUntil', e.grace_until,
        'closedAt', e.closed_at, 'stopClosedAt', s.closed_at, 'stayMinutes', s.stay_minutes, 'stopId', s.id)), '[]')
      FROM entry_times e JOIN stops s ON s.id = e.stop_id JOIN gardens g ON g.id = s.garden_id
      WHERE e.id = ANY (ids)),
    'prices', (SELECT coalesce(json_agg(json_build_object('stopId', q.stop_id, 'kind', q.kind, 'amountMinor', q.amount_minor)), '[]') FROM prices q WHERE q.open_day_id = d.id),
    'minutes', CASE WHEN cardinality(ids) < 2 THEN '[]'::json ELSE (
      WITH asked AS (SELECT DISTINCT s.garden_id FROM entry_times e JOIN stops s ON s.id = e.stop_id WHERE e.id = ANY (ids))
      SELECT coalesce(json_agg(json_build_object('fromGardenId', m.from_garden_id, 'toGardenId', m.to_garden_id, 'minutes', m.minutes)), '[]')
      FROM asked a JOIN area_minutes m ON m.from_garden_id = a.garden_id JOIN asked b ON b.garden_id = m.to_garden_id) END)
    FROM open_days d WHERE d.id = p_open_day);
END $$;
