create function refuse_removal_of_rows() returns trigger language plpgsql as $$
begin
  raise exception 'Rows of % are kept for good', tg_table_name using errcode = 'integrity_constraint_violation';
end
$$;
--> statement-breakpoint
-- A run's views hold its results. Without them the run itself could be deleted too: nothing else refers to every run.
create trigger run_views_kept before delete on run_views for each row execute function refuse_removal_of_rows();
