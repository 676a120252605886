-- Places are moved in one way only: the rows locked first, in id order, then all of them changed at once. A plain
-- multi-row update promises no lock order and deadlocks. Answers how many entry times could be moved; fewer than asked
-- means that some were too full or closed, and the caller rolls back.
CREATE FUNCTION move_places(ids uuid[], deltas integer[]) RETURNS integer LANGUAGE sql AS $$
  WITH wanted AS (SELECT id, sum(delta)::integer AS delta FROM unnest(ids, deltas) AS w(id, delta) GROUP BY id),
  locked AS MATERIALIZED (SELECT e.id FROM entry_times e WHERE e.id = ANY (ids) ORDER BY e.id FOR NO KEY UPDATE),
  moved AS (
    UPDATE entry_times e SET taken = e.taken + w.delta
    FROM locked l JOIN wanted w ON w.id = l.id
    WHERE e.id = l.id AND e.taken + w.delta <= e.capacity AND (w.delta <= 0 OR e.closed_at IS NULL)
    RETURNING e.id
  )
  SELECT count(*)::integer FROM moved
$$;--> statement-breakpoint

-- Keeps all the wanted places for one browser, or none, in one round trip. Its own earlier hold of the day is given
-- back in the same transaction; when places are short, so are ended holds that stand in the way and have no payment
-- open. Booking rows are locked before entry times. What is refused: LH001 places gone, LH002 a payment is open.
-- The caller has judged the wishes by the rules; wanted is [{id, adults, children, babes, heads, adult, child, babe}].
CREATE FUNCTION hold_places(p_open_day uuid, p_holder text, p_household uuid, p_code text, p_now timestamptz, p_until timestamptz,
  p_insists boolean, p_total integer, p_currency text, p_wanted jsonb) RETURNS uuid LANGUAGE plpgsql SET lock_timeout = '2s' AS $$
DECLARE
  ids uuid[]; heads integer[]; back_ids uuid[]; back_heads integer[]; candidates uuid[]; ending uuid[]; made uuid;
BEGIN
  SELECT array_agg(w.id), array_agg(w.heads) INTO ids, heads FROM jsonb_to_recordset(p_wanted) AS w(id uuid, heads integer);
  FOR pass IN 1..2 LOOP
    BEGIN
      candidates := ARRAY(SELECT b.id FROM bookings b
        WHERE b.holder_hash = p_holder AND b.open_day_id = p_open_day AND b.confirmed_at IS NULL AND b.released_at IS NULL);
      IF pass = 2 THEN candidates := candidates || ended_holds_at(ids, p_now); END IF;
      back_ids := '{}'; back_heads := '{}';
      IF cardinality(candidates) > 0 THEN
        PERFORM FROM bookings b WHERE b.id = ANY (candidates) ORDER BY b.id FOR NO KEY UPDATE;
        IF EXISTS (SELECT FROM bookings b JOIN payment_attempts a ON a.booking_id = b.id AND a.ended_at IS NULL
          WHERE b.id = ANY (candidates) AND b.holder_hash = p_holder AND b.open_day_id = p_open_day AND b.confirmed_at IS NULL AND b.released_at IS NULL) THEN
          RAISE EXCEPTION 'a payment is open for the hold' USING ERRCODE = 'LH002';
        END IF;
        ending := ARRAY(SELECT b.id FROM bookings b WHERE b.id = ANY (candidates) AND b.confirmed_at IS NULL AND b.released_at IS NULL
          AND ((b.holder_hash = p_holder AND b.open_day_id = p_open_day) OR (b.held_until <= p_now
            AND NOT EXISTS (SELECT FROM payment_attempts a WHERE a.booking_id = b.id AND a.ended_at IS NULL))));
        UPDATE bookings SET released_at = p_now WHERE id = ANY (ending);
        WITH back AS (UPDATE visits v SET given_back_at = p_now WHERE v.booking_id = ANY (ending) AND v.given_back_at IS NULL RETURNING v.entry_time_id, v.heads)
        SELECT coalesce(array_agg(b.entry_time_id), '{}'), coalesce(array_agg(-b.heads), '{}') INTO back_ids, back_heads FROM back b;
      END IF;
      INSERT INTO bookings (open_day_id, household_id, code, holder_hash, made_at, held_until, insists_at, total_minor, currency)
      VALUES (p_open_day, p_household, p_code, p_holder, p_now, p_until, CASE WHEN p_insists THEN p_now END, p_total, p_currency)
      RETURNING id INTO made;
      IF move_places(ids || back_ids, heads || back_heads) < (SELECT count(DISTINCT t) FROM unnest(ids || back_ids) AS t) THEN
        RAISE EXCEPTION 'the places are gone' USING ERRCODE = 'LH001';
      END IF;
      INSERT INTO visits (booking_id, open_day_id, entry_time_id, adults, children, babes, heads, adult_minor, child_minor, babe_minor)
      SELECT made, p_open_day, w.id, w.adults, w.children, w.babes, w.heads, w.adult, w.child, w.babe
      FROM jsonb_to_recordset(p_wanted) AS w(id uuid, adults smallint, children smallint, babes smallint, heads smallint, adult integer, child integer, babe integer);
      RETURN made;
    EXCEPTION WHEN SQLSTATE 'LH001' THEN -- undone so far, locks included: the second pass begins in the lock order again
      IF pass = 2 OR cardinality(ended_holds_at(ids, p_now)) = 0 THEN RAISE; END IF;
    END;
  END LOOP;
END $$;--> statement-breakpoint

-- The holds at these entry times that have run out and have no payment open: the next party may have their places.
CREATE FUNCTION ended_holds_at(ids uuid[], p_now timestamptz) RETURNS uuid[] LANGUAGE sql STABLE AS $$
  SELECT coalesce(array_agg(DISTINCT b.id), '{}') FROM visits v JOIN bookings b ON b.id = v.booking_id
  WHERE v.entry_time_id = ANY (ids) AND v.given_back_at IS NULL
    AND b.confirmed_at IS NULL AND b.released_at IS NULL AND b.held_until <= p_now
    AND NOT EXISTS (SELECT FROM payment_attempts a WHERE a.booking_id = b.id AND a.ended_at IS NULL)
$$;--> statement-breakpoint

-- The books begin with these accounts and funds; a club may add to them, the rules of lib/books name them.
INSERT INTO accounts_of_books (code, name, kind) VALUES
  ('bank', 'Bank', 'asset'),
  ('cards-clearing', 'Card payments on their way to the bank', 'asset'),
  ('cash-in-hand', 'Cash in hand', 'asset'),
  ('cheques-in-hand', 'Cheques in hand', 'asset'),
  ('refunds-owed', 'Money to give back', 'liability'),
  ('ticket-income', 'Open-day tickets', 'income'),
  ('dues-income', 'Members'' dues', 'income'),
  ('card-fees', 'Card fees', 'expense')
ON CONFLICT DO NOTHING;--> statement-breakpoint
INSERT INTO funds (key, name, position) VALUES ('general', 'General fund', 1), ('open-days', 'Open days', 2) ON CONFLICT DO NOTHING;
