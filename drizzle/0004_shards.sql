CREATE TABLE "view_shards" (
	"view_id" uuid NOT NULL,
	"from_index" bigint NOT NULL,
	"to_index" bigint NOT NULL,
	"evaluated" bigint DEFAULT 0 NOT NULL,
	"result" "bytea",
	"worker_id" text,
	"took_ms" double precision,
	CONSTRAINT "view_shards_view_id_from_index_pk" PRIMARY KEY("view_id","from_index"),
	CONSTRAINT "view_shards_range_check" CHECK (0 <= "view_shards"."from_index" and "view_shards"."from_index" < "view_shards"."to_index"),
	CONSTRAINT "view_shards_evaluated_check" CHECK (0 <= "view_shards"."evaluated" and "view_shards"."evaluated" <= "view_shards"."to_index" - "view_shards"."from_index"),
	CONSTRAINT "view_shards_done_check" CHECK ("view_shards"."result" is null or ("view_shards"."worker_id" is null and "view_shards"."evaluated" = "view_shards"."to_index" - "view_shards"."from_index"))
);
--> statement-breakpoint
CREATE TABLE "worker_processes" (
	"id" uuid PRIMARY KEY NOT NULL,
	"kind" text NOT NULL,
	"host" text NOT NULL,
	"pid" integer NOT NULL,
	"threads" integer NOT NULL,
	"engine_version" text NOT NULL,
	"queue_worker_ids" text[] DEFAULT '{}' NOT NULL,
	"sections_done" bigint DEFAULT 0 NOT NULL,
	"shards_done" integer DEFAULT 0 NOT NULL,
	"shards_failed" integer DEFAULT 0 NOT NULL,
	"sections_per_second" double precision DEFAULT 0 NOT NULL,
	"started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"heartbeat_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	"end" text,
	CONSTRAINT "worker_processes_kind_check" CHECK ("worker_processes"."kind" in ('service', 'worker')),
	CONSTRAINT "worker_processes_end_check" CHECK (("worker_processes"."end" is null) = ("worker_processes"."ended_at" is null)),
	CONSTRAINT "worker_processes_end_kind_check" CHECK ("worker_processes"."end" in ('stopped', 'lost'))
);
--> statement-breakpoint
ALTER TABLE "run_views" DROP CONSTRAINT "run_views_counts_check";--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "result_sequence" bigint DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "merged" bigint DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "opened_by" uuid;--> statement-breakpoint
ALTER TABLE "run_views" ADD COLUMN "counted_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "view_shards" ADD CONSTRAINT "view_shards_view_id_run_views_id_fk" FOREIGN KEY ("view_id") REFERENCES "public"."run_views"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "view_shards_held_idx" ON "view_shards" USING btree ("worker_id") WHERE "view_shards"."worker_id" is not null;--> statement-breakpoint
CREATE INDEX "worker_processes_live_idx" ON "worker_processes" USING btree ("heartbeat_at") WHERE "worker_processes"."ended_at" is null;--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_opened_by_people_id_fk" FOREIGN KEY ("opened_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
-- Results there are by now cover all that was evaluated.
update run_views set merged = evaluated, result_sequence = sequence where result is not null;--> statement-breakpoint
update run_views set evaluated = 0, feasible = 0 where result is null;--> statement-breakpoint
ALTER TABLE "run_views" ADD CONSTRAINT "run_views_counts_check" CHECK (0 <= "run_views"."feasible" and "run_views"."feasible" <= "run_views"."merged" and "run_views"."merged" <= "run_views"."evaluated");--> statement-breakpoint
ALTER TABLE "run_views" DROP COLUMN "worker_id";--> statement-breakpoint
-- A shard's result is written once. The shard goes with all others of its view when that is finished.
create trigger view_shards_frozen before update on view_shards for each row
when (old.result is not null)
execute function refuse_change_of_frozen_columns('view_id', 'from_index', 'to_index', 'result', 'evaluated');
