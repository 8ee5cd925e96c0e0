ALTER TABLE "run_views" DROP CONSTRAINT "run_views_counts_check";--> statement-breakpoint
ALTER TABLE "run_views" ALTER COLUMN "feasible" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "search" jsonb;--> statement-breakpoint
ALTER TABLE "runs" ADD COLUMN "method" text DEFAULT 'every-section' NOT NULL;--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_counts_check" CHECK (0 <= coalesce("run_views"."feasible", 0) and coalesce("run_views"."feasible", 0) <= "run_views"."merged" and "run_views"."merged" <= "run_views"."evaluated");--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_method_check" CHECK ("runs"."method" in ('every-section', 'bounds'));--> statement-breakpoint
-- How a run finds its front is part of what it was asked.
drop trigger runs_frozen on runs;--> statement-breakpoint
create trigger runs_frozen before update on runs for each row execute function refuse_change_of_frozen_columns(
  'id', 'sweep_id', 'number', 'definition', 'basis', 'engine_version', 'method', 'section_count', 'started_by', 'created_at'
);
