CREATE TABLE "bench_checks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"bench_id" uuid NOT NULL,
	"signal_path_revision_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"source" text NOT NULL,
	"measured_on" date NOT NULL,
	"is_reference" boolean NOT NULL,
	"reference_id" uuid,
	"content" jsonb NOT NULL,
	"drift_mean_db" double precision,
	"drift_worst_db" double precision,
	"notes" text DEFAULT '' NOT NULL,
	"checked_by" uuid NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "bench_checks_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "bench_checks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "uncertainty_budgets" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"bench_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"content" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "uncertainty_budgets_number" UNIQUE("team_id","bench_id","revision"),
	CONSTRAINT "uncertainty_budgets_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "uncertainty_budgets" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "accepted_mismatches" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"before_sweep_id" uuid NOT NULL,
	"after_sweep_id" uuid NOT NULL,
	"fields" jsonb NOT NULL,
	"reason" text NOT NULL,
	"accepted_by" uuid NOT NULL,
	"withdrawn_by" uuid,
	"withdrawn_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "accepted_mismatches_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "calibrations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"equipment_id" uuid NOT NULL,
	"calibrated_on" date NOT NULL,
	"due_on" date,
	"laboratory" text DEFAULT '' NOT NULL,
	"certificate_number" text DEFAULT '' NOT NULL,
	"file_id" uuid,
	"file_name" text,
	"factors" jsonb,
	"recorded_by" uuid NOT NULL,
	"withdrawn_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "calibrations_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "calibrations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "equipment" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"inventory_number" text DEFAULT '' NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "equipment_name" UNIQUE("team_id","name"),
	CONSTRAINT "equipment_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "equipment" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mask_recomputations" (
	"team_id" uuid NOT NULL,
	"mask_revision_id" uuid NOT NULL,
	"total" integer NOT NULL,
	"done" integer DEFAULT 0 NOT NULL,
	"finished_at" timestamp with time zone,
	"problem" text,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "mask_recomputations_team_id_mask_revision_id_pk" PRIMARY KEY("team_id","mask_revision_id")
);
--> statement-breakpoint
ALTER TABLE "mask_recomputations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ambient_checks" (
	"team_id" uuid NOT NULL,
	"reading_id" uuid NOT NULL,
	"ambient_sweep_id" uuid NOT NULL,
	"content" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "ambient_checks_team_id_reading_id_ambient_sweep_id_pk" PRIMARY KEY("team_id","reading_id","ambient_sweep_id")
);
--> statement-breakpoint
ALTER TABLE "ambient_checks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "combined_readings" (
	"team_id" uuid NOT NULL,
	"key" text NOT NULL,
	"content" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "combined_readings_team_id_key_pk" PRIMARY KEY("team_id","key")
);
--> statement-breakpoint
ALTER TABLE "combined_readings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "followed_suspects" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"program_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"frequency_hz" double precision NOT NULL,
	"tolerance_hz" double precision NOT NULL,
	"source" text DEFAULT '' NOT NULL,
	"owner_id" uuid,
	"state" text DEFAULT 'open' NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "followed_suspects_number" UNIQUE("team_id","program_id","number"),
	CONSTRAINT "followed_suspects_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "followed_suspects" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "suspect_notes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"suspect_id" uuid NOT NULL,
	"author_id" uuid NOT NULL,
	"text" text DEFAULT '' NOT NULL,
	"change" jsonb,
	"created_at" timestamp with time zone DEFAULT clock_timestamp() NOT NULL,
	CONSTRAINT "suspect_notes_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "suspect_notes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "readings" DROP CONSTRAINT "readings_once";--> statement-breakpoint
