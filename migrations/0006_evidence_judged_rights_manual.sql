-- Written by hand: drizzle-kit knows neither FORCE nor GRANT.
ALTER TABLE adoption_results FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE result_states FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE result_judgements FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE evaluations FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE facility_versions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE policy_versions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE correlation_versions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE correlation_adoptions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE proposals FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE proposal_decisions FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE check_measurements FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adjustments FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE correlations FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE test_plans FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adoption_results ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE result_states ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE result_judgements ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE evaluations ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE facility_versions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE policy_versions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE correlation_versions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE correlation_adoptions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE proposals ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE proposal_decisions ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE check_measurements ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE adjustments ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE correlations ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
ALTER TABLE test_plans ALTER COLUMN organisation_id SET STATISTICS 0;--> statement-breakpoint
GRANT SELECT, INSERT ON adoption_results TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON result_states TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON result_judgements TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON evaluations TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON facility_versions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON policy_versions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON correlation_versions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON correlation_adoptions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON proposals TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT ON proposal_decisions TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON check_measurements TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON adjustments TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON correlations TO wakeledger_tenant;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON test_plans TO wakeledger_tenant;
