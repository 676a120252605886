-- What the tables alone cannot say: no overlapping terms, balanced entries, facts that stand.
CREATE EXTENSION IF NOT EXISTS btree_gist;--> statement-breakpoint
ALTER TABLE "terms" ADD CONSTRAINT "terms_never_overlap" EXCLUDE USING gist ("household_id" WITH =, "during" WITH &&);--> statement-breakpoint
ALTER TABLE "terms" ADD CONSTRAINT "terms_not_empty" CHECK (NOT isempty("during") AND NOT lower_inf("during"));--> statement-breakpoint
ALTER TABLE "journal_entries" ADD CONSTRAINT "journal_entries_reverses_fk" FOREIGN KEY ("reverses_id") REFERENCES "journal_entries"("id");--> statement-breakpoint
CREATE UNIQUE INDEX "journal_entries_reversed_once" ON "journal_entries" ("reverses_id") WHERE "reverses_id" IS NOT NULL;--> statement-breakpoint

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only: a correction is a new row', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END $$;--> statement-breakpoint

DO $$
DECLARE name text;
BEGIN
  FOREACH name IN ARRAY ARRAY['audit_trail', 'journal_entries', 'postings', 'payments', 'card_payments', 'card_events', 'gate_facts', 'letters', 'sendings', 'place_showings']
  LOOP
    EXECUTE format('CREATE TRIGGER append_only_rows BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', name);
    EXECUTE format('CREATE TRIGGER append_only_table BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', name);
    IF EXISTS (SELECT FROM pg_roles WHERE rolname = 'leafhalt_app') THEN
      EXECUTE format('REVOKE UPDATE, DELETE, TRUNCATE ON %I FROM leafhalt_app', name);
    END IF;
  END LOOP;
END $$;--> statement-breakpoint

-- A posting may join only the transaction that made its entry, so no entry is ever added to later.
CREATE FUNCTION posting_joins_its_entry() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (SELECT made_in FROM journal_entries WHERE id = NEW.entry_id) IS DISTINCT FROM pg_current_xact_id()::text THEN
    RAISE EXCEPTION 'a posting may be made only in the transaction that made its entry' USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER posting_joins_its_entry BEFORE INSERT ON "postings" FOR EACH ROW EXECUTE FUNCTION posting_joins_its_entry();--> statement-breakpoint

-- The books say themselves which transaction made an entry; nobody may claim another.
CREATE FUNCTION entry_made_here() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  NEW.made_in := pg_current_xact_id()::text;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER entry_made_here BEFORE INSERT ON "journal_entries" FOR EACH ROW EXECUTE FUNCTION entry_made_here();--> statement-breakpoint

-- Checked at commit: the postings of an entry sum to zero in every currency, and there are some.
CREATE FUNCTION entry_balances() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE entry uuid := (to_jsonb(NEW) ->> TG_ARGV[0])::uuid;
BEGIN
  IF NOT EXISTS (SELECT FROM postings WHERE entry_id = entry)
     OR EXISTS (SELECT FROM postings WHERE entry_id = entry GROUP BY currency HAVING sum(amount_minor) <> 0) THEN
    RAISE EXCEPTION 'journal entry % does not balance', entry USING ERRCODE = 'check_violation', CONSTRAINT = 'entries_balance';
  END IF;
  RETURN NULL;
END $$;--> statement-breakpoint
CREATE CONSTRAINT TRIGGER entry_balances AFTER INSERT ON "journal_entries" DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION entry_balances('id');--> statement-breakpoint
CREATE CONSTRAINT TRIGGER entry_balances AFTER INSERT ON "postings" DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION entry_balances('entry_id');--> statement-breakpoint

-- A visit's entry time is on its booking's open day; an entry time is on its stop's.
CREATE FUNCTION same_open_day() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_TABLE_NAME = 'visits' THEN
    IF (SELECT open_day_id FROM entry_times WHERE id = NEW.entry_time_id) IS DISTINCT FROM NEW.open_day_id
       OR (SELECT open_day_id FROM bookings WHERE id = NEW.booking_id) IS DISTINCT FROM NEW.open_day_id THEN
      RAISE EXCEPTION 'a visit stays on its booking''s open day' USING ERRCODE = 'check_violation', CONSTRAINT = 'visits_same_open_day';
    END IF;
  ELSIF (SELECT open_day_id FROM stops WHERE id = NEW.stop_id) IS DISTINCT FROM NEW.open_day_id THEN
    RAISE EXCEPTION 'an entry time stays on its stop''s open day' USING ERRCODE = 'check_violation', CONSTRAINT = 'entry_times_same_open_day';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER same_open_day BEFORE INSERT OR UPDATE OF entry_time_id, booking_id, open_day_id ON "visits" FOR EACH ROW EXECUTE FUNCTION same_open_day();--> statement-breakpoint
CREATE TRIGGER same_open_day BEFORE INSERT OR UPDATE OF stop_id, open_day_id ON "entry_times" FOR EACH ROW EXECUTE FUNCTION same_open_day();
