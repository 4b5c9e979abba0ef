CREATE TABLE "stored_files" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"size_bytes" integer NOT NULL,
	"media_type" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stored_files_content" UNIQUE("team_id","sha256"),
	CONSTRAINT "stored_files_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "stored_files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ladder_steps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"ladder_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "ladder_steps_position" UNIQUE("team_id","ladder_id","position"),
	CONSTRAINT "ladder_steps_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "ladder_steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ladders" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"name" text NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "ladders_name" UNIQUE("team_id","build_id","name"),
	CONSTRAINT "ladders_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "ladders" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "clocks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"name" text NOT NULL,
	"frequency_hz" double precision NOT NULL,
	"tolerance_ppm" double precision,
	CONSTRAINT "clocks_name" UNIQUE("team_id","build_id","name")
);
--> statement-breakpoint
ALTER TABLE "clocks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "readings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"sweep_id" uuid NOT NULL,
	"mask_id" uuid NOT NULL,
	"mask_revision_id" uuid NOT NULL,
	"engine_version" integer NOT NULL,
	"standing" text NOT NULL,
	"margin_db" double precision,
	"margin_at_hz" double precision,
	"line_name" text,
	"coverage" double precision NOT NULL,
	"not_comparable" text,
	"content" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "readings_once" UNIQUE("team_id","sweep_id","mask_revision_id"),
	CONSTRAINT "readings_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "readings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "suspects" (
	"team_id" uuid NOT NULL,
	"reading_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"frequency_hz" double precision NOT NULL,
	"sample_hz" double precision NOT NULL,
	"level_db" double precision NOT NULL,
	"limit_db" double precision,
	"margin_db" double precision,
	"prominence_db" double precision NOT NULL,
	"line_name" text,
	"basis" text NOT NULL,
	"trace_position" integer NOT NULL,
	CONSTRAINT "suspects_team_id_reading_id_number_pk" PRIMARY KEY("team_id","reading_id","number")
);
--> statement-breakpoint
ALTER TABLE "suspects" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "report_sweeps" (
	"team_id" uuid NOT NULL,
	"report_id" uuid NOT NULL,
	"sweep_id" uuid NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "report_sweeps_team_id_report_id_sweep_id_pk" PRIMARY KEY("team_id","report_id","sweep_id")
);
--> statement-breakpoint
ALTER TABLE "report_sweeps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reports" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"ladder_id" uuid,
	"replaces_id" uuid,
	"title" text NOT NULL,
	"summary" text DEFAULT '' NOT NULL,
	"paper" text NOT NULL,
	"state" text NOT NULL,
	"number" integer,
	"snapshot" jsonb,
	"sha256" text,
	"file_id" uuid,
	"created_by" uuid NOT NULL,
	"issued_by" uuid,
	"issued_at" timestamp with time zone,
	"approved_by" uuid,
	"approved_at" timestamp with time zone,
	"withdrawn_by" uuid,
	"withdrawn_at" timestamp with time zone,
	"withdrawn_reason" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reports_number" UNIQUE("team_id","number"),
	CONSTRAINT "reports_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "reports" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "sweeps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"build_id" uuid NOT NULL,
	"step_id" uuid,
	"bench_id" uuid NOT NULL,
	"signal_path_revision_id" uuid NOT NULL,
	"file_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"name" text NOT NULL,
	"purpose" text NOT NULL,
	"measured_on" date,
	"corrected" boolean NOT NULL,
	"settings" jsonb NOT NULL,
	"link" jsonb NOT NULL,
	"guard_db" double precision NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"on_record" boolean NOT NULL,
	"imported_by" uuid NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sweeps_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "sweeps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "trace_blocks" (
	"team_id" uuid NOT NULL,
	"trace_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"level" integer DEFAULT 0 NOT NULL,
	"position" integer NOT NULL,
	"crc32" double precision NOT NULL,
	"bytes" "bytea" NOT NULL,
	CONSTRAINT "trace_blocks_team_id_trace_id_kind_level_position_pk" PRIMARY KEY("team_id","trace_id","kind","level","position")
);
--> statement-breakpoint
ALTER TABLE "trace_blocks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "traces" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"sweep_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"detector" text,
	"hold" text NOT NULL,
	"unit" text NOT NULL,
	"file_unit" text NOT NULL,
	"axis" jsonb NOT NULL,
	"first_hz" double precision NOT NULL,
	"last_hz" double precision NOT NULL,
	"step_hz" double precision,
	"covered" integer NOT NULL,
	"max_db" double precision,
	"max_at_hz" double precision,
	"floor_db" double precision,
	"power_sum_db" double precision,
	CONSTRAINT "traces_position" UNIQUE("team_id","sweep_id","position"),
	CONSTRAINT "traces_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "traces" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "stored_files" ADD CONSTRAINT "stored_files_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ladder_steps" ADD CONSTRAINT "ladder_steps_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ladder_steps" ADD CONSTRAINT "ladder_steps_ladder" FOREIGN KEY ("team_id","ladder_id") REFERENCES "public"."ladders"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ladders" ADD CONSTRAINT "ladders_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ladders" ADD CONSTRAINT "ladders_build" FOREIGN KEY ("team_id","build_id") REFERENCES "public"."builds"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clocks" ADD CONSTRAINT "clocks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clocks" ADD CONSTRAINT "clocks_build" FOREIGN KEY ("team_id","build_id") REFERENCES "public"."builds"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_sweep" FOREIGN KEY ("team_id","sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_mask" FOREIGN KEY ("team_id","mask_id") REFERENCES "public"."masks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_mask_revision" FOREIGN KEY ("team_id","mask_revision_id") REFERENCES "public"."mask_revisions"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suspects" ADD CONSTRAINT "suspects_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suspects" ADD CONSTRAINT "suspects_reading" FOREIGN KEY ("team_id","reading_id") REFERENCES "public"."readings"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_sweeps" ADD CONSTRAINT "report_sweeps_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_sweeps" ADD CONSTRAINT "report_sweeps_report" FOREIGN KEY ("team_id","report_id") REFERENCES "public"."reports"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_sweeps" ADD CONSTRAINT "report_sweeps_sweep" FOREIGN KEY ("team_id","sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_created_by_users_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_issued_by_users_id_fk" FOREIGN KEY ("issued_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_approved_by_users_id_fk" FOREIGN KEY ("approved_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_withdrawn_by_users_id_fk" FOREIGN KEY ("withdrawn_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_build" FOREIGN KEY ("team_id","build_id") REFERENCES "public"."builds"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_ladder" FOREIGN KEY ("team_id","ladder_id") REFERENCES "public"."ladders"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_file" FOREIGN KEY ("team_id","file_id") REFERENCES "public"."stored_files"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reports" ADD CONSTRAINT "reports_replaces" FOREIGN KEY ("team_id","replaces_id") REFERENCES "public"."reports"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_imported_by_users_id_fk" FOREIGN KEY ("imported_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_build" FOREIGN KEY ("team_id","build_id") REFERENCES "public"."builds"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_step" FOREIGN KEY ("team_id","step_id") REFERENCES "public"."ladder_steps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_bench" FOREIGN KEY ("team_id","bench_id") REFERENCES "public"."benches"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_signal_path" FOREIGN KEY ("team_id","signal_path_revision_id") REFERENCES "public"."signal_path_revisions"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_file" FOREIGN KEY ("team_id","file_id") REFERENCES "public"."stored_files"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trace_blocks" ADD CONSTRAINT "trace_blocks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trace_blocks" ADD CONSTRAINT "trace_blocks_trace" FOREIGN KEY ("team_id","trace_id") REFERENCES "public"."traces"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "traces" ADD CONSTRAINT "traces_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "traces" ADD CONSTRAINT "traces_sweep" FOREIGN KEY ("team_id","sweep_id") REFERENCES "public"."sweeps"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "readings_by_mask" ON "readings" USING btree ("team_id","mask_id");--> statement-breakpoint
CREATE INDEX "sweeps_by_build" ON "sweeps" USING btree ("team_id","build_id");--> statement-breakpoint
CREATE INDEX "sweeps_by_step" ON "sweeps" USING btree ("team_id","step_id");--> statement-breakpoint
CREATE POLICY "team_only" ON "stored_files" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "ladder_steps" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "ladders" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "clocks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "readings" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "suspects" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "report_sweeps" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "reports" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "sweeps" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "trace_blocks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "traces" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);