CREATE SCHEMA "club";
--> statement-breakpoint
CREATE SCHEMA "identity";
--> statement-breakpoint
CREATE TABLE "identity"."clubs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."clubs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."invitations" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"token_hash" "bytea" NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"roles" text[] NOT NULL,
	"athlete_id" uuid,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	"invited_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invitations_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "identity"."invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."memberships" (
	"club_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"roles" text[] NOT NULL,
	"active" boolean DEFAULT true NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_club_id_person_id_pk" PRIMARY KEY("club_id","person_id")
);
--> statement-breakpoint
ALTER TABLE "identity"."memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."outbox" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"club_id" uuid,
	"to_address" text NOT NULL,
	"template" text NOT NULL,
	"payload" jsonb NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text,
	"sent_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."outbox" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."password_resets" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"token_hash" "bytea" NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."password_resets" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."people" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."people" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
ALTER TABLE "identity"."rate_limits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "identity"."sign_in_sessions" (
	"sid" text PRIMARY KEY NOT NULL,
	"sess" json NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
ALTER TABLE "identity"."sign_in_sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."athletes" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"name_key" text NOT NULL,
	"born_on" date,
	"recorded_mass_kg" double precision,
	"person_id" uuid,
	"archived_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "athletes_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."athletes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."settings" (
	"club_id" uuid PRIMARY KEY NOT NULL,
	"landing_peak_limits" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"seats" integer DEFAULT 0 NOT NULL,
	"demo" boolean DEFAULT false NOT NULL,
	"version" integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
