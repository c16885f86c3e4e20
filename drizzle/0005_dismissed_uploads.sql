ALTER TABLE "club"."file_chunks" ADD COLUMN "received_at" timestamp with time zone DEFAULT now() NOT NULL;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD COLUMN "dismissed_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD COLUMN "dismissed_by" uuid;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_dismissed_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","dismissed_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_dismissal" CHECK ((dismissed_at is null) = (dismissed_by is null));