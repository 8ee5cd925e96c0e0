CREATE TABLE "sheet_values" (
	"candidate_id" uuid NOT NULL,
	"line" text NOT NULL,
	"person_id" uuid NOT NULL,
	"value" double precision NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sheet_values_pk" PRIMARY KEY("candidate_id","line","person_id"),
	CONSTRAINT "sheet_values_line_check" CHECK ("sheet_values"."line" <> '' and length("sheet_values"."line") <= 80),
	CONSTRAINT "sheet_values_value_check" CHECK ("sheet_values"."value" > '-Infinity' and "sheet_values"."value" < 'Infinity')
);
--> statement-breakpoint
ALTER TABLE "candidate_transitions" ADD COLUMN "sheet_values" jsonb;--> statement-breakpoint
ALTER TABLE "sheet_values" ADD CONSTRAINT "sheet_values_candidate_id_candidates_id_fk" FOREIGN KEY ("candidate_id") REFERENCES "public"."candidates"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_values" ADD CONSTRAINT "sheet_values_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "sheet_values_person_idx" ON "sheet_values" USING btree ("person_id");--> statement-breakpoint
ALTER TABLE "candidate_transitions" ADD CONSTRAINT "candidate_transitions_sheet_values_check" CHECK ("candidate_transitions"."sheet_values" is null or ("candidate_transitions"."to_state" in ('checked', 'approved') and jsonb_typeof("candidate_transitions"."sheet_values") = 'array'));