CREATE TABLE "attachments" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"file_name" text NOT NULL,
	"media_type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"content" "bytea" NOT NULL,
	"created_by" uuid,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "attachments_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "attachments_size_check" CHECK (octet_length("attachments"."content") = "attachments"."bytes" and "attachments"."bytes" <= 10485760)
);
--> statement-breakpoint
ALTER TABLE "attachments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "cycles" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"source" text NOT NULL,
	"time_s" double precision[] NOT NULL,
	"speed_kmh" double precision[] NOT NULL,
	"totals" jsonb NOT NULL,
	"remark" text,
	"retired_at" timestamp (6) with time zone,
	"created_by" uuid,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "cycles_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "cycles_trace_check" CHECK (cardinality("cycles"."time_s") = cardinality("cycles"."speed_kmh"))
);
--> statement-breakpoint
ALTER TABLE "cycles" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reference_cycles" (
	"key" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"source" text NOT NULL,
	"time_s" double precision[] NOT NULL,
	"speed_kmh" double precision[] NOT NULL,
	"totals" jsonb NOT NULL,
	CONSTRAINT "reference_cycles_trace_check" CHECK (cardinality("reference_cycles"."time_s") = cardinality("reference_cycles"."speed_kmh"))
);
--> statement-breakpoint
CREATE TABLE "facilities" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"area_m2" double precision,
	"blockage" jsonb,
	"usual_condition" jsonb NOT NULL,
	"bias_u_relative" double precision,
	"bias_u_m2" double precision,
	"session_u_relative" double precision,
	"session_u_m2" double precision,
	"session_degrees_of_freedom" double precision,
	"installation_u_relative" double precision,
	"installation_u_m2" double precision,
	"installation_degrees_of_freedom" double precision,
	"repeatability_u_relative" double precision,
	"repeatability_degrees_of_freedom" double precision,
	"remark" text,
	"version" integer DEFAULT 1 NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "facilities_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "facilities_kind_check" CHECK ("facilities"."kind" in ('closed', 'open-jet', 'slotted', 'road', 'simulation')),
	CONSTRAINT "facilities_area_check" CHECK ("facilities"."area_m2" > 0)
);
--> statement-breakpoint
ALTER TABLE "facilities" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "test_sessions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"facility_id" uuid NOT NULL,
	"name" text NOT NULL,
	"start_date" date,
	"end_date" date,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "test_sessions_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "test_sessions_facility_id_key" UNIQUE("organisation_id","facility_id","id"),
	CONSTRAINT "test_sessions_dates_check" CHECK ("test_sessions"."end_date" >= "test_sessions"."start_date")
);
--> statement-breakpoint
ALTER TABLE "test_sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "import_rows" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"import_id" uuid NOT NULL,
	"row_number" integer NOT NULL,
	"cells" jsonb NOT NULL,
	"verdict" text,
	"reasons" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"fixes" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"result_id" uuid,
	CONSTRAINT "import_rows_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "import_rows_number_key" UNIQUE("organisation_id","import_id","row_number"),
	CONSTRAINT "import_rows_verdict_check" CHECK ("import_rows"."verdict" in ('accepted', 'cautioned', 'refused', 'skipped'))
);
--> statement-breakpoint
ALTER TABLE "import_rows" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "import_mappings" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"header_hash" text NOT NULL,
	"mapping" jsonb NOT NULL,
	"updated_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "import_mappings_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "import_mappings_header_key" UNIQUE("organisation_id","header_hash")
);
--> statement-breakpoint
ALTER TABLE "import_mappings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "imports" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"sha256" text NOT NULL,
	"size_bytes" bigint NOT NULL,
	"encoding" text,
	"delimiter" text,
	"decimal" text,
	"state" text DEFAULT 'reading' NOT NULL,
	"content" "bytea",
	"mapping" jsonb,
	"header" jsonb,
	"options" jsonb,
	"summary" jsonb,
	"row_count" integer DEFAULT 0 NOT NULL,
	"progress_rows" integer DEFAULT 0 NOT NULL,
	"failure" jsonb,
	"job_id" uuid,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	"stored_at" timestamp (6) with time zone,
	"withdrawn_at" timestamp (6) with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "imports_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "imports_state_check" CHECK ("imports"."state" in ('reading', 'mapping', 'checking', 'ready', 'storing', 'stored', 'withdrawn', 'cancelled', 'failed'))
);
--> statement-breakpoint
ALTER TABLE "imports" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "memberships" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"organisation_kind" text NOT NULL,
	"role" text NOT NULL,
	"display_name" text NOT NULL,
	"email" text NOT NULL,
	"ended_at" timestamp (6) with time zone,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "memberships_user_key" UNIQUE("organisation_id","user_id"),
	CONSTRAINT "memberships_role_check" CHECK (("memberships"."organisation_kind" = 'maker' and "memberships"."role" in ('administrator', 'programme-manager', 'aerodynamicist', 'stylist', 'viewer'))
        or ("memberships"."organisation_kind" = 'supplier' and "memberships"."role" in ('supplier-administrator', 'supplier-engineer')))
);
--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "organisations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"slug" text NOT NULL,
	"demo" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "organisations_id_kind_key" UNIQUE("id","kind"),
	CONSTRAINT "organisations_kind_check" CHECK ("organisations"."kind" in ('maker', 'supplier'))
);
--> statement-breakpoint
ALTER TABLE "organisations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "password_tokens" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"expires_at" timestamp (6) with time zone NOT NULL,
	"used_at" timestamp (6) with time zone
);
--> statement-breakpoint
CREATE TABLE "sign_in_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "user_settings" (
	"user_id" uuid PRIMARY KEY NOT NULL,
	"settings" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"display_name" text NOT NULL,
	"password_hash" text,
	"demo" boolean DEFAULT false NOT NULL,
	"task" text,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "web_sessions" (
	"sid" text PRIMARY KEY NOT NULL,
	"sess" jsonb NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
CREATE TABLE "milestones" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"name" text NOT NULL,
	"date" date NOT NULL,
	CONSTRAINT "milestones_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "milestones" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "programmes" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"reference_speed_kmh" double precision NOT NULL,
	"reference_air" jsonb NOT NULL,
	"reference_condition" jsonb NOT NULL,
	"characteristic_length_m" double precision NOT NULL,
	"characteristic_length_name" text NOT NULL,
	"common_area" jsonb,
	"confidence" double precision NOT NULL,
	"wind_speed_ms" double precision NOT NULL,
	"reference_facility_id" uuid,
	"remark" text,
	"version" integer DEFAULT 1 NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "programmes_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "programmes_speed_check" CHECK ("programmes"."reference_speed_kmh" > 0),
	CONSTRAINT "programmes_length_check" CHECK ("programmes"."characteristic_length_m" > 0),
	CONSTRAINT "programmes_confidence_check" CHECK ("programmes"."confidence" > 0 and "programmes"."confidence" < 1),
	CONSTRAINT "programmes_wind_check" CHECK ("programmes"."wind_speed_ms" >= 0)
);
--> statement-breakpoint
ALTER TABLE "programmes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "recent_programmes" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"programme_id" uuid NOT NULL,
	"at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "recent_programmes_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "recent_programmes_user_key" UNIQUE("organisation_id","user_id","programme_id")
);
--> statement-breakpoint
ALTER TABLE "recent_programmes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "adoptions" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"variant_id" uuid NOT NULL,
	"result_id" uuid,
	"comment" text,
	"adopted_by" uuid NOT NULL,
	"adopted_at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "adoptions_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "adoptions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "result_points" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"result_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"yaw_deg" double precision DEFAULT 0 NOT NULL,
	"value" double precision NOT NULL,
	"s" double precision,
	"n" integer,
	"speed_kmh" double precision,
	"dynamic_pressure_pa" double precision,
	"tare_n" double precision,
	"front_lift" double precision,
	"rear_lift" double precision,
	"side_force" double precision,
	CONSTRAINT "result_points_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "result_points_position_key" UNIQUE("organisation_id","result_id","position"),
	CONSTRAINT "result_points_s_check" CHECK ("result_points"."s" >= 0),
	CONSTRAINT "result_points_n_check" CHECK ("result_points"."n" >= 1)
);
--> statement-breakpoint
ALTER TABLE "result_points" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "result_withdrawals" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"result_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"withdrawn_by" uuid NOT NULL,
	"withdrawn_at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "result_withdrawals_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "result_withdrawals_result_key" UNIQUE("organisation_id","result_id")
);
--> statement-breakpoint
ALTER TABLE "result_withdrawals" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "results" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"variant_id" uuid NOT NULL,
	"facility_id" uuid NOT NULL,
	"test_session_id" uuid,
	"installation" text,
	"entry_sequence" bigint NOT NULL,
	"name" text NOT NULL,
	"test_date" date NOT NULL,
	"quantity" text NOT NULL,
	"scale" double precision DEFAULT 1 NOT NULL,
	"quoted_area_m2" double precision,
	"quoted_area_u_m2" double precision,
	"quoted_area_scale" text,
	"speed_kmh" double precision,
	"dynamic_pressure_pa" double precision,
	"air" jsonb,
	"tare_already_subtracted" boolean,
	"tare_n" double precision,
	"condition" jsonb NOT NULL,
	"blockage_already_corrected_by" text,
	"turbulence_or_trips" boolean,
	"stated" jsonb,
	"model_id" text,
	"source" text,
	"remark" text,
	"import_id" uuid,
	"import_row" integer,
	"attachment_id" uuid,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "results_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "results_entry_sequence_key" UNIQUE("organisation_id","entry_sequence"),
	CONSTRAINT "results_variant_id_key" UNIQUE("organisation_id","variant_id","id"),
	CONSTRAINT "results_quantity_check" CHECK ("results"."quantity" in ('force', 'coefficient', 'drag-area', 'coastdown-f2')),
	CONSTRAINT "results_area_scale_check" CHECK ("results"."quoted_area_scale" in ('model', 'full')),
	CONSTRAINT "results_scale_check" CHECK ("results"."scale" > 0),
	CONSTRAINT "results_quoted_area_check" CHECK ("results"."quoted_area_m2" > 0)
);
--> statement-breakpoint
ALTER TABLE "results" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "configurations" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"variant_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"mass_kg" double precision NOT NULL,
	"rolling_resistance" double precision,
	"road_load_reference" jsonb,
	"electric" jsonb,
	"combustion" jsonb,
	"sales_share" double precision NOT NULL,
	CONSTRAINT "configurations_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "configurations_mass_check" CHECK ("configurations"."mass_kg" > 0),
	CONSTRAINT "configurations_share_check" CHECK ("configurations"."sales_share" >= 0 and "configurations"."sales_share" <= 1)
);
--> statement-breakpoint
ALTER TABLE "configurations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "frontal_areas" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"variant_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"area_m2" double precision NOT NULL,
	"u_m2" double precision NOT NULL,
	"method" text NOT NULL,
	"date" date NOT NULL,
	"remark" text,
	CONSTRAINT "frontal_areas_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "frontal_areas_area_check" CHECK ("frontal_areas"."area_m2" > 0 and "frontal_areas"."u_m2" >= 0),
	CONSTRAINT "frontal_areas_method_check" CHECK ("frontal_areas"."method" in ('projected-image', 'laser', 'cad', 'estimate'))
);
--> statement-breakpoint
ALTER TABLE "frontal_areas" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "variants" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"programme_id" uuid NOT NULL,
	"name" text NOT NULL,
	"body_shape" text NOT NULL,
	"description" text,
	"length_mm" double precision NOT NULL,
	"width_mm" double precision NOT NULL,
	"height_mm" double precision NOT NULL,
	"wheelbase_mm" double precision NOT NULL,
	"aliases" text[] DEFAULT '{}'::text[] NOT NULL,
	"picture_attachment_id" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	"retired_at" timestamp (6) with time zone,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "variants_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "variants_programme_id_key" UNIQUE("organisation_id","programme_id","id"),
	CONSTRAINT "variants_dimensions_check" CHECK ("variants"."length_mm" > 0 and "variants"."width_mm" > 0 and "variants"."height_mm" > 0 and "variants"."wheelbase_mm" > 0)
);
--> statement-breakpoint
ALTER TABLE "variants" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "audit_events" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"at" timestamp (6) with time zone DEFAULT clock_timestamp() NOT NULL,
	"actor_user_id" uuid,
	"action" text NOT NULL,
	"entity_kind" text NOT NULL,
	"entity_id" uuid,
	"summary" jsonb NOT NULL,
	"request_id" text,
	CONSTRAINT "audit_events_pkey" PRIMARY KEY("organisation_id","id")
);
--> statement-breakpoint
ALTER TABLE "audit_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "commands" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"key" text NOT NULL,
	"body_hash" text NOT NULL,
	"status" integer NOT NULL,
	"response" jsonb,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "commands_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "commands_key_key" UNIQUE("organisation_id","user_id","key")
);
--> statement-breakpoint
ALTER TABLE "commands" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "counters" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"series" text NOT NULL,
	"value" bigint NOT NULL,
	CONSTRAINT "counters_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "counters_series_key" UNIQUE("organisation_id","series")
);
--> statement-breakpoint
ALTER TABLE "counters" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "jobs" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"progress" double precision DEFAULT 0 NOT NULL,
	"total" double precision,
	"message" text,
	"payload" jsonb NOT NULL,
	"cancel_requested_at" timestamp (6) with time zone,
	"lease_until" timestamp (6) with time zone,
	"attempts" integer DEFAULT 0 NOT NULL,
	"created_by" uuid,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp (6) with time zone,
	"finished_at" timestamp (6) with time zone,
	CONSTRAINT "jobs_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "jobs_state_check" CHECK ("jobs"."state" in ('queued', 'running', 'done', 'failed', 'cancelled'))
);
--> statement-breakpoint
ALTER TABLE "jobs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "outbox" (
	"organisation_id" uuid DEFAULT nullif(current_setting('app.organisation_id', true), '')::uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"event" text NOT NULL,
	"recipient_user_id" uuid NOT NULL,
	"channel" text NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"payload" jsonb NOT NULL,
	"lease_until" timestamp (6) with time zone,
	"attempts" integer DEFAULT 0 NOT NULL,
	"message_id" text NOT NULL,
	"created_at" timestamp (6) with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp (6) with time zone,
	CONSTRAINT "outbox_pkey" PRIMARY KEY("organisation_id","id"),
	CONSTRAINT "outbox_event_key" UNIQUE("organisation_id","event","recipient_user_id","channel"),
	CONSTRAINT "outbox_state_check" CHECK ("outbox"."state" in ('waiting', 'sent', 'failed'))
);
--> statement-breakpoint
ALTER TABLE "outbox" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "attachments" ADD CONSTRAINT "attachments_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "attachments" ADD CONSTRAINT "attachments_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cycles" ADD CONSTRAINT "cycles_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cycles" ADD CONSTRAINT "cycles_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "facilities" ADD CONSTRAINT "facilities_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_sessions" ADD CONSTRAINT "test_sessions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_sessions" ADD CONSTRAINT "test_sessions_facility_fkey" FOREIGN KEY ("organisation_id","facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_rows" ADD CONSTRAINT "import_rows_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_rows" ADD CONSTRAINT "import_rows_import_fkey" FOREIGN KEY ("organisation_id","import_id") REFERENCES "public"."imports"("organisation_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_rows" ADD CONSTRAINT "import_rows_result_fkey" FOREIGN KEY ("organisation_id","result_id") REFERENCES "public"."results"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_mappings" ADD CONSTRAINT "import_mappings_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_job_fkey" FOREIGN KEY ("organisation_id","job_id") REFERENCES "public"."jobs"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_organisation_fkey" FOREIGN KEY ("organisation_id","organisation_kind") REFERENCES "public"."organisations"("id","kind") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_tokens" ADD CONSTRAINT "password_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "user_settings" ADD CONSTRAINT "user_settings_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "milestones" ADD CONSTRAINT "milestones_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "milestones" ADD CONSTRAINT "milestones_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "programmes" ADD CONSTRAINT "programmes_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "programmes" ADD CONSTRAINT "programmes_reference_facility_fkey" FOREIGN KEY ("organisation_id","reference_facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recent_programmes" ADD CONSTRAINT "recent_programmes_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recent_programmes" ADD CONSTRAINT "recent_programmes_member_fkey" FOREIGN KEY ("organisation_id","user_id") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recent_programmes" ADD CONSTRAINT "recent_programmes_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_variant_fkey" FOREIGN KEY ("organisation_id","variant_id") REFERENCES "public"."variants"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_result_fkey" FOREIGN KEY ("organisation_id","variant_id","result_id") REFERENCES "public"."results"("organisation_id","variant_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_member_fkey" FOREIGN KEY ("organisation_id","adopted_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_points" ADD CONSTRAINT "result_points_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_points" ADD CONSTRAINT "result_points_result_fkey" FOREIGN KEY ("organisation_id","result_id") REFERENCES "public"."results"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_withdrawals" ADD CONSTRAINT "result_withdrawals_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_withdrawals" ADD CONSTRAINT "result_withdrawals_result_fkey" FOREIGN KEY ("organisation_id","result_id") REFERENCES "public"."results"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "result_withdrawals" ADD CONSTRAINT "result_withdrawals_member_fkey" FOREIGN KEY ("organisation_id","withdrawn_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_variant_fkey" FOREIGN KEY ("organisation_id","programme_id","variant_id") REFERENCES "public"."variants"("organisation_id","programme_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_test_session_fkey" FOREIGN KEY ("organisation_id","facility_id","test_session_id") REFERENCES "public"."test_sessions"("organisation_id","facility_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_facility_fkey" FOREIGN KEY ("organisation_id","facility_id") REFERENCES "public"."facilities"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_import_fkey" FOREIGN KEY ("organisation_id","import_id") REFERENCES "public"."imports"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_attachment_fkey" FOREIGN KEY ("organisation_id","attachment_id") REFERENCES "public"."attachments"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "configurations" ADD CONSTRAINT "configurations_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "configurations" ADD CONSTRAINT "configurations_variant_fkey" FOREIGN KEY ("organisation_id","variant_id") REFERENCES "public"."variants"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "frontal_areas" ADD CONSTRAINT "frontal_areas_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "frontal_areas" ADD CONSTRAINT "frontal_areas_variant_fkey" FOREIGN KEY ("organisation_id","variant_id") REFERENCES "public"."variants"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variants" ADD CONSTRAINT "variants_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variants" ADD CONSTRAINT "variants_programme_fkey" FOREIGN KEY ("organisation_id","programme_id") REFERENCES "public"."programmes"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "variants" ADD CONSTRAINT "variants_picture_fkey" FOREIGN KEY ("organisation_id","picture_attachment_id") REFERENCES "public"."attachments"("organisation_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_actor_fkey" FOREIGN KEY ("organisation_id","actor_user_id") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "commands" ADD CONSTRAINT "commands_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "commands" ADD CONSTRAINT "commands_member_fkey" FOREIGN KEY ("organisation_id","user_id") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "counters" ADD CONSTRAINT "counters_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_member_fkey" FOREIGN KEY ("organisation_id","created_by") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_organisation_fkey" FOREIGN KEY ("organisation_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_recipient_fkey" FOREIGN KEY ("organisation_id","recipient_user_id") REFERENCES "public"."memberships"("organisation_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "cycles_name_key" ON "cycles" USING btree ("organisation_id",lower("name"));--> statement-breakpoint
CREATE UNIQUE INDEX "facilities_name_key" ON "facilities" USING btree ("organisation_id",lower("name"));--> statement-breakpoint
CREATE UNIQUE INDEX "test_sessions_name_key" ON "test_sessions" USING btree ("organisation_id","facility_id",lower("name"));--> statement-breakpoint
CREATE INDEX "test_sessions_facility_idx" ON "test_sessions" USING btree ("organisation_id","facility_id");--> statement-breakpoint
CREATE INDEX "import_rows_verdict_idx" ON "import_rows" USING btree ("organisation_id","import_id","verdict","row_number");--> statement-breakpoint
CREATE INDEX "imports_programme_idx" ON "imports" USING btree ("organisation_id","programme_id","created_at");--> statement-breakpoint
CREATE INDEX "imports_sha256_idx" ON "imports" USING btree ("organisation_id","programme_id","sha256");--> statement-breakpoint
CREATE INDEX "memberships_user_idx" ON "memberships" USING btree ("user_id");--> statement-breakpoint
CREATE UNIQUE INDEX "organisations_slug_key" ON "organisations" USING btree (lower("slug"));--> statement-breakpoint
CREATE UNIQUE INDEX "users_email_key" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "web_sessions_expire_idx" ON "web_sessions" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "milestones_programme_idx" ON "milestones" USING btree ("organisation_id","programme_id","date");--> statement-breakpoint
CREATE UNIQUE INDEX "programmes_name_key" ON "programmes" USING btree ("organisation_id",lower("name"));--> statement-breakpoint
CREATE INDEX "adoptions_variant_idx" ON "adoptions" USING btree ("organisation_id","variant_id","adopted_at");--> statement-breakpoint
CREATE INDEX "results_programme_idx" ON "results" USING btree ("organisation_id","programme_id","entry_sequence");--> statement-breakpoint
CREATE INDEX "results_variant_idx" ON "results" USING btree ("organisation_id","variant_id");--> statement-breakpoint
CREATE INDEX "results_import_idx" ON "results" USING btree ("organisation_id","import_id");--> statement-breakpoint
CREATE INDEX "configurations_variant_idx" ON "configurations" USING btree ("organisation_id","variant_id","position");--> statement-breakpoint
CREATE INDEX "frontal_areas_variant_idx" ON "frontal_areas" USING btree ("organisation_id","variant_id","date");--> statement-breakpoint
CREATE UNIQUE INDEX "variants_name_key" ON "variants" USING btree ("organisation_id","programme_id",lower("name"));--> statement-breakpoint
CREATE INDEX "audit_events_at_idx" ON "audit_events" USING btree ("organisation_id","at");--> statement-breakpoint
CREATE INDEX "audit_events_entity_idx" ON "audit_events" USING btree ("organisation_id","entity_id");--> statement-breakpoint
CREATE INDEX "jobs_state_idx" ON "jobs" USING btree ("organisation_id","state","created_at");--> statement-breakpoint
CREATE POLICY "attachments_tenant" ON "attachments" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "cycles_tenant" ON "cycles" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "facilities_tenant" ON "facilities" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "test_sessions_tenant" ON "test_sessions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "import_rows_tenant" ON "import_rows" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "import_mappings_tenant" ON "import_mappings" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "imports_tenant" ON "imports" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "memberships_tenant" ON "memberships" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "memberships_platform" ON "memberships" AS PERMISSIVE FOR SELECT TO "wakeledger_platform" USING (user_id = nullif(current_setting('app.user_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisations_tenant" ON "organisations" AS PERMISSIVE FOR SELECT TO "wakeledger_tenant" USING (id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisations_platform" ON "organisations" AS PERMISSIVE FOR SELECT TO "wakeledger_platform" USING (true);--> statement-breakpoint
CREATE POLICY "milestones_tenant" ON "milestones" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "programmes_tenant" ON "programmes" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "recent_programmes_tenant" ON "recent_programmes" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "adoptions_tenant" ON "adoptions" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "result_points_tenant" ON "result_points" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "result_withdrawals_tenant" ON "result_withdrawals" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "results_tenant" ON "results" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "configurations_tenant" ON "configurations" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "frontal_areas_tenant" ON "frontal_areas" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "variants_tenant" ON "variants" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "audit_events_tenant" ON "audit_events" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "commands_tenant" ON "commands" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "counters_tenant" ON "counters" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "jobs_tenant" ON "jobs" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "outbox_tenant" ON "outbox" AS PERMISSIVE FOR ALL TO "wakeledger_tenant" USING (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid) WITH CHECK (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid);