-- Written by hand: drizzle-kit knows neither FORCE nor GRANT. The roles themselves are created before migrating
-- (server/db/bootstrap-roles.ts). server/db/grants.ts is the list that check-rls compares this with.
REVOKE ALL ON SCHEMA public FROM PUBLIC;--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO wakeledger_maintenance, wakeledger_tenant, wakeledger_platform;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA public TO wakeledger_maintenance;--> statement-breakpoint
ALTER DEFAULT PRIVILEGES FOR ROLE wakeledger_owner IN SCHEMA public GRANT SELECT, INSERT, UPDATE, DELETE ON TABLES TO wakeledger_maintenance;--> statement-breakpoint
GRANT USAGE ON SCHEMA drizzle TO wakeledger_platform, wakeledger_maintenance;--> statement-breakpoint
GRANT SELECT ON drizzle.__drizzle_migrations TO wakeledger_platform, wakeledger_maintenance;--> statement-breakpoint

ALTER TABLE memberships FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE audit_events FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE commands FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE jobs FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE outbox FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE counters FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE programmes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE milestones FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE recent_programmes FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE facilities FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE test_sessions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE variants FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE frontal_areas FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE configurations FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE cycles FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE attachments FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE imports FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE import_rows FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE import_mappings FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE results FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE result_points FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE result_withdrawals FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adoptions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE organisations FORCE ROW LEVEL SECURITY;--> statement-breakpoint

-- Planner statistics of this column would let EXPLAIN tell how many rows another organisation has.
ALTER TABLE memberships ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE audit_events ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE commands ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE jobs ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE outbox ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE counters ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE programmes ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE milestones ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE recent_programmes ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE facilities ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE test_sessions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE variants ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE frontal_areas ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE configurations ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE cycles ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE attachments ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE imports ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE import_rows ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE import_mappings ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE results ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE result_points ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE result_withdrawals ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE adoptions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint

GRANT SELECT ON memberships TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON audit_events TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON commands TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON jobs TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON outbox TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON counters TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON programmes TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON milestones TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON recent_programmes TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON facilities TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON test_sessions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON variants TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON frontal_areas TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON configurations TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON cycles TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON attachments TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON imports TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON import_rows TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON import_mappings TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON results TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON result_points TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON result_withdrawals TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON adoptions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT ON organisations TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT ON reference_cycles TO wakeledger_tenant;--> statement-breakpoint

GRANT SELECT ON organisations TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT ON memberships TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT ON users TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON user_settings TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT ON password_tokens TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON web_sessions TO wakeledger_platform;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON sign_in_limits TO wakeledger_platform;--> statement-breakpoint
GRANT UPDATE (password_hash) ON users TO wakeledger_platform;--> statement-breakpoint
GRANT UPDATE (used_at) ON password_tokens TO wakeledger_platform;