ALTER TABLE "benches" ADD COLUMN "instrument_id" uuid;--> statement-breakpoint
ALTER TABLE "benches" ADD COLUMN "guard_rule" text DEFAULT 'stated' NOT NULL;--> statement-breakpoint
ALTER TABLE "benches" ADD COLUMN "check_tolerance_db" double precision DEFAULT 2 NOT NULL;--> statement-breakpoint
ALTER TABLE "ladder_steps" ADD COLUMN "branch_of_id" uuid;--> statement-breakpoint
ALTER TABLE "ladder_steps" ADD COLUMN "state" text DEFAULT 'kept' NOT NULL;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD COLUMN "source" text DEFAULT 'team' NOT NULL;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD COLUMN "confirmed_by" uuid;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD COLUMN "confirmed_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD COLUMN "confirmed_copy" text;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD COLUMN "in_force_at" timestamp with time zone DEFAULT clock_timestamp();--> statement-breakpoint
ALTER TABLE "program_masks" ADD COLUMN "restate_distance" boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE "readings" ADD COLUMN "restated" boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE "sweeps" ADD COLUMN "instrument" jsonb;--> statement-breakpoint
ALTER TABLE "sweeps" ADD COLUMN "budget_id" uuid;--> statement-breakpoint
ALTER TABLE "traces" ADD COLUMN "file_max_db" double precision;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_checked_by_users_id_fk" FOREIGN KEY ("checked_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_bench" FOREIGN KEY ("team_id","bench_id") REFERENCES "public"."benches"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_signal_path" FOREIGN KEY ("team_id","signal_path_revision_id") REFERENCES "public"."signal_path_revisions"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_file" FOREIGN KEY ("team_id","file_id") REFERENCES "public"."stored_files"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_checks" ADD CONSTRAINT "bench_checks_reference" FOREIGN KEY ("team_id","reference_id") REFERENCES "public"."bench_checks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "uncertainty_budgets" ADD CONSTRAINT "uncertainty_budgets_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "uncertainty_budgets" ADD CONSTRAINT "uncertainty_budgets_created_by_users_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "uncertainty_budgets" ADD CONSTRAINT "uncertainty_budgets_bench" FOREIGN KEY ("team_id","bench_id") REFERENCES "public"."benches"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ADD CONSTRAINT "accepted_mismatches_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ADD CONSTRAINT "accepted_mismatches_accepted_by_users_id_fk" FOREIGN KEY ("accepted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ADD CONSTRAINT "accepted_mismatches_withdrawn_by_users_id_fk" FOREIGN KEY ("withdrawn_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ADD CONSTRAINT "accepted_mismatches_before" FOREIGN KEY ("team_id","before_sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accepted_mismatches" ADD CONSTRAINT "accepted_mismatches_after" FOREIGN KEY ("team_id","after_sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_recorded_by_users_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_equipment" FOREIGN KEY ("team_id","equipment_id") REFERENCES "public"."equipment"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_file" FOREIGN KEY ("team_id","file_id") REFERENCES "public"."stored_files"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "equipment" ADD CONSTRAINT "equipment_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mask_recomputations" ADD CONSTRAINT "mask_recomputations_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mask_recomputations" ADD CONSTRAINT "mask_recomputations_revision" FOREIGN KEY ("team_id","mask_revision_id") REFERENCES "public"."mask_revisions"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ambient_checks" ADD CONSTRAINT "ambient_checks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ambient_checks" ADD CONSTRAINT "ambient_checks_reading" FOREIGN KEY ("team_id","reading_id") REFERENCES "public"."readings"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ambient_checks" ADD CONSTRAINT "ambient_checks_sweep" FOREIGN KEY ("team_id","ambient_sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "combined_readings" ADD CONSTRAINT "combined_readings_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "followed_suspects" ADD CONSTRAINT "followed_suspects_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "followed_suspects" ADD CONSTRAINT "followed_suspects_owner_id_users_id_fk" FOREIGN KEY ("owner_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "followed_suspects" ADD CONSTRAINT "followed_suspects_created_by_users_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "followed_suspects" ADD CONSTRAINT "followed_suspects_program" FOREIGN KEY ("team_id","program_id") REFERENCES "public"."programs"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suspect_notes" ADD CONSTRAINT "suspect_notes_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suspect_notes" ADD CONSTRAINT "suspect_notes_author_id_users_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suspect_notes" ADD CONSTRAINT "suspect_notes_suspect" FOREIGN KEY ("team_id","suspect_id") REFERENCES "public"."followed_suspects"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "bench_checks_by_day" ON "bench_checks" USING btree ("team_id","bench_id","measured_on");--> statement-breakpoint
CREATE INDEX "accepted_mismatches_by_pair" ON "accepted_mismatches" USING btree ("team_id","before_sweep_id","after_sweep_id");--> statement-breakpoint
CREATE INDEX "followed_suspects_by_frequency" ON "followed_suspects" USING btree ("team_id","program_id","frequency_hz");--> statement-breakpoint
CREATE INDEX "suspect_notes_by_suspect" ON "suspect_notes" USING btree ("team_id","suspect_id","created_at");--> statement-breakpoint
ALTER TABLE "benches" ADD CONSTRAINT "benches_instrument" FOREIGN KEY ("team_id","instrument_id") REFERENCES "public"."equipment"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ladder_steps" ADD CONSTRAINT "ladder_steps_branch_of" FOREIGN KEY ("team_id","branch_of_id") REFERENCES "public"."ladder_steps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD CONSTRAINT "mask_revisions_confirmed_by_users_id_fk" FOREIGN KEY ("confirmed_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_budget" FOREIGN KEY ("team_id","budget_id") REFERENCES "public"."uncertainty_budgets"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "sweeps_by_bench_day" ON "sweeps" USING btree ("team_id","bench_id","measured_on");--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_once" UNIQUE("team_id","sweep_id","mask_revision_id","restated");--> statement-breakpoint
CREATE POLICY "team_only" ON "bench_checks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "uncertainty_budgets" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "accepted_mismatches" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "calibrations" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "equipment" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "mask_recomputations" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "ambient_checks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "combined_readings" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "followed_suspects" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "suspect_notes" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);