CREATE TABLE "club"."trial_spreads" (
	"club_id" uuid NOT NULL,
	"session_id" uuid NOT NULL,
	"test_key" text NOT NULL,
	"edition" text NOT NULL,
	"spreads" jsonb NOT NULL,
	CONSTRAINT "trial_spreads_club_id_session_id_test_key_edition_pk" PRIMARY KEY("club_id","session_id","test_key","edition")
);
--> statement-breakpoint
ALTER TABLE "club"."trial_spreads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "club"."trial_spreads" ADD CONSTRAINT "trial_spreads_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE POLICY "trial_spreads_own_club" ON "club"."trial_spreads" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "trial_spreads_staff_or_own" ON "club"."trial_spreads" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (edition = 'published')) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
ALTER TABLE club.trial_spreads FORCE ROW LEVEL SECURITY;--> statement-breakpoint
GRANT SELECT, INSERT, DELETE ON club.trial_spreads TO underfoot_web, underfoot_worker;
