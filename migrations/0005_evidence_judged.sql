CREATE TABLE "check_measurements" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"facility_id" uuid NOT NULL,
	"test_session_id" uuid NOT NULL,
	"measured_on" date NOT NULL,
	"drag_area_m2" double precision NOT NULL,
	"s" double precision,
	"n" integer,
	"remark" text,
	"struck_reason" text,
	"struck_by" uuid,
	"struck_at" timestamp (6) with time zone,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "check_measurements_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "check_measurements_drag_area_check" CHECK ("check_measurements"."drag_area_m2" > 0),
	CONSTRAINT "check_measurements_s_check" CHECK ("check_measurements"."s" >= 0),
	CONSTRAINT "check_measurements_n_check" CHECK ("check_measurements"."n" >= 1)
);
--> statement-breakpoint
ALTER TABLE "check_measurements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "facility_versions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"facility_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"fields" jsonb NOT NULL,
	"comment" text,
	"created_by" uuid,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "facility_versions_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "facility_versions_number_key" UNIQUE("organisation_id","facility_id","number")
);
--> statement-breakpoint
ALTER TABLE "facility_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "adjustments" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"item" text NOT NULL,
	"from_value" jsonb,
	"to_value" jsonb,
	"delta_drag_area_m2" double precision,
	"u_m2" double precision,
	"per_unit_drag_area_m2" double precision,
	"u_per_unit_m2" double precision,
	"degrees_of_freedom" double precision,
	"body_shapes" text[] NOT NULL,
	"evidence" text NOT NULL,
	"attachment_id" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "adjustments_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "adjustments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "correlation_adoptions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"correlation_id" uuid NOT NULL,
	"version_id" uuid,
	"effective_date" date NOT NULL,
	"comment" text NOT NULL,
	"adopted_by" uuid NOT NULL,
	"adopted_at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "correlation_adoptions_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "correlation_adoptions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "correlation_versions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"correlation_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"replaces" text[] NOT NULL,
	"pairs" jsonb NOT NULL,
	"comment" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "correlation_versions_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "correlation_versions_number_key" UNIQUE("organisation_id","correlation_id","number"),
	CONSTRAINT "correlation_versions_correlation_id_key" UNIQUE("organisation_id","correlation_id","id")
);
--> statement-breakpoint
ALTER TABLE "correlation_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "correlations" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"facility_id" uuid NOT NULL,
	"reference_facility_id" uuid NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "correlations_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "correlations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "evaluations" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"variant_id" uuid NOT NULL,
	"adoption_id" uuid NOT NULL,
	"inputs" text NOT NULL,
	"inputs_hash" text NOT NULL,
	"methods" text[] NOT NULL,
	"parameters" jsonb NOT NULL,
	"output" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "evaluations_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "evaluations_adoption_key" UNIQUE("organisation_id","adoption_id")
);
--> statement-breakpoint
ALTER TABLE "evaluations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "policy_versions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"number" integer NOT NULL,
	"values" jsonb NOT NULL,
	"comment" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "policy_versions_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "policy_versions_number_key" UNIQUE("organisation_id","number")
);
--> statement-breakpoint
ALTER TABLE "policy_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "proposal_decisions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"proposal_id" uuid NOT NULL,
	"verdict" text NOT NULL,
	"comment" text NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "proposal_decisions_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "proposal_decisions_proposal_key" UNIQUE("organisation_id","proposal_id"),
	CONSTRAINT "proposal_decisions_verdict_check" CHECK ("proposal_decisions"."verdict" in ('accepted', 'dropped'))
);
--> statement-breakpoint
ALTER TABLE "proposal_decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "proposals" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"title" text NOT NULL,
	"comment" text NOT NULL,
	"changes" jsonb NOT NULL,
	"outcome" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "proposals_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "proposals" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "adoption_results" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"adoption_id" uuid NOT NULL,
	"variant_id" uuid NOT NULL,
	"result_id" uuid NOT NULL,
	CONSTRAINT "adoption_results_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "adoption_results_key" UNIQUE("organisation_id","adoption_id","result_id")
);
--> statement-breakpoint
ALTER TABLE "adoption_results" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "result_judgements" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"result_id" uuid NOT NULL,
	"reynolds" jsonb NOT NULL,
	"included_reason" text,
	"set_aside_reason" text,
	"comment" text,
	"judged_by" uuid NOT NULL,
	"judged_at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "result_judgements_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "result_judgements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "result_states" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"result_id" uuid NOT NULL,
	"state" text NOT NULL,
	"comment" text NOT NULL,
	"set_by" uuid NOT NULL,
	"set_at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "result_states_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "result_states_state_check" CHECK ("result_states"."state" in ('entered', 'checked'))
);
--> statement-breakpoint
ALTER TABLE "result_states" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "test_plans" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"variant_id" uuid NOT NULL,
	"facility_id" uuid NOT NULL,
	"name" text NOT NULL,
	"inputs" jsonb NOT NULL,
	"expected_since" timestamp (6) with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "test_plans_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "test_plans" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "facilities" ADD COLUMN "check_body" jsonb;--> statement-breakpoint
