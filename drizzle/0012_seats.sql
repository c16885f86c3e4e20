CREATE TABLE "club"."seat_rules" (
	"club_id" uuid PRIMARY KEY NOT NULL,
	"by_itself" boolean NOT NULL,
	"version" integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
ALTER TABLE "club"."seat_rules" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."seat_waits" (
	"club_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"since" timestamp with time zone NOT NULL,
	CONSTRAINT "seat_waits_club_id_athlete_id_pk" PRIMARY KEY("club_id","athlete_id")
);
--> statement-breakpoint
ALTER TABLE "club"."seat_waits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."seats" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"athlete_id" uuid NOT NULL,
	"assigned_at" timestamp with time zone NOT NULL,
	"released_at" timestamp with time zone,
	"frees_at" timestamp with time zone,
	CONSTRAINT "seats_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."seats" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "club"."seat_rules" ADD CONSTRAINT "seat_rules_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."seat_waits" ADD CONSTRAINT "seat_waits_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."seats" ADD CONSTRAINT "seats_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "seats_held" ON "club"."seats" USING btree ("club_id","athlete_id") WHERE released_at is null;--> statement-breakpoint
CREATE INDEX "seats_athlete" ON "club"."seats" USING btree ("club_id","athlete_id");--> statement-breakpoint
CREATE POLICY "seat_rules_own_club" ON "club"."seat_rules" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "seat_rules_staff_only" ON "club"."seat_rules" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "seat_waits_own_club" ON "club"."seat_waits" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "seat_waits_staff_only" ON "club"."seat_waits" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "seats_own_club" ON "club"."seats" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "seats_staff_only" ON "club"."seats" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
ALTER TABLE club.seat_waits FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.seat_rules FORCE ROW LEVEL SECURITY;--> statement-breakpoint
-- Whoever is active has a seat, as before. The owner sees no rows where row-level security is forced.
ALTER TABLE club.athletes NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
INSERT INTO club.seats (club_id, athlete_id, assigned_at)
  SELECT club_id, id, created_at FROM club.athletes WHERE archived_at IS NULL;--> statement-breakpoint
ALTER TABLE club.athletes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.seats FORCE ROW LEVEL SECURITY;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON club.seats TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT, DELETE ON club.seat_waits TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON club.seat_rules TO underfoot_web;--> statement-breakpoint
GRANT SELECT ON club.seat_rules TO underfoot_worker;
