CREATE TABLE "office_standards" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"units" text NOT NULL,
	"bar_standard" text NOT NULL,
	"standard" jsonb NOT NULL,
	"updated_by" uuid NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "office_standards_name_check" CHECK ("office_standards"."name" <> ''),
	CONSTRAINT "office_standards_units_check" CHECK ("office_standards"."units" in ('us', 'si')),
	CONSTRAINT "office_standards_bar_standard_check" CHECK ("office_standards"."bar_standard" in ('astm', 'csa', 'iso'))
);
--> statement-breakpoint
CREATE TABLE "saved_views" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sweep_id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"name" text NOT NULL,
	"address" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "saved_views_name_check" CHECK ("saved_views"."name" <> ''),
	CONSTRAINT "saved_views_address_check" CHECK (jsonb_typeof("saved_views"."address") = 'object')
);
--> statement-breakpoint
ALTER TABLE "office_standards" ADD CONSTRAINT "office_standards_updated_by_people_id_fk" FOREIGN KEY ("updated_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "saved_views" ADD CONSTRAINT "saved_views_sweep_id_sweeps_id_fk" FOREIGN KEY ("sweep_id") REFERENCES "public"."sweeps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "saved_views" ADD CONSTRAINT "saved_views_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "saved_views" ADD CONSTRAINT "saved_views_created_by_people_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "office_standards_name_key" ON "office_standards" USING btree (lower("name"));--> statement-breakpoint
CREATE UNIQUE INDEX "saved_views_name_key" ON "saved_views" USING btree ("sweep_id",lower("name"));--> statement-breakpoint
CREATE INDEX "saved_views_run_idx" ON "saved_views" USING btree ("run_id");