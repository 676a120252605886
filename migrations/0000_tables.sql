CREATE TABLE "booking_contacts" (
	"booking_id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text,
	"phone" text,
	"email_confirmed_at" timestamp with time zone,
	"made_by" uuid
);
--> statement-breakpoint
CREATE TABLE "bookings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"open_day_id" uuid NOT NULL,
	"household_id" uuid,
	"code" text NOT NULL,
	"holder_hash" text,
	"made_at" timestamp with time zone NOT NULL,
	"held_until" timestamp with time zone NOT NULL,
	"payment_moved_at" timestamp with time zone,
	"confirmed_at" timestamp with time zone,
	"released_at" timestamp with time zone,
	"cancelled_at" timestamp with time zone,
	"insists_at" timestamp with time zone,
	"total_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"rules_agreed_at" timestamp with time zone,
	"wants_invitations" boolean DEFAULT true NOT NULL,
	"ticket_number" integer GENERATED ALWAYS AS IDENTITY (sequence name "bookings_ticket_number_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 2147483647 START WITH 1 CACHE 1),
	CONSTRAINT "bookings_code_unique" UNIQUE("code"),
	CONSTRAINT "bookings_confirmed_or_released" CHECK ("bookings"."confirmed_at" is null or "bookings"."released_at" is null),
	CONSTRAINT "bookings_cancelled_after_confirmed" CHECK ("bookings"."cancelled_at" is null or "bookings"."confirmed_at" is not null),
	CONSTRAINT "bookings_total_not_negative" CHECK ("bookings"."total_minor" >= 0),
	CONSTRAINT "bookings_code_shape" CHECK ("bookings"."code" ~ '^[0-9A-HJKMNP-TV-Z]{8}$')
);
--> statement-breakpoint
CREATE TABLE "ticket_keys" (
	"id" smallint PRIMARY KEY NOT NULL,
	"public_key" "bytea" NOT NULL,
	"sealed_private_key" "bytea" NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"retired_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "visits" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"booking_id" uuid NOT NULL,
	"open_day_id" uuid NOT NULL,
	"entry_time_id" uuid NOT NULL,
	"adults" smallint NOT NULL,
	"children" smallint NOT NULL,
	"babes" smallint DEFAULT 0 NOT NULL,
	"heads" smallint NOT NULL,
	"adult_minor" integer NOT NULL,
	"child_minor" integer NOT NULL,
	"babe_minor" integer NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"moved_at" timestamp with time zone,
	"given_back_at" timestamp with time zone,
	CONSTRAINT "visits_counts" CHECK ("visits"."adults" >= 0 and "visits"."children" >= 0 and "visits"."babes" >= 0 and "visits"."heads" >= 0),
	CONSTRAINT "visits_heads_of_people" CHECK ("visits"."heads" in ("visits"."adults" + "visits"."children", "visits"."adults" + "visits"."children" + "visits"."babes")),
	CONSTRAINT "visits_somebody" CHECK ("visits"."given_back_at" is not null or "visits"."adults" + "visits"."children" + "visits"."babes" > 0)
);
--> statement-breakpoint
CREATE TABLE "accounts_of_books" (
	"code" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "card_events" (
	"id" text PRIMARY KEY NOT NULL,
	"kind" text NOT NULL,
	"object_id" text,
	"received_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "card_payments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"object_id" text NOT NULL,
	"outcome" text NOT NULL,
	"attempt_id" uuid,
	"amount_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"applied_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "closed_periods" (
	"month" date NOT NULL,
	"closed_at" timestamp with time zone NOT NULL,
	"closed_by" uuid,
	CONSTRAINT "closed_periods_month_pk" PRIMARY KEY("month")
);
--> statement-breakpoint
CREATE TABLE "funds" (
	"key" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"position" smallint NOT NULL
);
--> statement-breakpoint
CREATE TABLE "journal_entries" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"source_id" text NOT NULL,
	"happened_on" date NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"made_by" uuid,
	"reverses_id" uuid,
	"made_in" text DEFAULT pg_current_xact_id()::text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "payment_attempts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"booking_id" uuid,
	"charge_id" uuid,
	"idempotency_key" text NOT NULL,
	"amount_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"opened_at" timestamp with time zone NOT NULL,
	"session_id" text,
	"session_url" text,
	"session_expires_at" timestamp with time zone,
	"payment_intent_id" text,
	"ended_at" timestamp with time zone,
	"outcome" text,
	CONSTRAINT "payment_attempts_idempotencyKey_unique" UNIQUE("idempotency_key"),
	CONSTRAINT "payment_attempts_sessionId_unique" UNIQUE("session_id"),
	CONSTRAINT "payment_attempts_paymentIntentId_unique" UNIQUE("payment_intent_id"),
	CONSTRAINT "payment_attempts_for_one_thing" CHECK (num_nonnulls("payment_attempts"."booking_id", "payment_attempts"."charge_id") = 1),
	CONSTRAINT "payment_attempts_amount_positive" CHECK ("payment_attempts"."amount_minor" > 0),
	CONSTRAINT "payment_attempts_ended_with_outcome" CHECK (("payment_attempts"."ended_at" is null) = ("payment_attempts"."outcome" is null))
);
--> statement-breakpoint
CREATE TABLE "payments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"booking_id" uuid,
	"charge_id" uuid,
	"household_id" uuid,
	"method" text NOT NULL,
	"amount_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"received_on" date NOT NULL,
	"reference" text,
	"attempt_id" uuid,
	"receipt_year" smallint NOT NULL,
	"receipt_number" integer NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"recorded_by" uuid,
	CONSTRAINT "payments_for_one_thing" CHECK (num_nonnulls("payments"."booking_id", "payments"."charge_id") = 1),
	CONSTRAINT "payments_amount_positive" CHECK ("payments"."amount_minor" > 0)
);
--> statement-breakpoint
CREATE TABLE "postings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"entry_id" uuid NOT NULL,
	"account" text NOT NULL,
	"fund" text NOT NULL,
	"open_day_id" uuid,
	"household_id" uuid,
	"amount_minor" bigint NOT NULL,
	"currency" text NOT NULL,
	CONSTRAINT "postings_not_nought" CHECK ("postings"."amount_minor" <> 0)
);
--> statement-breakpoint
CREATE TABLE "receipt_counters" (
	"year" smallint PRIMARY KEY NOT NULL,
	"last" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "refunds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"payment_id" uuid,
	"attempt_id" uuid,
	"amount_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"reason" text NOT NULL,
	"asked_at" timestamp with time zone NOT NULL,
	"asked_by" uuid,
	"due_at" timestamp with time zone NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"processor_id" text,
	"done_at" timestamp with time zone,
	"failed_at" timestamp with time zone,
	CONSTRAINT "refunds_processorId_unique" UNIQUE("processor_id"),
	CONSTRAINT "refunds_of_something" CHECK (num_nonnulls("refunds"."payment_id", "refunds"."attempt_id") >= 1),
	CONSTRAINT "refunds_amount_positive" CHECK ("refunds"."amount_minor" > 0)
);
--> statement-breakpoint
CREATE TABLE "audit_texts" (
	"line_id" uuid PRIMARY KEY NOT NULL,
	"before" jsonb,
	"after" jsonb
);
--> statement-breakpoint
CREATE TABLE "audit_trail" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor_kind" text NOT NULL,
	"account_id" uuid,
	"action" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" text
);
--> statement-breakpoint
CREATE TABLE "club" (
	"id" smallint PRIMARY KEY DEFAULT 1 NOT NULL,
	"name" text NOT NULL,
	"foot_line" text NOT NULL,
	"email" text NOT NULL,
	"time_zone" text NOT NULL,
	"currency" text NOT NULL,
	"locale" text NOT NULL,
	"hour_cycle" text NOT NULL,
	"hold_minutes" integer DEFAULT 10 NOT NULL,
	"holds_may_be_extended" boolean DEFAULT true NOT NULL,
	"party_people_max" integer DEFAULT 9 NOT NULL,
	"party_visits_max" integer DEFAULT 7 NOT NULL,
	"babes_take_place" boolean DEFAULT false NOT NULL,
	"address_release_hours" integer DEFAULT 72 NOT NULL,
	"changes_end_minutes" integer DEFAULT 60 NOT NULL,
	"refund_rules" jsonb NOT NULL,
	"dues_kept_on_days" integer DEFAULT 45 NOT NULL,
	"visit_rules" text NOT NULL,
	"conifer_ink" text,
	CONSTRAINT "club_is_one_row" CHECK ("club"."id" = 1),
	CONSTRAINT "club_currency_is_iso" CHECK ("club"."currency" ~ '^[A-Z]{3}$'),
	CONSTRAINT "club_hold_minutes_range" CHECK ("club"."hold_minutes" between 1 and 60),
	CONSTRAINT "club_party_people_range" CHECK ("club"."party_people_max" between 1 and 99),
	CONSTRAINT "club_party_visits_range" CHECK ("club"."party_visits_max" between 1 and 14),
	CONSTRAINT "club_release_range" CHECK ("club"."address_release_hours" between 0 and 720),
	CONSTRAINT "club_changes_end_range" CHECK ("club"."changes_end_minutes" between 0 and 10080)
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"window_started_at" timestamp with time zone NOT NULL,
	"tries" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "charges" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"household_id" uuid NOT NULL,
	"class_key" text NOT NULL,
	"term_from" date NOT NULL,
	"term_to" date NOT NULL,
	"amount_minor" integer NOT NULL,
	"currency" text NOT NULL,
	"due_on" date NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"waived_at" timestamp with time zone,
	"waived_by" uuid,
	CONSTRAINT "charges_amount_positive" CHECK ("charges"."amount_minor" > 0),
	CONSTRAINT "charges_term_order" CHECK ("charges"."term_from" <= "charges"."term_to")
);
--> statement-breakpoint
CREATE TABLE "class_dues" (
	"class_key" text NOT NULL,
	"from_on" date NOT NULL,
	"amount_minor" integer NOT NULL,
	CONSTRAINT "class_dues_class_key_from_on_pk" PRIMARY KEY("class_key","from_on"),
	CONSTRAINT "class_dues_not_negative" CHECK ("class_dues"."amount_minor" >= 0)
);
--> statement-breakpoint
CREATE TABLE "membership_classes" (
	"key" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"about" text NOT NULL,
	"is_for_life" boolean DEFAULT false NOT NULL,
	"position" smallint NOT NULL
);
--> statement-breakpoint
CREATE TABLE "terms" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"household_id" uuid NOT NULL,
	"class_key" text NOT NULL,
	"during" daterange NOT NULL,
	"made_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "garden_areas" (
	"garden_id" uuid PRIMARY KEY NOT NULL,
	"area_key" text NOT NULL,
	"name" text NOT NULL,
	"caption" text NOT NULL,
	"polygon" jsonb NOT NULL,
	"label_lat" double precision NOT NULL,
	"label_lon" double precision NOT NULL
);
--> statement-breakpoint
CREATE TABLE "garden_places" (
	"garden_id" uuid PRIMARY KEY NOT NULL,
	"lat" double precision NOT NULL,
	"lon" double precision NOT NULL,
	"address" text NOT NULL,
	"directions" text,
	CONSTRAINT "garden_places_on_earth" CHECK ("garden_places"."lat" between -90 and 90 and "garden_places"."lon" between -180 and 180)
);
--> statement-breakpoint
CREATE TABLE "garden_plants" (
	"garden_id" uuid NOT NULL,
	"plant_key" text NOT NULL,
	"height_mm" integer NOT NULL,
	"note" text,
	CONSTRAINT "garden_plants_garden_id_plant_key_height_mm_pk" PRIMARY KEY("garden_id","plant_key","height_mm"),
	CONSTRAINT "garden_plants_height_positive" CHECK ("garden_plants"."height_mm" > 0)
);
--> statement-breakpoint
CREATE TABLE "gardens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"railway_name" text NOT NULL,
	"short_name" text NOT NULL,
	"household_id" uuid NOT NULL,
	"hosts_shown_as" text,
	"subtitle" text NOT NULL,
	"about" text,
	"scale_one_to" numeric(6, 3) NOT NULL,
	"gauge_mm" numeric(5, 1) NOT NULL,
	"track_length_mm" integer NOT NULL,
	"min_radius_mm" integer,
	"steepest_grade_percent" numeric(4, 2),
	"powers" text[] NOT NULL,
	"bridge" text DEFAULT 'none' NOT NULL,
	"set_in" text,
	"begun_year" smallint,
	"plate" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"is_step_free" boolean NOT NULL,
	"path_width_mm" integer,
	"path_surface" text,
	"steps_note" text,
	"track_height_mm" integer,
	"seats" integer,
	"has_toilet" boolean DEFAULT false NOT NULL,
	"dogs_note" text,
	"parking_note" text,
	"water" text DEFAULT 'none' NOT NULL,
	"water_note" text,
	"cautions" text[] DEFAULT '{}' NOT NULL,
	"stay_minutes" integer DEFAULT 35 NOT NULL,
	"heads_limit" integer NOT NULL,
	"published_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	CONSTRAINT "gardens_slug_unique" UNIQUE("slug"),
	CONSTRAINT "gardens_scale_range" CHECK ("gardens"."scale_one_to" between 4 and 100),
	CONSTRAINT "gardens_gauge_range" CHECK ("gardens"."gauge_mm" between 9 and 300),
	CONSTRAINT "gardens_track_positive" CHECK ("gardens"."track_length_mm" > 0),
	CONSTRAINT "gardens_stay_range" CHECK ("gardens"."stay_minutes" between 5 and 240),
	CONSTRAINT "gardens_heads_range" CHECK ("gardens"."heads_limit" between 1 and 500),
	CONSTRAINT "gardens_slug_shape" CHECK ("gardens"."slug" ~ '^[a-z0-9]+(-[a-z0-9]+)*$')
);
--> statement-breakpoint
CREATE TABLE "place_showings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"garden_id" uuid NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"viewer_kind" text NOT NULL,
	"viewer_id" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "plants" (
	"key" text PRIMARY KEY NOT NULL,
	"common_name" text NOT NULL,
	"botanical_name" text NOT NULL,
	"colour" text NOT NULL,
	"bloom_months" smallint[] NOT NULL,
	"is_evergreen" boolean DEFAULT false NOT NULL,
	"drawing" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "gate_facts" (
	"id" uuid PRIMARY KEY NOT NULL,
	"open_day_id" uuid NOT NULL,
	"stop_id" uuid NOT NULL,
	"visit_id" uuid,
	"kind" text NOT NULL,
	"adults" smallint DEFAULT 0 NOT NULL,
	"children" smallint DEFAULT 0 NOT NULL,
	"babes" smallint DEFAULT 0 NOT NULL,
	"undoes_id" uuid,
	"at_phone" timestamp with time zone NOT NULL,
	"clock_offset_ms" integer DEFAULT 0 NOT NULL,
	"received_at" timestamp with time zone NOT NULL,
	"list_version" text,
	"pass_id" uuid,
	"device_id" uuid,
	"verdict" text,
	"reason" text,
	CONSTRAINT "gate_facts_counts" CHECK ("gate_facts"."adults" >= 0 and "gate_facts"."children" >= 0 and "gate_facts"."babes" >= 0),
	CONSTRAINT "gate_facts_undo_names_one" CHECK (("gate_facts"."kind" = 'undo') = ("gate_facts"."undoes_id" is not null)),
	CONSTRAINT "gate_facts_admit_names_visit" CHECK ("gate_facts"."kind" <> 'admit' or "gate_facts"."visit_id" is not null)
);
--> statement-breakpoint
CREATE TABLE "letter_texts" (
	"letter_id" uuid PRIMARY KEY NOT NULL,
	"to_name" text,
	"to_address" text,
	"facts" jsonb,
	"subject" text,
	"html" text,
	"text" text
);
--> statement-breakpoint
CREATE TABLE "letters" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"key" text NOT NULL,
	"kind" text NOT NULL,
	"open_day_id" uuid,
	"booking_id" uuid,
	"household_id" uuid,
	"made_at" timestamp with time zone NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "letters_key_unique" UNIQUE("key")
);
--> statement-breakpoint
CREATE TABLE "letters_due" (
	"letter_id" uuid PRIMARY KEY NOT NULL,
	"due_at" timestamp with time zone NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sendings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"letter_id" uuid NOT NULL,
	"tried_at" timestamp with time zone NOT NULL,
	"outcome" text NOT NULL,
	"detail" text,
	CONSTRAINT "sendings_detail_short" CHECK (length("sendings"."detail") <= 500)
);
--> statement-breakpoint
CREATE TABLE "area_minutes" (
	"from_garden_id" uuid NOT NULL,
	"to_garden_id" uuid NOT NULL,
	"minutes" smallint NOT NULL,
	CONSTRAINT "area_minutes_from_garden_id_to_garden_id_pk" PRIMARY KEY("from_garden_id","to_garden_id"),
	CONSTRAINT "area_minutes_by_fives" CHECK ("area_minutes"."minutes" >= 0 and "area_minutes"."minutes" % 5 = 0)
);
--> statement-breakpoint
CREATE TABLE "entry_times" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"stop_id" uuid NOT NULL,
	"open_day_id" uuid NOT NULL,
	"opens_at" timestamp with time zone NOT NULL,
	"grace_until" timestamp with time zone NOT NULL,
	"capacity" integer NOT NULL,
	"walk_ups" integer DEFAULT 0 NOT NULL,
	"taken" integer DEFAULT 0 NOT NULL,
	"closed_at" timestamp with time zone,
	CONSTRAINT "entry_times_never_oversold" CHECK (0 <= "entry_times"."taken" and "entry_times"."taken" <= "entry_times"."capacity"),
	CONSTRAINT "entry_times_walk_ups_counted" CHECK (0 <= "entry_times"."walk_ups" and "entry_times"."walk_ups" <= "entry_times"."taken"),
	CONSTRAINT "entry_times_grace_after_start" CHECK ("entry_times"."opens_at" < "entry_times"."grace_until"),
	CONSTRAINT "entry_times_capacity_range" CHECK ("entry_times"."capacity" between 0 and 500)
);
--> statement-breakpoint
CREATE TABLE "open_days" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"title" text NOT NULL,
	"place_line" text NOT NULL,
	"how_to_come" text,
	"held_on" date NOT NULL,
	"opens_at" timestamp with time zone NOT NULL,
	"closes_at" timestamp with time zone NOT NULL,
	"party_people_max" integer,
	"published_at" timestamp with time zone,
	"called_off_at" timestamp with time zone,
	"called_off_note" text,
	CONSTRAINT "open_days_slug_unique" UNIQUE("slug"),
	CONSTRAINT "open_days_hours" CHECK ("open_days"."opens_at" < "open_days"."closes_at"),
	CONSTRAINT "open_days_slug_shape" CHECK ("open_days"."slug" ~ '^[a-z0-9]+(-[a-z0-9]+)*$'),
	CONSTRAINT "open_days_party_range" CHECK ("open_days"."party_people_max" is null or "open_days"."party_people_max" between 1 and 99)
);
--> statement-breakpoint
CREATE TABLE "place_minutes" (
	"from_garden_id" uuid NOT NULL,
	"to_garden_id" uuid NOT NULL,
	"minutes" smallint NOT NULL,
	CONSTRAINT "place_minutes_from_garden_id_to_garden_id_pk" PRIMARY KEY("from_garden_id","to_garden_id"),
	CONSTRAINT "place_minutes_not_negative" CHECK ("place_minutes"."minutes" >= 0)
);
--> statement-breakpoint
CREATE TABLE "plan_changes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"open_day_id" uuid NOT NULL,
	"stop_id" uuid,
	"at" timestamp with time zone NOT NULL,
	"account_id" uuid,
	"initials" text NOT NULL,
	"note" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "prices" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"open_day_id" uuid NOT NULL,
	"stop_id" uuid,
	"kind" text NOT NULL,
	"amount_minor" integer NOT NULL,
	CONSTRAINT "prices_one_a_kind" UNIQUE NULLS NOT DISTINCT("open_day_id","stop_id","kind"),
	CONSTRAINT "prices_not_negative" CHECK ("prices"."amount_minor" >= 0)
);
--> statement-breakpoint
CREATE TABLE "stops" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"open_day_id" uuid NOT NULL,
	"garden_id" uuid NOT NULL,
	"number" smallint NOT NULL,
	"stay_minutes" integer NOT NULL,
	"heads_limit" integer NOT NULL,
	"closed_at" timestamp with time zone,
	CONSTRAINT "stops_number_range" CHECK ("stops"."number" between 1 and 14),
	CONSTRAINT "stops_stay_range" CHECK ("stops"."stay_minutes" between 5 and 240),
	CONSTRAINT "stops_heads_range" CHECK ("stops"."heads_limit" between 1 and 500)
);
--> statement-breakpoint
CREATE TABLE "accounts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"made_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "bearer_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"subject_id" text NOT NULL,
	"secret_hash" text NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "bearer_links_secretHash_unique" UNIQUE("secret_hash")
);
--> statement-breakpoint
CREATE TABLE "contact_details" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"email" text,
	"phone" text,
	"street" text,
	"town" text,
	"postcode" text
);
--> statement-breakpoint
CREATE TABLE "gate_devices" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"pass_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"key_hash" text NOT NULL,
	"opened_at" timestamp with time zone NOT NULL,
	"seen_at" timestamp with time zone NOT NULL,
	CONSTRAINT "gate_devices_keyHash_unique" UNIQUE("key_hash")
);
--> statement-breakpoint
CREATE TABLE "gate_passes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"stop_id" uuid NOT NULL,
	"helper" text NOT NULL,
	"secret_hash" text NOT NULL,
	"devices_allowed" integer DEFAULT 2 NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"made_by" uuid,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "gate_passes_secretHash_unique" UNIQUE("secret_hash"),
	CONSTRAINT "gate_passes_devices_range" CHECK ("gate_passes"."devices_allowed" between 1 and 20)
);
--> statement-breakpoint
CREATE TABLE "households" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"member_number" integer NOT NULL,
	"joined_on" date NOT NULL,
	"left_on" date,
	CONSTRAINT "households_memberNumber_unique" UNIQUE("member_number"),
	CONSTRAINT "households_left_after_joining" CHECK ("households"."left_on" is null or "households"."left_on" >= "households"."joined_on")
);
--> statement-breakpoint
CREATE TABLE "passwords" (
	"account_id" uuid PRIMARY KEY NOT NULL,
	"hash" text NOT NULL,
	"set_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"household_id" uuid NOT NULL,
	"account_id" uuid,
	"given_name" text NOT NULL,
	"family_name" text NOT NULL,
	"age" text DEFAULT 'adult' NOT NULL,
	"is_contact" boolean DEFAULT false NOT NULL
);
--> statement-breakpoint
CREATE TABLE "roles_held" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"role" text NOT NULL,
	"given_at" timestamp with time zone NOT NULL,
	"given_by" uuid,
	"taken_at" timestamp with time zone,
	"taken_by" uuid
);
--> statement-breakpoint
CREATE TABLE "sign_in_codes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"code_hash" text NOT NULL,
	"link_hash" text NOT NULL,
	"made_at" timestamp with time zone NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"tries" integer DEFAULT 0 NOT NULL,
	CONSTRAINT "sign_in_codes_linkHash_unique" UNIQUE("link_hash")
);
--> statement-breakpoint
CREATE TABLE "sign_ins" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"person_id" uuid,
	"method" text NOT NULL,
	"signed_in_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "booking_contacts" ADD CONSTRAINT "booking_contacts_booking_id_bookings_id_fk" FOREIGN KEY ("booking_id") REFERENCES "public"."bookings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "booking_contacts" ADD CONSTRAINT "booking_contacts_made_by_accounts_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bookings" ADD CONSTRAINT "bookings_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bookings" ADD CONSTRAINT "bookings_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_booking_id_bookings_id_fk" FOREIGN KEY ("booking_id") REFERENCES "public"."bookings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_entry_time_id_entry_times_id_fk" FOREIGN KEY ("entry_time_id") REFERENCES "public"."entry_times"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "card_payments" ADD CONSTRAINT "card_payments_attempt_id_payment_attempts_id_fk" FOREIGN KEY ("attempt_id") REFERENCES "public"."payment_attempts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "closed_periods" ADD CONSTRAINT "closed_periods_closed_by_accounts_id_fk" FOREIGN KEY ("closed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "journal_entries" ADD CONSTRAINT "journal_entries_made_by_accounts_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payment_attempts" ADD CONSTRAINT "payment_attempts_booking_id_bookings_id_fk" FOREIGN KEY ("booking_id") REFERENCES "public"."bookings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payment_attempts" ADD CONSTRAINT "payment_attempts_charge_id_charges_id_fk" FOREIGN KEY ("charge_id") REFERENCES "public"."charges"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_booking_id_bookings_id_fk" FOREIGN KEY ("booking_id") REFERENCES "public"."bookings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_charge_id_charges_id_fk" FOREIGN KEY ("charge_id") REFERENCES "public"."charges"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_attempt_id_payment_attempts_id_fk" FOREIGN KEY ("attempt_id") REFERENCES "public"."payment_attempts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_recorded_by_accounts_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_entry_id_journal_entries_id_fk" FOREIGN KEY ("entry_id") REFERENCES "public"."journal_entries"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_account_accounts_of_books_code_fk" FOREIGN KEY ("account") REFERENCES "public"."accounts_of_books"("code") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_fund_funds_key_fk" FOREIGN KEY ("fund") REFERENCES "public"."funds"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_payment_id_payments_id_fk" FOREIGN KEY ("payment_id") REFERENCES "public"."payments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_attempt_id_payment_attempts_id_fk" FOREIGN KEY ("attempt_id") REFERENCES "public"."payment_attempts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_asked_by_accounts_id_fk" FOREIGN KEY ("asked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_texts" ADD CONSTRAINT "audit_texts_line_id_audit_trail_id_fk" FOREIGN KEY ("line_id") REFERENCES "public"."audit_trail"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_trail" ADD CONSTRAINT "audit_trail_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "charges" ADD CONSTRAINT "charges_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "charges" ADD CONSTRAINT "charges_class_key_membership_classes_key_fk" FOREIGN KEY ("class_key") REFERENCES "public"."membership_classes"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "charges" ADD CONSTRAINT "charges_waived_by_accounts_id_fk" FOREIGN KEY ("waived_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "class_dues" ADD CONSTRAINT "class_dues_class_key_membership_classes_key_fk" FOREIGN KEY ("class_key") REFERENCES "public"."membership_classes"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms" ADD CONSTRAINT "terms_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms" ADD CONSTRAINT "terms_class_key_membership_classes_key_fk" FOREIGN KEY ("class_key") REFERENCES "public"."membership_classes"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "garden_areas" ADD CONSTRAINT "garden_areas_garden_id_gardens_id_fk" FOREIGN KEY ("garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "garden_places" ADD CONSTRAINT "garden_places_garden_id_gardens_id_fk" FOREIGN KEY ("garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "garden_plants" ADD CONSTRAINT "garden_plants_garden_id_gardens_id_fk" FOREIGN KEY ("garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "garden_plants" ADD CONSTRAINT "garden_plants_plant_key_plants_key_fk" FOREIGN KEY ("plant_key") REFERENCES "public"."plants"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gardens" ADD CONSTRAINT "gardens_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "place_showings" ADD CONSTRAINT "place_showings_garden_id_gardens_id_fk" FOREIGN KEY ("garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_stop_id_stops_id_fk" FOREIGN KEY ("stop_id") REFERENCES "public"."stops"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_visit_id_visits_id_fk" FOREIGN KEY ("visit_id") REFERENCES "public"."visits"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_undoes_id_gate_facts_id_fk" FOREIGN KEY ("undoes_id") REFERENCES "public"."gate_facts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_pass_id_gate_passes_id_fk" FOREIGN KEY ("pass_id") REFERENCES "public"."gate_passes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_facts" ADD CONSTRAINT "gate_facts_device_id_gate_devices_id_fk" FOREIGN KEY ("device_id") REFERENCES "public"."gate_devices"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letter_texts" ADD CONSTRAINT "letter_texts_letter_id_letters_id_fk" FOREIGN KEY ("letter_id") REFERENCES "public"."letters"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letters" ADD CONSTRAINT "letters_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letters" ADD CONSTRAINT "letters_booking_id_bookings_id_fk" FOREIGN KEY ("booking_id") REFERENCES "public"."bookings"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letters" ADD CONSTRAINT "letters_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "letters_due" ADD CONSTRAINT "letters_due_letter_id_letters_id_fk" FOREIGN KEY ("letter_id") REFERENCES "public"."letters"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sendings" ADD CONSTRAINT "sendings_letter_id_letters_id_fk" FOREIGN KEY ("letter_id") REFERENCES "public"."letters"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "area_minutes" ADD CONSTRAINT "area_minutes_from_garden_id_gardens_id_fk" FOREIGN KEY ("from_garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "area_minutes" ADD CONSTRAINT "area_minutes_to_garden_id_gardens_id_fk" FOREIGN KEY ("to_garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entry_times" ADD CONSTRAINT "entry_times_stop_id_stops_id_fk" FOREIGN KEY ("stop_id") REFERENCES "public"."stops"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entry_times" ADD CONSTRAINT "entry_times_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "place_minutes" ADD CONSTRAINT "place_minutes_from_garden_id_gardens_id_fk" FOREIGN KEY ("from_garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "place_minutes" ADD CONSTRAINT "place_minutes_to_garden_id_gardens_id_fk" FOREIGN KEY ("to_garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_changes" ADD CONSTRAINT "plan_changes_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_changes" ADD CONSTRAINT "plan_changes_stop_id_stops_id_fk" FOREIGN KEY ("stop_id") REFERENCES "public"."stops"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_changes" ADD CONSTRAINT "plan_changes_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "prices" ADD CONSTRAINT "prices_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "prices" ADD CONSTRAINT "prices_stop_id_stops_id_fk" FOREIGN KEY ("stop_id") REFERENCES "public"."stops"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stops" ADD CONSTRAINT "stops_open_day_id_open_days_id_fk" FOREIGN KEY ("open_day_id") REFERENCES "public"."open_days"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stops" ADD CONSTRAINT "stops_garden_id_gardens_id_fk" FOREIGN KEY ("garden_id") REFERENCES "public"."gardens"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact_details" ADD CONSTRAINT "contact_details_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_devices" ADD CONSTRAINT "gate_devices_pass_id_gate_passes_id_fk" FOREIGN KEY ("pass_id") REFERENCES "public"."gate_passes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_passes" ADD CONSTRAINT "gate_passes_stop_id_stops_id_fk" FOREIGN KEY ("stop_id") REFERENCES "public"."stops"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gate_passes" ADD CONSTRAINT "gate_passes_made_by_accounts_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "passwords" ADD CONSTRAINT "passwords_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "people" ADD CONSTRAINT "people_household_id_households_id_fk" FOREIGN KEY ("household_id") REFERENCES "public"."households"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "people" ADD CONSTRAINT "people_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "roles_held" ADD CONSTRAINT "roles_held_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "roles_held" ADD CONSTRAINT "roles_held_given_by_accounts_id_fk" FOREIGN KEY ("given_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "roles_held" ADD CONSTRAINT "roles_held_taken_by_accounts_id_fk" FOREIGN KEY ("taken_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_ins" ADD CONSTRAINT "sign_ins_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_ins" ADD CONSTRAINT "sign_ins_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "booking_contacts_by_email" ON "booking_contacts" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "bookings_one_hold_a_browser" ON "bookings" USING btree ("holder_hash","open_day_id") WHERE "bookings"."confirmed_at" is null and "bookings"."released_at" is null;--> statement-breakpoint
CREATE INDEX "bookings_by_day" ON "bookings" USING btree ("open_day_id","confirmed_at");--> statement-breakpoint
CREATE INDEX "bookings_by_household" ON "bookings" USING btree ("household_id");--> statement-breakpoint
CREATE INDEX "bookings_holds_by_end" ON "bookings" USING btree ("held_until") WHERE "bookings"."confirmed_at" is null and "bookings"."released_at" is null;--> statement-breakpoint
CREATE INDEX "visits_by_booking" ON "visits" USING btree ("booking_id");--> statement-breakpoint
CREATE INDEX "visits_by_entry_time" ON "visits" USING btree ("entry_time_id") WHERE "visits"."given_back_at" is null;--> statement-breakpoint
CREATE INDEX "visits_by_day" ON "visits" USING btree ("open_day_id");--> statement-breakpoint
CREATE UNIQUE INDEX "visits_once_a_time" ON "visits" USING btree ("booking_id","entry_time_id") WHERE "visits"."given_back_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "card_payments_once" ON "card_payments" USING btree ("object_id","outcome");--> statement-breakpoint
CREATE UNIQUE INDEX "journal_entries_once" ON "journal_entries" USING btree ("kind","source_id");--> statement-breakpoint
CREATE INDEX "journal_entries_by_day" ON "journal_entries" USING btree ("happened_on");--> statement-breakpoint
CREATE UNIQUE INDEX "payment_attempts_one_open_booking" ON "payment_attempts" USING btree ("booking_id") WHERE "payment_attempts"."ended_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "payment_attempts_one_open_charge" ON "payment_attempts" USING btree ("charge_id") WHERE "payment_attempts"."ended_at" is null;--> statement-breakpoint
CREATE INDEX "payment_attempts_by_booking" ON "payment_attempts" USING btree ("booking_id");--> statement-breakpoint
CREATE INDEX "payment_attempts_by_charge" ON "payment_attempts" USING btree ("charge_id");--> statement-breakpoint
CREATE UNIQUE INDEX "payments_receipt_once" ON "payments" USING btree ("receipt_year","receipt_number");--> statement-breakpoint
CREATE UNIQUE INDEX "payments_once_an_attempt" ON "payments" USING btree ("attempt_id");--> statement-breakpoint
CREATE INDEX "payments_by_booking" ON "payments" USING btree ("booking_id");--> statement-breakpoint
CREATE INDEX "payments_by_charge" ON "payments" USING btree ("charge_id");--> statement-breakpoint
CREATE INDEX "payments_by_day" ON "payments" USING btree ("received_on");--> statement-breakpoint
CREATE INDEX "postings_by_entry" ON "postings" USING btree ("entry_id");--> statement-breakpoint
CREATE INDEX "postings_by_account" ON "postings" USING btree ("account");--> statement-breakpoint
CREATE INDEX "postings_by_day" ON "postings" USING btree ("open_day_id");--> statement-breakpoint
CREATE INDEX "refunds_due" ON "refunds" USING btree ("due_at") WHERE "refunds"."done_at" is null and "refunds"."failed_at" is null;--> statement-breakpoint
CREATE INDEX "refunds_by_payment" ON "refunds" USING btree ("payment_id");--> statement-breakpoint
CREATE INDEX "audit_trail_by_time" ON "audit_trail" USING btree ("at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "audit_trail_by_subject" ON "audit_trail" USING btree ("subject_kind","subject_id");--> statement-breakpoint
CREATE UNIQUE INDEX "charges_one_a_term" ON "charges" USING btree ("household_id","term_from") WHERE "charges"."waived_at" is null;--> statement-breakpoint
CREATE INDEX "terms_by_household" ON "terms" USING btree ("household_id");--> statement-breakpoint
CREATE INDEX "gardens_by_household" ON "gardens" USING btree ("household_id");--> statement-breakpoint
CREATE INDEX "place_showings_by_garden" ON "place_showings" USING btree ("garden_id","at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "gate_facts_by_stop" ON "gate_facts" USING btree ("stop_id","received_at");--> statement-breakpoint
CREATE INDEX "gate_facts_by_visit" ON "gate_facts" USING btree ("visit_id");--> statement-breakpoint
CREATE UNIQUE INDEX "gate_facts_undone_once" ON "gate_facts" USING btree ("undoes_id") WHERE "gate_facts"."kind" = 'undo';--> statement-breakpoint
CREATE INDEX "letters_by_time" ON "letters" USING btree ("made_at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "letters_by_booking" ON "letters" USING btree ("booking_id");--> statement-breakpoint
CREATE INDEX "letters_by_day" ON "letters" USING btree ("open_day_id");--> statement-breakpoint
CREATE INDEX "letters_due_by_time" ON "letters_due" USING btree ("due_at");--> statement-breakpoint
CREATE INDEX "sendings_by_letter" ON "sendings" USING btree ("letter_id","tried_at" DESC NULLS LAST);--> statement-breakpoint
CREATE UNIQUE INDEX "entry_times_one_start" ON "entry_times" USING btree ("stop_id","opens_at");--> statement-breakpoint
CREATE INDEX "entry_times_by_day" ON "entry_times" USING btree ("open_day_id");--> statement-breakpoint
CREATE INDEX "open_days_by_day" ON "open_days" USING btree ("held_on");--> statement-breakpoint
CREATE INDEX "plan_changes_by_day" ON "plan_changes" USING btree ("open_day_id","at" DESC NULLS LAST);--> statement-breakpoint
CREATE UNIQUE INDEX "stops_one_number" ON "stops" USING btree ("open_day_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "stops_one_garden" ON "stops" USING btree ("open_day_id","garden_id");--> statement-breakpoint
CREATE INDEX "stops_by_garden" ON "stops" USING btree ("garden_id");--> statement-breakpoint
CREATE UNIQUE INDEX "accounts_one_email" ON "accounts" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "bearer_links_by_subject" ON "bearer_links" USING btree ("kind","subject_id");--> statement-breakpoint
CREATE UNIQUE INDEX "gate_devices_numbered" ON "gate_devices" USING btree ("pass_id","number");--> statement-breakpoint
CREATE INDEX "gate_passes_by_stop" ON "gate_passes" USING btree ("stop_id");--> statement-breakpoint
CREATE INDEX "people_by_household" ON "people" USING btree ("household_id");--> statement-breakpoint
CREATE INDEX "people_by_account" ON "people" USING btree ("account_id");--> statement-breakpoint
CREATE UNIQUE INDEX "people_one_contact" ON "people" USING btree ("household_id") WHERE "people"."is_contact";--> statement-breakpoint
CREATE UNIQUE INDEX "roles_held_once" ON "roles_held" USING btree ("account_id","role") WHERE "roles_held"."taken_at" is null;--> statement-breakpoint
CREATE INDEX "sign_in_codes_by_email" ON "sign_in_codes" USING btree (lower("email"),"made_at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "sign_ins_by_account" ON "sign_ins" USING btree ("account_id","signed_in_at" DESC NULLS LAST);