ALTER TABLE "club"."files" ADD COLUMN "archive_id" uuid;--> statement-breakpoint
ALTER TABLE "club"."files" ADD COLUMN "archived" jsonb;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD COLUMN "archive_upload_id" uuid;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD COLUMN "archive_place" integer;--> statement-breakpoint
ALTER TABLE "club"."files" ADD CONSTRAINT "files_club_id_archive_id_files_club_id_id_fk" FOREIGN KEY ("club_id","archive_id") REFERENCES "club"."files"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_archive_upload_id_uploads_club_id_id_fk" FOREIGN KEY ("club_id","archive_upload_id") REFERENCES "club"."uploads"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "uploads_of_archive" ON "club"."uploads" USING btree ("club_id","archive_upload_id","archive_place");--> statement-breakpoint
ALTER TABLE "club"."files" ADD CONSTRAINT "files_archived" CHECK ((archive_id is null) = (archived is null));--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_archive_place" CHECK ((archive_upload_id is null) = (archive_place is null));--> statement-breakpoint
-- The worker takes an archive apart: its files and uploads are rows of their own.
GRANT INSERT ON club.files, club.uploads TO underfoot_worker;
