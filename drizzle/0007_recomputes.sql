CREATE TABLE "club"."measuring_settings" (
	"club_id" uuid NOT NULL,
	"edition" integer NOT NULL,
	"changed" jsonb NOT NULL,
	"changed_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "measuring_settings_club_id_edition_pk" PRIMARY KEY("club_id","edition")
);
--> statement-breakpoint
ALTER TABLE "club"."measuring_settings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."plate_calibrations" (
	"club_id" uuid NOT NULL,
	"edition" integer NOT NULL,
	"left_u" double precision NOT NULL,
	"right_u" double precision NOT NULL,
	"single_u" double precision NOT NULL,
	"total_u" double precision NOT NULL,
	"latitude_deg" double precision,
	"altitude_m" double precision,
	"changed_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plate_calibrations_club_id_edition_pk" PRIMARY KEY("club_id","edition")
);
--> statement-breakpoint
ALTER TABLE "club"."plate_calibrations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."recompute_batches" (
	"club_id" uuid NOT NULL,
	"recompute_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"trial_ids" uuid[] NOT NULL,
	"done_at" timestamp with time zone,
	"moves" jsonb,
	CONSTRAINT "recompute_batches_club_id_recompute_id_n_pk" PRIMARY KEY("club_id","recompute_id","n")
);
--> statement-breakpoint
ALTER TABLE "club"."recompute_batches" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."recomputes" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"scope" text NOT NULL,
	"session_id" uuid,
	"athlete_id" uuid,
	"dry_run" boolean NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"engine_version" text NOT NULL,
	"made_with" jsonb NOT NULL,
	"total" integer NOT NULL,
	"done" integer DEFAULT 0 NOT NULL,
	"moves" jsonb,
	"requested_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp with time zone,
	"finished_at" timestamp with time zone,
	CONSTRAINT "recomputes_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."recomputes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "club"."measuring_settings" ADD CONSTRAINT "measuring_settings_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."measuring_settings" ADD CONSTRAINT "measuring_settings_club_id_changed_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","changed_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."plate_calibrations" ADD CONSTRAINT "plate_calibrations_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."plate_calibrations" ADD CONSTRAINT "plate_calibrations_club_id_changed_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","changed_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."recompute_batches" ADD CONSTRAINT "recompute_batches_club_id_recompute_id_recomputes_club_id_id_fk" FOREIGN KEY ("club_id","recompute_id") REFERENCES "club"."recomputes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."recomputes" ADD CONSTRAINT "recomputes_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."recomputes" ADD CONSTRAINT "recomputes_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."recomputes" ADD CONSTRAINT "recomputes_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."recomputes" ADD CONSTRAINT "recomputes_club_id_requested_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","requested_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "recomputes_made" ON "club"."recomputes" USING btree ("club_id","created_at");--> statement-breakpoint
CREATE UNIQUE INDEX "recomputes_open" ON "club"."recomputes" USING btree ("club_id") WHERE state in ('waiting', 'running');--> statement-breakpoint
CREATE POLICY "measuring_settings_own_club" ON "club"."measuring_settings" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "measuring_settings_staff_only" ON "club"."measuring_settings" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "plate_calibrations_own_club" ON "club"."plate_calibrations" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "plate_calibrations_staff_only" ON "club"."plate_calibrations" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "recompute_batches_own_club" ON "club"."recompute_batches" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "recompute_batches_staff_only" ON "club"."recompute_batches" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "recomputes_own_club" ON "club"."recomputes" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "recomputes_staff_only" ON "club"."recomputes" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
ALTER TABLE club.measuring_settings FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.plate_calibrations FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.recomputes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.recompute_batches FORCE ROW LEVEL SECURITY;--> statement-breakpoint
-- Editions are added, never rewritten; web asks for a recompute and cancels it, the worker does the rest.
GRANT SELECT, INSERT ON club.measuring_settings, club.plate_calibrations TO underfoot_web;--> statement-breakpoint
GRANT SELECT ON club.measuring_settings, club.plate_calibrations TO underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT ON club.recomputes, club.recompute_batches TO underfoot_web;--> statement-breakpoint
GRANT UPDATE (state, finished_at) ON club.recomputes TO underfoot_web;--> statement-breakpoint
GRANT SELECT ON club.recomputes, club.recompute_batches TO underfoot_worker;--> statement-breakpoint
GRANT UPDATE (state, done, moves, started_at, finished_at) ON club.recomputes TO underfoot_worker;--> statement-breakpoint
GRANT UPDATE (done_at, moves) ON club.recompute_batches TO underfoot_worker;
