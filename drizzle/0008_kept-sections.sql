CREATE TABLE "kept_sections" (
	"run_id" uuid NOT NULL,
	"from_place" bigint NOT NULL,
	"to_place" bigint NOT NULL,
	"feasible" bigint NOT NULL,
	"frames" "bytea" NOT NULL,
	"counted" "bytea" NOT NULL,
	"near_misses" "bytea" NOT NULL,
	CONSTRAINT "kept_sections_run_id_from_place_pk" PRIMARY KEY("run_id","from_place"),
	CONSTRAINT "kept_sections_range_check" CHECK (0 <= "kept_sections"."from_place" and "kept_sections"."from_place" < "kept_sections"."to_place"),
	CONSTRAINT "kept_sections_feasible_check" CHECK (0 <= "kept_sections"."feasible" and "kept_sections"."feasible" <= "kept_sections"."to_place" - "kept_sections"."from_place")
);
--> statement-breakpoint
CREATE TABLE "taken_sections" (
	"run_id" uuid PRIMARY KEY NOT NULL,
	"from_run_id" uuid NOT NULL,
	"sections" bigint NOT NULL,
	CONSTRAINT "taken_sections_other_run_check" CHECK ("taken_sections"."run_id" <> "taken_sections"."from_run_id"),
	CONSTRAINT "taken_sections_sections_check" CHECK ("taken_sections"."sections" > 0)
);
--> statement-breakpoint
ALTER TABLE "kept_sections" ADD CONSTRAINT "kept_sections_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taken_sections" ADD CONSTRAINT "taken_sections_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "taken_sections" ADD CONSTRAINT "taken_sections_from_run_id_runs_id_fk" FOREIGN KEY ("from_run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "taken_sections_from_idx" ON "taken_sections" USING btree ("from_run_id");--> statement-breakpoint
-- Doubles hardly shrink, and shrinking them would take longer than writing them.
alter table kept_sections alter column frames set storage external;--> statement-breakpoint
create trigger kept_sections_frozen before update on kept_sections
for each row execute function refuse_change_of_frozen_rows();--> statement-breakpoint
create trigger taken_sections_frozen before update on taken_sections
for each row execute function refuse_change_of_frozen_rows();
