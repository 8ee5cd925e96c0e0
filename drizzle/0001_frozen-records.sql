-- What a run was asked, what a candidate was pinned with, and who moved it are never changed, whatever code asks for it.
create function refuse_change_of_frozen_columns() returns trigger language plpgsql as $$
declare
  frozen_column text;
begin
  foreach frozen_column in array tg_argv loop
    if to_jsonb(new) -> frozen_column is distinct from to_jsonb(old) -> frozen_column then
      raise exception '%.% is frozen', tg_table_name, frozen_column using errcode = 'integrity_constraint_violation';
    end if;
  end loop;
  return new;
end
$$;
--> statement-breakpoint
create function refuse_change_of_frozen_rows() returns trigger language plpgsql as $$
begin
  raise exception 'Rows of % are only ever added', tg_table_name using errcode = 'integrity_constraint_violation';
end
$$;
--> statement-breakpoint
-- Named columns in "update of" would miss a change made by another trigger; the comparison is on few rows and cheap.
create trigger runs_frozen before update on runs for each row execute function refuse_change_of_frozen_columns(
  'id', 'sweep_id', 'number', 'definition', 'basis', 'engine_version', 'section_count', 'started_by', 'created_at'
);
--> statement-breakpoint
create trigger run_views_frozen before update on run_views for each row
when (old.state = 'finished')
execute function refuse_change_of_frozen_columns(
  'id', 'run_id', 'x', 'y', 'state', 'evaluated', 'feasible', 'result', 'front_count', 'hash'
);
--> statement-breakpoint
create trigger candidates_frozen before update on candidates for each row execute function refuse_change_of_frozen_columns(
  'id', 'project_id', 'beam_id', 'label', 'note', 'author_id', 'run_id', 'section_index', 'snapshot', 'hash', 'created_at'
);
--> statement-breakpoint
create trigger candidate_transitions_frozen before update or delete on candidate_transitions
for each row execute function refuse_change_of_frozen_rows();
--> statement-breakpoint
create trigger candidate_comments_frozen before update or delete on candidate_comments
for each row execute function refuse_change_of_frozen_rows();