ALTER TABLE "test_sessions" ADD COLUMN "remark" text;--> statement-breakpoint
ALTER TABLE "test_sessions" ADD COLUMN "version" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "programmes" ADD COLUMN "friction_line" text DEFAULT 'on' NOT NULL;--> statement-breakpoint
ALTER TABLE "adoptions" ADD COLUMN "evidence" text DEFAULT 'newest' NOT NULL;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_variant_id_key" UNIQUE("organisation_id","variant_id","id");--> statement-breakpoint
ALTER TABLE "check_measurements" ADD CONSTRAINT "check_measurements_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_measurements" ADD CONSTRAINT "check_measurements_session_fkey" FOREIGN KEY ("organisation_id","facility_id","test_session_id") REFERENCES "public"."test_sessions"("organisation_id","facility_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_measurements" ADD CONSTRAINT "check_measurements_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_measurements" ADD CONSTRAINT "check_measurements_struck_by_fkey" FOREIGN KEY ("organisation_id","struck_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "facility_versions" ADD CONSTRAINT "facility_versions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "facility_versions" ADD CONSTRAINT "facility_versions_facility_fkey" FOREIGN KEY ("organisation_id","facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "facility_versions" ADD CONSTRAINT "facility_versions_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adjustments" ADD CONSTRAINT "adjustments_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adjustments" ADD CONSTRAINT "adjustments_attachment_fkey" FOREIGN KEY ("organisation_id","attachment_id") REFERENCES "public"."attachments"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adjustments" ADD CONSTRAINT "adjustments_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_adoptions" ADD CONSTRAINT "correlation_adoptions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_adoptions" ADD CONSTRAINT "correlation_adoptions_correlation_fkey" FOREIGN KEY ("organisation_id","correlation_id") REFERENCES "public"."correlations"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_adoptions" ADD CONSTRAINT "correlation_adoptions_version_fkey" FOREIGN KEY ("organisation_id","correlation_id","version_id") REFERENCES "public"."correlation_versions"("organisation_id","correlation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_adoptions" ADD CONSTRAINT "correlation_adoptions_member_fkey" FOREIGN KEY ("organisation_id","adopted_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_versions" ADD CONSTRAINT "correlation_versions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_versions" ADD CONSTRAINT "correlation_versions_correlation_fkey" FOREIGN KEY ("organisation_id","correlation_id") REFERENCES "public"."correlations"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlation_versions" ADD CONSTRAINT "correlation_versions_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlations" ADD CONSTRAINT "correlations_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlations" ADD CONSTRAINT "correlations_facility_fkey" FOREIGN KEY ("organisation_id","facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlations" ADD CONSTRAINT "correlations_reference_facility_fkey" FOREIGN KEY ("organisation_id","reference_facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "correlations" ADD CONSTRAINT "correlations_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_variant_fkey" FOREIGN KEY ("organisation_id","variant_id") REFERENCES "public"."variants"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_adoption_fkey" FOREIGN KEY ("organisation_id","adoption_id") REFERENCES "public"."adoptions"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "policy_versions" ADD CONSTRAINT "policy_versions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "policy_versions" ADD CONSTRAINT "policy_versions_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposal_decisions" ADD CONSTRAINT "proposal_decisions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposal_decisions" ADD CONSTRAINT "proposal_decisions_proposal_fkey" FOREIGN KEY ("organisation_id","proposal_id") REFERENCES "public"."proposals"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposal_decisions" ADD CONSTRAINT "proposal_decisions_member_fkey" FOREIGN KEY ("organisation_id","decided_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposals" ADD CONSTRAINT "proposals_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposals" ADD CONSTRAINT "proposals_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "proposals" ADD CONSTRAINT "proposals_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoption_results" ADD CONSTRAINT "adoption_results_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoption_results" ADD CONSTRAINT "adoption_results_adoption_fkey" FOREIGN KEY ("organisation_id","variant_id","adoption_id") REFERENCES "public"."adoptions"("organisation_id","variant_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoption_results" ADD CONSTRAINT "adoption_results_result_fkey" FOREIGN KEY ("organisation_id","variant_id","result_id") REFERENCES "public"."results"("organisation_id","variant_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_judgements" ADD CONSTRAINT "result_judgements_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_judgements" ADD CONSTRAINT "result_judgements_result_fkey" FOREIGN KEY ("organisation_id","result_id") REFERENCES "public"."results"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_judgements" ADD CONSTRAINT "result_judgements_member_fkey" FOREIGN KEY ("organisation_id","judged_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_states" ADD CONSTRAINT "result_states_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_states" ADD CONSTRAINT "result_states_result_fkey" FOREIGN KEY ("organisation_id","result_id") REFERENCES "public"."results"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_states" ADD CONSTRAINT "result_states_member_fkey" FOREIGN KEY ("organisation_id","set_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_plans" ADD CONSTRAINT "test_plans_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_plans" ADD CONSTRAINT "test_plans_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_plans" ADD CONSTRAINT "test_plans_variant_fkey" FOREIGN KEY ("organisation_id","variant_id") REFERENCES "public"."variants"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_plans" ADD CONSTRAINT "test_plans_facility_fkey" FOREIGN KEY ("organisation_id","facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_plans" ADD CONSTRAINT "test_plans_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "check_measurements_facility_idx" ON "check_measurements" USING btree ("organisation_id","facility_id","measured_on");--> statement-breakpoint
CREATE UNIQUE INDEX "adjustments_name_key" ON "adjustments" USING btree ("organisation_id",lower("name"));--> statement-breakpoint
CREATE INDEX "correlation_adoptions_idx" ON "correlation_adoptions" USING btree ("organisation_id","correlation_id","adopted_at");--> statement-breakpoint
CREATE UNIQUE INDEX "correlations_name_key" ON "correlations" USING btree ("organisation_id",lower("name"));--> statement-breakpoint
CREATE INDEX "evaluations_variant_idx" ON "evaluations" USING btree ("organisation_id","variant_id");--> statement-breakpoint
CREATE INDEX "proposals_programme_idx" ON "proposals" USING btree ("organisation_id","programme_id","created_at");--> statement-breakpoint
CREATE INDEX "adoption_results_result_idx" ON "adoption_results" USING btree ("organisation_id","result_id");--> statement-breakpoint
CREATE INDEX "result_judgements_result_idx" ON "result_judgements" USING btree ("organisation_id","result_id","judged_at");--> statement-breakpoint
CREATE INDEX "result_states_result_idx" ON "result_states" USING btree ("organisation_id","result_id","set_at");--> statement-breakpoint
CREATE INDEX "test_plans_programme_idx" ON "test_plans" USING btree ("organisation_id","programme_id");--> statement-breakpoint
ALTER TABLE "programmes" ADD CONSTRAINT "programmes_friction_line_check" CHECK ("programmes"."friction_line" in ('on', 'off'));--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_evidence_check" CHECK ("adoptions"."evidence" in ('newest', 'weighted-mean'));--> statement-breakpoint
CREATE POLICY "check_measurements_tenant" ON "check_measurements" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "facility_versions_tenant" ON "facility_versions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "adjustments_tenant" ON "adjustments" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "correlation_adoptions_tenant" ON "correlation_adoptions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "correlation_versions_tenant" ON "correlation_versions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "correlations_tenant" ON "correlations" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "evaluations_tenant" ON "evaluations" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "policy_versions_tenant" ON "policy_versions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "proposal_decisions_tenant" ON "proposal_decisions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "proposals_tenant" ON "proposals" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "adoption_results_tenant" ON "adoption_results" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "result_judgements_tenant" ON "result_judgements" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "result_states_tenant" ON "result_states" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "test_plans_tenant" ON "test_plans" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);
