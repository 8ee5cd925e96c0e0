CREATE TABLE "beams" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid NOT NULL,
	"mark" text NOT NULL,
	"location" text NOT NULL,
	"span_mm" double precision NOT NULL,
	"count" integer NOT NULL,
	"mu_nmm" double precision NOT NULL,
	"vu_n" double precision,
	"ductility_target" double precision,
	"depth_cap_mm" double precision,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "beams_id_project_key" UNIQUE("id","project_id"),
	CONSTRAINT "beams_mark_check" CHECK ("beams"."mark" <> ''),
	CONSTRAINT "beams_span_check" CHECK ("beams"."span_mm" > 0 and "beams"."span_mm" < 'Infinity'),
	CONSTRAINT "beams_count_check" CHECK ("beams"."count" > 0),
	CONSTRAINT "beams_mu_check" CHECK ("beams"."mu_nmm" >= 0 and "beams"."mu_nmm" < 'Infinity'),
	CONSTRAINT "beams_vu_check" CHECK ("beams"."vu_n" >= 0 and "beams"."vu_n" < 'Infinity'),
	CONSTRAINT "beams_ductility_check" CHECK ("beams"."ductility_target" >= 0 and "beams"."ductility_target" < 'Infinity'),
	CONSTRAINT "beams_depth_cap_check" CHECK ("beams"."depth_cap_mm" > 0 and "beams"."depth_cap_mm" < 'Infinity')
);
--> statement-breakpoint
CREATE TABLE "candidate_comments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"position" bigint GENERATED ALWAYS AS IDENTITY (sequence name "candidate_comments_position_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"candidate_id" uuid NOT NULL,
	"author_id" uuid NOT NULL,
	"text" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "candidate_comments_text_check" CHECK ("candidate_comments"."text" <> '')
);
--> statement-breakpoint
CREATE TABLE "candidate_transitions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"position" bigint GENERATED ALWAYS AS IDENTITY (sequence name "candidate_transitions_position_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"candidate_id" uuid NOT NULL,
	"from_state" text,
	"to_state" text NOT NULL,
	"by_id" uuid NOT NULL,
	"note" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "candidate_transitions_from_check" CHECK ("candidate_transitions"."from_state" in ('proposed', 'checked', 'approved', 'returned', 'superseded')),
	CONSTRAINT "candidate_transitions_to_check" CHECK ("candidate_transitions"."to_state" in ('proposed', 'checked', 'approved', 'returned', 'superseded'))
);
--> statement-breakpoint
CREATE TABLE "candidates" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid NOT NULL,
	"beam_id" uuid NOT NULL,
	"label" text NOT NULL,
	"state" text DEFAULT 'proposed' NOT NULL,
	"note" text NOT NULL,
	"author_id" uuid NOT NULL,
	"run_id" uuid,
	"section_index" bigint,
	"snapshot" jsonb NOT NULL,
	"hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "candidates_label_key" UNIQUE("project_id","label"),
	CONSTRAINT "candidates_state_check" CHECK ("candidates"."state" in ('proposed', 'checked', 'approved', 'returned', 'superseded')),
	CONSTRAINT "candidates_label_check" CHECK ("candidates"."label" ~ '^[A-Z]+$'),
	CONSTRAINT "candidates_hash_check" CHECK ("candidates"."hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "candidates_source_check" CHECK (("candidates"."run_id" is null) = ("candidates"."section_index" is null)),
	CONSTRAINT "candidates_section_index_check" CHECK ("candidates"."section_index" >= 0)
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"role" text NOT NULL,
	"password_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"disabled_at" timestamp with time zone,
	CONSTRAINT "people_role_check" CHECK ("people"."role" in ('admin', 'engineer', 'checker', 'estimator', 'viewer')),
	CONSTRAINT "people_name_check" CHECK ("people"."name" <> ''),
	CONSTRAINT "people_email_check" CHECK ("people"."email" like '%_@_%')
);
--> statement-breakpoint
CREATE TABLE "project_members" (
	"project_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	CONSTRAINT "project_members_project_id_person_id_pk" PRIMARY KEY("project_id","person_id")
);
--> statement-breakpoint
CREATE TABLE "projects" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"number" text NOT NULL,
	"design_basis" jsonb NOT NULL,
	"price_book" jsonb,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "projects_name_check" CHECK ("projects"."name" <> ''),
	CONSTRAINT "projects_number_check" CHECK ("projects"."number" <> '')
);
--> statement-breakpoint
CREATE TABLE "run_views" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"run_id" uuid NOT NULL,
	"x" text NOT NULL,
	"y" text NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"evaluated" bigint DEFAULT 0 NOT NULL,
	"feasible" bigint DEFAULT 0 NOT NULL,
	"elapsed_ms" double precision DEFAULT 0 NOT NULL,
	"result" jsonb,
	"front_count" integer DEFAULT 0 NOT NULL,
	"hash" text,
	"message" text,
	"worker_id" text,
	"sequence" bigint DEFAULT 0 NOT NULL,
	"cancel_requested_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp with time zone,
	"finished_at" timestamp with time zone,
	CONSTRAINT "run_views_measures_key" UNIQUE("run_id","x","y"),
	CONSTRAINT "run_views_x_check" CHECK ("run_views"."x" in ('steelKgPerM', 'costPerM', 'co2eKgPerM', 'depthMm', 'widthMm', 'concreteM3PerM', 'formworkM2PerM', 'curvatureDuctility', 'designStrengthNmm', 'utilisation', 'barCount')),
	CONSTRAINT "run_views_y_check" CHECK ("run_views"."y" in ('steelKgPerM', 'costPerM', 'co2eKgPerM', 'depthMm', 'widthMm', 'concreteM3PerM', 'formworkM2PerM', 'curvatureDuctility', 'designStrengthNmm', 'utilisation', 'barCount')),
	CONSTRAINT "run_views_two_measures_check" CHECK ("run_views"."x" <> "run_views"."y"),
	CONSTRAINT "run_views_state_check" CHECK ("run_views"."state" in ('queued', 'running', 'finished', 'cancelled', 'failed')),
	CONSTRAINT "run_views_counts_check" CHECK (0 <= "run_views"."feasible" and "run_views"."feasible" <= "run_views"."evaluated"),
	CONSTRAINT "run_views_finished_check" CHECK ("run_views"."state" <> 'finished' or ("run_views"."result" is not null and "run_views"."hash" is not null))
);
--> statement-breakpoint
CREATE TABLE "runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sweep_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"definition" jsonb NOT NULL,
	"basis" jsonb NOT NULL,
	"engine_version" text NOT NULL,
	"section_count" bigint NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"started_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"event_sequence" bigint DEFAULT 0 NOT NULL,
	"finished_at" timestamp with time zone,
	CONSTRAINT "runs_number_key" UNIQUE("sweep_id","number"),
	CONSTRAINT "runs_number_check" CHECK ("runs"."number" > 0),
	CONSTRAINT "runs_section_count_check" CHECK ("runs"."section_count" >= 0),
	CONSTRAINT "runs_state_check" CHECK ("runs"."state" in ('queued', 'running', 'finished', 'cancelled', 'failed'))
);
--> statement-breakpoint
CREATE TABLE "session" (
	"sid" varchar PRIMARY KEY NOT NULL,
	"sess" json NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
CREATE TABLE "share_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "share_links_expiry_check" CHECK ("share_links"."expires_at" > "share_links"."created_at")
);
--> statement-breakpoint
CREATE TABLE "sweeps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"beam_id" uuid NOT NULL,
	"name" text NOT NULL,
	"definition" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sweeps_name_check" CHECK ("sweeps"."name" <> '')
);
--> statement-breakpoint
ALTER TABLE "beams" ADD CONSTRAINT "beams_project_id_projects_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."projects"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_comments" ADD CONSTRAINT "candidate_comments_candidate_id_candidates_id_fk" FOREIGN KEY ("candidate_id") REFERENCES "public"."candidates"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_comments" ADD CONSTRAINT "candidate_comments_author_id_people_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_transitions" ADD CONSTRAINT "candidate_transitions_candidate_id_candidates_id_fk" FOREIGN KEY ("candidate_id") REFERENCES "public"."candidates"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_transitions" ADD CONSTRAINT "candidate_transitions_by_id_people_id_fk" FOREIGN KEY ("by_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_project_id_projects_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."projects"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_author_id_people_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_beam_fk" FOREIGN KEY ("beam_id","project_id") REFERENCES "public"."beams"("id","project_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_members" ADD CONSTRAINT "project_members_project_id_projects_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."projects"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_members" ADD CONSTRAINT "project_members_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "projects" ADD CONSTRAINT "projects_created_by_people_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_sweep_id_sweeps_id_fk" FOREIGN KEY ("sweep_id") REFERENCES "public"."sweeps"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_started_by_people_id_fk" FOREIGN KEY ("started_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_project_id_projects_id_fk" FOREIGN KEY ("project_id") REFERENCES "public"."projects"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "share_links" ADD CONSTRAINT "share_links_created_by_people_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_beam_id_beams_id_fk" FOREIGN KEY ("beam_id") REFERENCES "public"."beams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sweeps" ADD CONSTRAINT "sweeps_created_by_people_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "beams_mark_key" ON "beams" USING btree ("project_id",lower("mark"));--> statement-breakpoint
CREATE INDEX "candidate_comments_candidate_idx" ON "candidate_comments" USING btree ("candidate_id","position");--> statement-breakpoint
CREATE INDEX "candidate_transitions_candidate_idx" ON "candidate_transitions" USING btree ("candidate_id","position");--> statement-breakpoint
CREATE UNIQUE INDEX "candidates_snapshot_key" ON "candidates" USING btree ("beam_id","hash") WHERE "candidates"."state" <> 'superseded';--> statement-breakpoint
CREATE INDEX "candidates_beam_idx" ON "candidates" USING btree ("beam_id");--> statement-breakpoint
CREATE INDEX "candidates_run_idx" ON "candidates" USING btree ("run_id");--> statement-breakpoint
CREATE UNIQUE INDEX "people_email_key" ON "people" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "project_members_person_idx" ON "project_members" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "projects_number_key" ON "projects" USING btree (lower("number"));--> statement-breakpoint
CREATE INDEX "run_views_unfinished_idx" ON "run_views" USING btree ("state") WHERE "run_views"."state" in ('queued', 'running');--> statement-breakpoint
CREATE INDEX "runs_unfinished_idx" ON "runs" USING btree ("state") WHERE "runs"."state" in ('queued', 'running');--> statement-breakpoint
CREATE INDEX "session_expire_idx" ON "session" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "share_links_project_idx" ON "share_links" USING btree ("project_id");--> statement-breakpoint
CREATE INDEX "sweeps_beam_idx" ON "sweeps" USING btree ("beam_id");