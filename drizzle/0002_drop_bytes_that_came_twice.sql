CREATE POLICY "file_chunks_only_unfinished_deleted" ON "club"."file_chunks" AS RESTRICTIVE FOR DELETE TO "underfoot_web" USING (exists (select 1 from club.files f where f.club_id = file_chunks.club_id and f.id = file_chunks.file_id and f.finished_at is null));--> statement-breakpoint
CREATE POLICY "files_only_unfinished_deleted" ON "club"."files" AS RESTRICTIVE FOR DELETE TO "underfoot_web" USING (finished_at is null);--> statement-breakpoint
GRANT DELETE ON club.files, club.file_chunks TO underfoot_web;
