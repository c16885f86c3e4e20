ALTER TABLE "club"."sessions" ADD COLUMN "side" text DEFAULT 'both' NOT NULL;--> statement-breakpoint
ALTER TABLE "club"."sessions" ADD COLUMN "external_load_kg" double precision DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "club"."sessions" ADD COLUMN "box_height_m" double precision;--> statement-breakpoint
ALTER TABLE "club"."sessions" ADD COLUMN "arms" text DEFAULT 'hips' NOT NULL;--> statement-breakpoint
-- A trial that is put to another test has no current figures until it is analysed anew.
GRANT UPDATE (superseded_at) ON club.analyses TO underfoot_web;
