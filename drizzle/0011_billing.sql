CREATE TABLE "club"."billing_notices" (
	"club_id" uuid NOT NULL,
	"key" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "billing_notices_club_id_key_pk" PRIMARY KEY("club_id","key")
);
--> statement-breakpoint
ALTER TABLE "club"."billing_notices" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."nightly_runs" (
	"queue" text NOT NULL,
	"night" date NOT NULL,
	CONSTRAINT "nightly_runs_queue_night_pk" PRIMARY KEY("queue","night")
);
--> statement-breakpoint
ALTER TABLE "identity"."nightly_runs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."payment_customers" (
	"club_id" uuid PRIMARY KEY NOT NULL,
	"customer_id" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."payment_customers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."payment_events" (
	"id" text PRIMARY KEY NOT NULL,
	"type" text NOT NULL,
	"customer_id" text,
	"happened_at" timestamp with time zone NOT NULL,
	"received_at" timestamp with time zone NOT NULL,
	"body" text NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."payment_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."standings" (
	"club_id" uuid PRIMARY KEY NOT NULL,
	"reads_only_from" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "club"."standings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."subscriptions" (
	"club_id" uuid PRIMARY KEY NOT NULL,
	"truth" jsonb,
	"trial_ends_at" timestamp with time zone,
	"synced_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
ALTER TABLE "club"."subscriptions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "club"."billing_notices" ADD CONSTRAINT "billing_notices_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."payment_customers" ADD CONSTRAINT "payment_customers_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."standings" ADD CONSTRAINT "standings_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."subscriptions" ADD CONSTRAINT "subscriptions_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "payment_customers_customer" ON "identity"."payment_customers" USING btree ("customer_id");--> statement-breakpoint
CREATE POLICY "billing_notices_own_club" ON "club"."billing_notices" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "billing_notices_admin" ON "club"."billing_notices" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)' or nullif(current_setting('app.person_id', true), '')::uuid is null) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)' or nullif(current_setting('app.person_id', true), '')::uuid is null);--> statement-breakpoint
CREATE POLICY "nightly_runs_identity" ON "identity"."nightly_runs" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "payment_customers_identity" ON "identity"."payment_customers" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "payment_events_identity" ON "identity"."payment_events" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "standings_own_club" ON "club"."standings" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "standings_staff_or_own" ON "club"."standings" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (true)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "subscriptions_own_club" ON "club"."subscriptions" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "subscriptions_admin" ON "club"."subscriptions" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)' or nullif(current_setting('app.person_id', true), '')::uuid is null) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)' or nullif(current_setting('app.person_id', true), '')::uuid is null);--> statement-breakpoint
ALTER TABLE identity.payment_customers FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.payment_events FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.nightly_runs FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.standings FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.subscriptions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.billing_notices FORCE ROW LEVEL SECURITY;--> statement-breakpoint
-- What was once stored of events, customers and nights stays as it is.
GRANT SELECT, INSERT ON identity.payment_customers, identity.payment_events, identity.nightly_runs TO underfoot_identity;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON club.standings, club.subscriptions TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT ON club.billing_notices TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT UPDATE (seats) ON club.settings TO underfoot_worker;
