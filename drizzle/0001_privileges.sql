-- Row-level security holds for the owner too: whoever forgets the club sees nothing.
ALTER TABLE identity.clubs FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.people FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.memberships FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.invitations FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.password_resets FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.sign_in_sessions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.rate_limits FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE identity.outbox FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.settings FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.squads FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.athletes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.squad_members FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.sessions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.session_squads FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.session_athletes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.publications FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.published_trials FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.files FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.file_chunks FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.uploads FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.trials FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.trial_samples FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.analyses FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.session_results FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.idempotency_keys FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE club.audit_log FORCE ROW LEVEL SECURITY;--> statement-breakpoint

-- Nobody gets anything by itself: what a role may do is written here and in later migrations.
ALTER DEFAULT PRIVILEGES REVOKE EXECUTE ON FUNCTIONS FROM PUBLIC;--> statement-breakpoint
REVOKE ALL ON SCHEMA identity, club FROM PUBLIC;--> statement-breakpoint
GRANT USAGE ON SCHEMA identity TO underfoot_identity, underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT USAGE ON SCHEMA club TO underfoot_web, underfoot_worker;--> statement-breakpoint

-- People, clubs and mail, for the role that sees no club data.
GRANT SELECT, INSERT, UPDATE ON
  identity.clubs, identity.people, identity.memberships, identity.invitations, identity.password_resets,
  identity.outbox TO underfoot_identity;--> statement-breakpoint
GRANT SELECT, DELETE ON identity.sign_in_sessions TO underfoot_identity;--> statement-breakpoint

-- Web: sign-ins and rate limits as their packages keep them; of people never the password.
GRANT SELECT, INSERT, UPDATE, DELETE ON identity.sign_in_sessions, identity.rate_limits TO underfoot_web;--> statement-breakpoint
GRANT SELECT (id, email, name, version, created_at) ON identity.people TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT SELECT ON identity.clubs, identity.memberships TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT UPDATE (roles, active, version) ON identity.memberships TO underfoot_web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON identity.invitations TO underfoot_web;--> statement-breakpoint
GRANT INSERT ON identity.outbox TO underfoot_web, underfoot_worker;--> statement-breakpoint

-- Web: the club's rows. Nothing is deleted but the lines that join two rows, and keys of old requests.
GRANT SELECT, INSERT, UPDATE ON
  club.settings, club.squads, club.athletes, club.sessions, club.publications, club.published_trials,
  club.files, club.file_chunks, club.uploads, club.trials, club.session_results TO underfoot_web;--> statement-breakpoint
GRANT SELECT, INSERT, DELETE ON club.squad_members, club.session_squads, club.session_athletes TO underfoot_web;--> statement-breakpoint
GRANT DELETE ON club.session_results TO underfoot_web;--> statement-breakpoint
GRANT SELECT ON club.trial_samples, club.analyses TO underfoot_web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON club.idempotency_keys TO underfoot_web;--> statement-breakpoint
GRANT INSERT ON club.audit_log TO underfoot_web, underfoot_worker;--> statement-breakpoint

-- Worker: reads what came in, writes what it computed.
GRANT SELECT ON
  club.settings, club.squads, club.squad_members, club.athletes, club.sessions, club.session_squads,
  club.session_athletes, club.publications, club.published_trials, club.file_chunks TO underfoot_worker;--> statement-breakpoint
GRANT SELECT, UPDATE ON club.files, club.uploads TO underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON club.trials, club.trial_samples TO underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT ON club.analyses TO underfoot_worker;--> statement-breakpoint
GRANT UPDATE (superseded_at) ON club.analyses TO underfoot_worker;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON club.session_results TO underfoot_worker;--> statement-breakpoint

-- `/readyz` asks which migration was the last.
GRANT USAGE ON SCHEMA drizzle TO underfoot_web, underfoot_worker;--> statement-breakpoint
GRANT SELECT ON drizzle.__drizzle_migrations TO underfoot_web, underfoot_worker;--> statement-breakpoint

-- Bytes as they come: compressing a 1 MiB chunk of text costs ten times its writing, and samples are packed already.
ALTER TABLE club.file_chunks ALTER COLUMN bytes SET STORAGE EXTERNAL;--> statement-breakpoint
ALTER TABLE club.trial_samples ALTER COLUMN bytes SET STORAGE EXTERNAL;
