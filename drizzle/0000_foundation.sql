CREATE TABLE "benches" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"name" text NOT NULL,
	"site" text DEFAULT '' NOT NULL,
	"instrument" text DEFAULT '' NOT NULL,
	"distance_m" double precision,
	"guard_db" double precision DEFAULT 0 NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "benches_name" UNIQUE("team_id","name"),
	CONSTRAINT "benches_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "benches" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "signal_path_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"bench_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"content" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "signal_path_revisions_number" UNIQUE("team_id","bench_id","revision"),
	CONSTRAINT "signal_path_revisions_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "signal_path_revisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mask_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"mask_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"content" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mask_revisions_number" UNIQUE("team_id","mask_id","revision"),
	CONSTRAINT "mask_revisions_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "mask_revisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "masks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"key" text NOT NULL,
	"origin" text NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "masks_key" UNIQUE("team_id","key"),
	CONSTRAINT "masks_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "masks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "program_masks" (
	"team_id" uuid NOT NULL,
	"program_id" uuid NOT NULL,
	"mask_id" uuid NOT NULL,
	CONSTRAINT "program_masks_team_id_program_id_mask_id_pk" PRIMARY KEY("team_id","program_id","mask_id")
);
--> statement-breakpoint
ALTER TABLE "program_masks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "builds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"program_id" uuid NOT NULL,
	"name" text NOT NULL,
	"sequence" integer NOT NULL,
	"built_on" date,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "builds_sequence" UNIQUE("team_id","program_id","sequence"),
	CONSTRAINT "builds_name" UNIQUE("team_id","program_id","name"),
	CONSTRAINT "builds_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "builds" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "milestones" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"program_id" uuid NOT NULL,
	"name" text NOT NULL,
	"due_on" date NOT NULL,
	"required_margin_db" double precision
);
--> statement-breakpoint
ALTER TABLE "milestones" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "programs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"name" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"target_margin_db" double precision NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "programs_name" UNIQUE("team_id","name"),
	CONSTRAINT "programs_tenant" UNIQUE("team_id","id")
);
--> statement-breakpoint
ALTER TABLE "programs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "audit_events" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"actor_id" uuid,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"action" text NOT NULL,
	"subject_type" text NOT NULL,
	"subject_id" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL
);
--> statement-breakpoint
ALTER TABLE "audit_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "members" (
	"team_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"role" text NOT NULL,
	"deactivated_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "members_team_id_user_id_pk" PRIMARY KEY("team_id","user_id")
);
--> statement-breakpoint
ALTER TABLE "members" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "teams" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "teams" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_email_unique" UNIQUE("email")
);
--> statement-breakpoint
ALTER TABLE "users" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "benches" ADD CONSTRAINT "benches_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signal_path_revisions" ADD CONSTRAINT "signal_path_revisions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signal_path_revisions" ADD CONSTRAINT "signal_path_revisions_bench" FOREIGN KEY ("team_id","bench_id") REFERENCES "public"."benches"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD CONSTRAINT "mask_revisions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mask_revisions" ADD CONSTRAINT "mask_revisions_mask" FOREIGN KEY ("team_id","mask_id") REFERENCES "public"."masks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "masks" ADD CONSTRAINT "masks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "program_masks" ADD CONSTRAINT "program_masks_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "program_masks" ADD CONSTRAINT "program_masks_program" FOREIGN KEY ("team_id","program_id") REFERENCES "public"."programs"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "program_masks" ADD CONSTRAINT "program_masks_mask" FOREIGN KEY ("team_id","mask_id") REFERENCES "public"."masks"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "builds" ADD CONSTRAINT "builds_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "builds" ADD CONSTRAINT "builds_program" FOREIGN KEY ("team_id","program_id") REFERENCES "public"."programs"("team_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "milestones" ADD CONSTRAINT "milestones_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "milestones" ADD CONSTRAINT "milestones_program" FOREIGN KEY ("team_id","program_id") REFERENCES "public"."programs"("team_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "programs" ADD CONSTRAINT "programs_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_events_by_time" ON "audit_events" USING btree ("team_id","at");--> statement-breakpoint
CREATE POLICY "team_only" ON "benches" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "signal_path_revisions" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "mask_revisions" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "masks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "program_masks" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "builds" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "milestones" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "programs" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "audit_events" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "members" AS PERMISSIVE FOR ALL TO "neap_app" USING ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("team_id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "team_only" ON "teams" AS PERMISSIVE FOR ALL TO "neap_app" USING ("id" = nullif(current_setting('neap.team_id', true), '')::uuid) WITH CHECK ("id" = nullif(current_setting('neap.team_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "same_team" ON "users" AS PERMISSIVE FOR SELECT TO "neap_app" USING (exists (select 1 from members m where m.user_id = users.id and m.team_id = nullif(current_setting('neap.team_id', true), '')::uuid));