ALTER TABLE "club"."settings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."squad_members" (
	"club_id" uuid NOT NULL,
	"squad_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	CONSTRAINT "squad_members_club_id_squad_id_athlete_id_pk" PRIMARY KEY("club_id","squad_id","athlete_id")
);
--> statement-breakpoint
ALTER TABLE "club"."squad_members" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."squads" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"archived_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "squads_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."squads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."audit_log" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid,
	"action" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "audit_log_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."audit_log" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."idempotency_keys" (
	"club_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"key" text NOT NULL,
	"route" text NOT NULL,
	"request_hash" "bytea" NOT NULL,
	"status" integer,
	"response" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_keys_club_id_person_id_key_pk" PRIMARY KEY("club_id","person_id","key")
);
--> statement-breakpoint
ALTER TABLE "club"."idempotency_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."session_results" (
	"club_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"session_id" uuid NOT NULL,
	"test_key" text NOT NULL,
	"edition" text NOT NULL,
	"protocol" text NOT NULL,
	"side" text NOT NULL,
	"external_load_kg" double precision NOT NULL,
	"box_height_m" double precision,
	"arms" text NOT NULL,
	"session_date" date NOT NULL,
	"trial_ids" uuid[] NOT NULL,
	"analysis_ids" uuid[] NOT NULL,
	"metric_values" jsonb NOT NULL,
	"metric_u" jsonb NOT NULL,
	"metric_u_repeat" jsonb NOT NULL,
	"rebuilt_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "session_results_club_id_athlete_id_session_id_test_key_edition_pk" PRIMARY KEY("club_id","athlete_id","session_id","test_key","edition")
);
--> statement-breakpoint
ALTER TABLE "club"."session_results" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."publications" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"session_id" uuid NOT NULL,
	"published_by" uuid NOT NULL,
	"published_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "publications_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."publications" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."session_athletes" (
	"club_id" uuid NOT NULL,
	"session_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	CONSTRAINT "session_athletes_club_id_session_id_athlete_id_pk" PRIMARY KEY("club_id","session_id","athlete_id")
);
--> statement-breakpoint
ALTER TABLE "club"."session_athletes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."session_squads" (
	"club_id" uuid NOT NULL,
	"session_id" uuid NOT NULL,
	"squad_id" uuid NOT NULL,
	CONSTRAINT "session_squads_club_id_session_id_squad_id_pk" PRIMARY KEY("club_id","session_id","squad_id")
);
--> statement-breakpoint
ALTER TABLE "club"."session_squads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."sessions" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"date" date NOT NULL,
	"title" text NOT NULL,
	"place" text,
	"note" text,
	"protocol" text NOT NULL,
	"created_by" uuid NOT NULL,
	"published_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sessions_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."analyses" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"trial_id" uuid NOT NULL,
	"engine_version" text NOT NULL,
	"inputs_hash" "bytea" NOT NULL,
	"inputs" jsonb NOT NULL,
	"events" jsonb NOT NULL,
	"metric_values" jsonb NOT NULL,
	"metric_uncertainties" jsonb NOT NULL,
	"sides" jsonb,
	"ledger" jsonb,
	"checks" jsonb NOT NULL,
	"missing" jsonb NOT NULL,
	"notes" jsonb NOT NULL,
	"superseded_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "analyses_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."analyses" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."published_trials" (
	"club_id" uuid NOT NULL,
	"publication_id" uuid NOT NULL,
	"trial_id" uuid NOT NULL,
	"analysis_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"current" boolean DEFAULT true NOT NULL,
	CONSTRAINT "published_trials_club_id_publication_id_trial_id_pk" PRIMARY KEY("club_id","publication_id","trial_id")
);
--> statement-breakpoint
ALTER TABLE "club"."published_trials" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."trial_samples" (
	"club_id" uuid NOT NULL,
	"trial_id" uuid NOT NULL,
	"sample_rate_hz" double precision NOT NULL,
	"sample_count" integer NOT NULL,
	"channels" text[] NOT NULL,
	"filled_samples" integer NOT NULL,
	"time_base_error" double precision NOT NULL,
	"encoding" text NOT NULL,
	"bytes" "bytea" NOT NULL,
	CONSTRAINT "trial_samples_club_id_trial_id_pk" PRIMARY KEY("club_id","trial_id")
);
--> statement-breakpoint
ALTER TABLE "club"."trial_samples" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."trials" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"session_id" uuid NOT NULL,
	"upload_id" uuid NOT NULL,
	"ordinal" integer DEFAULT 1 NOT NULL,
	"athlete_id" uuid,
	"assigned_by" text,
	"protocol" text NOT NULL,
	"side" text DEFAULT 'both' NOT NULL,
	"external_load_kg" double precision DEFAULT 0 NOT NULL,
	"box_height_m" double precision,
	"arms" text DEFAULT 'hips' NOT NULL,
	"set_aside_reason" text,
	"set_aside_by" uuid,
	"set_aside_at" timestamp with time zone,
	"start_s" double precision NOT NULL,
	"end_s" double precision NOT NULL,
	"preview" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "trials_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."trials" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."file_chunks" (
	"club_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"bytes" "bytea" NOT NULL,
	CONSTRAINT "file_chunks_club_id_file_id_n_pk" PRIMARY KEY("club_id","file_id","n")
);
--> statement-breakpoint
ALTER TABLE "club"."file_chunks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."files" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"size_bytes" bigint NOT NULL,
	"sha256" "bytea",
	"finished_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "files_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "club"."uploads" (
	"club_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"session_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"state" text DEFAULT 'receiving' NOT NULL,
	"error" jsonb,
	"reading" jsonb,
	"duplicate_of" uuid,
	"uploaded_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "uploads_club_id_id_pk" PRIMARY KEY("club_id","id")
);
--> statement-breakpoint
ALTER TABLE "club"."uploads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "identity"."invitations" ADD CONSTRAINT "invitations_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."invitations" ADD CONSTRAINT "invitations_club_id_invited_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","invited_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."memberships" ADD CONSTRAINT "memberships_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."memberships" ADD CONSTRAINT "memberships_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."outbox" ADD CONSTRAINT "outbox_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "identity"."password_resets" ADD CONSTRAINT "password_resets_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "identity"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."athletes" ADD CONSTRAINT "athletes_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."athletes" ADD CONSTRAINT "athletes_club_id_person_id_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","person_id") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."settings" ADD CONSTRAINT "settings_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."squad_members" ADD CONSTRAINT "squad_members_club_id_squad_id_squads_club_id_id_fk" FOREIGN KEY ("club_id","squad_id") REFERENCES "club"."squads"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."squad_members" ADD CONSTRAINT "squad_members_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."squads" ADD CONSTRAINT "squads_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."audit_log" ADD CONSTRAINT "audit_log_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."audit_log" ADD CONSTRAINT "audit_log_club_id_person_id_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","person_id") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."idempotency_keys" ADD CONSTRAINT "idempotency_keys_club_id_person_id_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","person_id") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_results" ADD CONSTRAINT "session_results_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_results" ADD CONSTRAINT "session_results_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."publications" ADD CONSTRAINT "publications_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."publications" ADD CONSTRAINT "publications_club_id_published_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","published_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_athletes" ADD CONSTRAINT "session_athletes_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_athletes" ADD CONSTRAINT "session_athletes_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_squads" ADD CONSTRAINT "session_squads_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."session_squads" ADD CONSTRAINT "session_squads_club_id_squad_id_squads_club_id_id_fk" FOREIGN KEY ("club_id","squad_id") REFERENCES "club"."squads"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."sessions" ADD CONSTRAINT "sessions_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."sessions" ADD CONSTRAINT "sessions_club_id_created_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","created_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."analyses" ADD CONSTRAINT "analyses_club_id_trial_id_trials_club_id_id_fk" FOREIGN KEY ("club_id","trial_id") REFERENCES "club"."trials"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."published_trials" ADD CONSTRAINT "published_trials_club_id_publication_id_publications_club_id_id_fk" FOREIGN KEY ("club_id","publication_id") REFERENCES "club"."publications"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."published_trials" ADD CONSTRAINT "published_trials_club_id_trial_id_trials_club_id_id_fk" FOREIGN KEY ("club_id","trial_id") REFERENCES "club"."trials"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."published_trials" ADD CONSTRAINT "published_trials_club_id_analysis_id_analyses_club_id_id_fk" FOREIGN KEY ("club_id","analysis_id") REFERENCES "club"."analyses"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."published_trials" ADD CONSTRAINT "published_trials_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."trial_samples" ADD CONSTRAINT "trial_samples_club_id_trial_id_trials_club_id_id_fk" FOREIGN KEY ("club_id","trial_id") REFERENCES "club"."trials"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."trials" ADD CONSTRAINT "trials_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."trials" ADD CONSTRAINT "trials_club_id_upload_id_uploads_club_id_id_fk" FOREIGN KEY ("club_id","upload_id") REFERENCES "club"."uploads"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."trials" ADD CONSTRAINT "trials_club_id_athlete_id_athletes_club_id_id_fk" FOREIGN KEY ("club_id","athlete_id") REFERENCES "club"."athletes"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."trials" ADD CONSTRAINT "trials_club_id_set_aside_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","set_aside_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."file_chunks" ADD CONSTRAINT "file_chunks_club_id_file_id_files_club_id_id_fk" FOREIGN KEY ("club_id","file_id") REFERENCES "club"."files"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."files" ADD CONSTRAINT "files_club_id_clubs_id_fk" FOREIGN KEY ("club_id") REFERENCES "identity"."clubs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_session_id_sessions_club_id_id_fk" FOREIGN KEY ("club_id","session_id") REFERENCES "club"."sessions"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_file_id_files_club_id_id_fk" FOREIGN KEY ("club_id","file_id") REFERENCES "club"."files"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_duplicate_of_uploads_club_id_id_fk" FOREIGN KEY ("club_id","duplicate_of") REFERENCES "club"."uploads"("club_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "club"."uploads" ADD CONSTRAINT "uploads_club_id_uploaded_by_memberships_club_id_person_id_fk" FOREIGN KEY ("club_id","uploaded_by") REFERENCES "identity"."memberships"("club_id","person_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_token" ON "identity"."invitations" USING btree ("token_hash");--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_open" ON "identity"."invitations" USING btree ("club_id","email") WHERE accepted_at is null and withdrawn_at is null;--> statement-breakpoint
CREATE INDEX "memberships_person" ON "identity"."memberships" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "password_resets_token" ON "identity"."password_resets" USING btree ("token_hash");--> statement-breakpoint
CREATE UNIQUE INDEX "people_email" ON "identity"."people" USING btree ("email");--> statement-breakpoint
CREATE INDEX "sign_in_sessions_expire" ON "identity"."sign_in_sessions" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "sign_in_sessions_person" ON "identity"."sign_in_sessions" USING btree (("sess" -> 'passport' -> 'user' ->> 'personId'));--> statement-breakpoint
CREATE UNIQUE INDEX "athletes_person" ON "club"."athletes" USING btree ("club_id","person_id");--> statement-breakpoint
CREATE INDEX "athletes_name" ON "club"."athletes" USING btree ("club_id","name_key");--> statement-breakpoint
CREATE INDEX "squad_members_athlete" ON "club"."squad_members" USING btree ("club_id","athlete_id");--> statement-breakpoint
CREATE UNIQUE INDEX "squads_name" ON "club"."squads" USING btree ("club_id",lower("name")) WHERE archived_at is null;--> statement-breakpoint
CREATE INDEX "audit_log_at" ON "club"."audit_log" USING btree ("club_id","at");--> statement-breakpoint
CREATE INDEX "idempotency_keys_age" ON "club"."idempotency_keys" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "session_results_session" ON "club"."session_results" USING btree ("club_id","session_id","edition");--> statement-breakpoint
CREATE INDEX "session_results_date" ON "club"."session_results" USING btree ("club_id","edition","test_key","session_date");--> statement-breakpoint
CREATE INDEX "publications_session" ON "club"."publications" USING btree ("club_id","session_id","published_at");--> statement-breakpoint
CREATE INDEX "session_athletes_athlete" ON "club"."session_athletes" USING btree ("club_id","athlete_id");--> statement-breakpoint
CREATE INDEX "sessions_date" ON "club"."sessions" USING btree ("club_id","date");--> statement-breakpoint
CREATE UNIQUE INDEX "analyses_inputs" ON "club"."analyses" USING btree ("club_id","trial_id","engine_version","inputs_hash");--> statement-breakpoint
CREATE UNIQUE INDEX "analyses_current" ON "club"."analyses" USING btree ("club_id","trial_id") WHERE superseded_at is null;--> statement-breakpoint
CREATE INDEX "published_trials_trial" ON "club"."published_trials" USING btree ("club_id","trial_id");--> statement-breakpoint
CREATE INDEX "published_trials_analysis" ON "club"."published_trials" USING btree ("club_id","analysis_id");--> statement-breakpoint
CREATE UNIQUE INDEX "trials_of_upload" ON "club"."trials" USING btree ("club_id","upload_id","ordinal");--> statement-breakpoint
CREATE INDEX "trials_session" ON "club"."trials" USING btree ("club_id","session_id");--> statement-breakpoint
CREATE INDEX "trials_athlete" ON "club"."trials" USING btree ("club_id","athlete_id");--> statement-breakpoint
CREATE UNIQUE INDEX "files_sha256" ON "club"."files" USING btree ("club_id","sha256") WHERE sha256 is not null;--> statement-breakpoint
CREATE INDEX "uploads_session" ON "club"."uploads" USING btree ("club_id","session_id");--> statement-breakpoint
CREATE INDEX "uploads_file" ON "club"."uploads" USING btree ("club_id","file_id");--> statement-breakpoint
CREATE POLICY "clubs_identity" ON "identity"."clubs" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "clubs_own" ON "identity"."clubs" AS PERMISSIVE FOR SELECT TO "underfoot_web", "underfoot_worker" USING (id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_identity" ON "identity"."invitations" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "invitations_own_club" ON "identity"."invitations" AS PERMISSIVE FOR ALL TO "underfoot_web" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_admin" ON "identity"."invitations" AS RESTRICTIVE FOR ALL TO "underfoot_web" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)');--> statement-breakpoint
CREATE POLICY "memberships_identity" ON "identity"."memberships" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "memberships_own_club" ON "identity"."memberships" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "outbox_identity" ON "identity"."outbox" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "outbox_write" ON "identity"."outbox" AS PERMISSIVE FOR INSERT TO "underfoot_web", "underfoot_worker" WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "password_resets_identity" ON "identity"."password_resets" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "people_identity" ON "identity"."people" AS PERMISSIVE FOR ALL TO "underfoot_identity" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "people_of_club" ON "identity"."people" AS PERMISSIVE FOR SELECT TO "underfoot_web", "underfoot_worker" USING (id = nullif(current_setting('app.person_id', true), '')::uuid or exists (select 1 from identity.memberships m where m.person_id = id and m.club_id = nullif(current_setting('app.club_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "rate_limits_web" ON "identity"."rate_limits" AS PERMISSIVE FOR ALL TO "underfoot_web" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "sign_in_sessions_web" ON "identity"."sign_in_sessions" AS PERMISSIVE FOR ALL TO "underfoot_identity", "underfoot_web" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "athletes_own_club" ON "club"."athletes" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "athletes_staff_or_own" ON "club"."athletes" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (person_id = nullif(current_setting('app.person_id', true), '')::uuid)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "settings_own_club" ON "club"."settings" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "settings_staff_or_own" ON "club"."settings" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (true)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "squad_members_own_club" ON "club"."squad_members" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "squad_members_staff_only" ON "club"."squad_members" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "squads_own_club" ON "club"."squads" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "squads_staff_or_own" ON "club"."squads" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (true)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "audit_log_own_club" ON "club"."audit_log" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "idempotency_keys_own" ON "club"."idempotency_keys" AS PERMISSIVE FOR ALL TO "underfoot_web" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid and person_id = nullif(current_setting('app.person_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid and person_id = nullif(current_setting('app.person_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "session_results_own_club" ON "club"."session_results" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "session_results_staff_or_own" ON "club"."session_results" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (edition = 'published' and exists (select 1 from club.athletes a where a.club_id = session_results.club_id and a.id = session_results.athlete_id and a.person_id = nullif(current_setting('app.person_id', true), '')::uuid))) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "publications_own_club" ON "club"."publications" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "publications_staff_or_own" ON "club"."publications" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (true)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "session_athletes_own_club" ON "club"."session_athletes" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "session_athletes_staff_only" ON "club"."session_athletes" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "session_squads_own_club" ON "club"."session_squads" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "session_squads_staff_only" ON "club"."session_squads" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "sessions_own_club" ON "club"."sessions" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "sessions_staff_or_own" ON "club"."sessions" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (published_at is not null)) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "analyses_own_club" ON "club"."analyses" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "analyses_staff_or_own" ON "club"."analyses" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (exists (select 1 from club.published_trials p where p.club_id = analyses.club_id and p.analysis_id = analyses.id and p.current))) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "published_trials_own_club" ON "club"."published_trials" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "published_trials_staff_or_own" ON "club"."published_trials" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (exists (select 1 from club.athletes a where a.club_id = published_trials.club_id and a.id = published_trials.athlete_id and a.person_id = nullif(current_setting('app.person_id', true), '')::uuid))) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "trial_samples_own_club" ON "club"."trial_samples" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "trial_samples_staff_or_own" ON "club"."trial_samples" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (exists (select 1 from club.published_trials p where p.club_id = trial_samples.club_id and p.trial_id = trial_samples.trial_id and p.current))) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "trials_own_club" ON "club"."trials" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "trials_staff_or_own" ON "club"."trials" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)' or (exists (select 1 from club.published_trials p where p.club_id = trials.club_id and p.trial_id = trials.id and p.current))) WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "file_chunks_own_club" ON "club"."file_chunks" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "file_chunks_staff_only" ON "club"."file_chunks" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "files_own_club" ON "club"."files" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "files_staff_only" ON "club"."files" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');--> statement-breakpoint
CREATE POLICY "uploads_own_club" ON "club"."uploads" AS PERMISSIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (club_id = nullif(current_setting('app.club_id', true), '')::uuid) WITH CHECK (club_id = nullif(current_setting('app.club_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "uploads_staff_only" ON "club"."uploads" AS RESTRICTIVE FOR ALL TO "underfoot_web", "underfoot_worker" USING (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)') WITH CHECK (coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)');