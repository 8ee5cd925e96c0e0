ALTER TABLE "run_views" DROP CONSTRAINT "run_views_measures_key";--> statement-breakpoint
ALTER TABLE "run_views" DROP CONSTRAINT "run_views_two_measures_check";--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "z" text;--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_measures_key" UNIQUE NULLS NOT DISTINCT("run_id","x","y","z");--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_z_check" CHECK ("run_views"."z" in ('steelKgPerM', 'costPerM', 'co2eKgPerM', 'depthMm', 'widthMm', 'concreteM3PerM', 'formworkM2PerM', 'curvatureDuctility', 'designStrengthNmm', 'utilisation', 'barCount'));--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_measures_differ_check" CHECK ("run_views"."x" <> "run_views"."y" and "run_views"."z" <> "run_views"."x" and "run_views"."z" <> "run_views"."y");--> statement-breakpoint
-- The third measure is part of what a finished view answers.
drop trigger run_views_frozen on run_views;--> statement-breakpoint
create trigger run_views_frozen before update on run_views for each row
when (old.state = 'finished')
execute function refuse_change_of_frozen_columns(
  'id', 'run_id', 'x', 'y', 'z', 'state', 'evaluated', 'feasible', 'result', 'front_count', 'hash'
);
