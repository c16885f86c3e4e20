CREATE TABLE "club"."event_moves" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"trial_id" uuid NOT NULL,
	"events" jsonb NOT NULL,
	"stood" jsonb NOT NULL,
	"reason" text,
	"moved_by" uuid NOT NULL,
	"moved_at" timestamp with time zone NOT NULL,
	"superseded_at" timestamp with time zone,
	CONSTRAINT "event_moves_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."event_moves" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "club"."event_moves" ADD CONSTRAINT "event_moves_club_id_trial_id_trials_club_id_id_fk" FOREIGN KEY ("club_id","trial_id") REFERENCES "club"."trials"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."event_moves" ADD CONSTRAINT "event_moves_club_id_moved_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","moved_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "event_moves_trial" ON "club"."event_moves" USING btree ("club_id","trial_id","moved_at");--> statement-breakpoint
CREATE UNIQUE INDEX "event_moves_current" ON "club"."event_moves" USING btree ("club_id","trial_id") WHERE superseded_at is null;--> statement-breakpoint
CREATE POLICY "event_moves_own_club" ON "club"."event_moves" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "event_moves_staff_only" ON "club"."event_moves" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
ALTER TABLE club.event_moves FORCE ROW LEVEL SECURITY;--> statement-breakpoint
GRANT SELECT, INSERT ON club.event_moves TO underfoot_web;--> statement-breakpoint
GRANT UPDATE (superseded_at) ON club.event_moves TO underfoot_web;--> statement-breakpoint
GRANT SELECT ON club.event_moves TO underfoot_worker;
