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
DROP FUNCTION same_open_day();
