CREATE TABLE "annotations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"month" text NOT NULL,
	"text" text NOT NULL,
	"created_by" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "annotations_month" CHECK ("annotations"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$')
);
--> statement-breakpoint
CREATE TABLE "assignments" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"from_month" text NOT NULL,
	"to_month" text,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "assignments_pair" UNIQUE("ward_id","indicator_id"),
	CONSTRAINT "assignments_from" CHECK ("assignments"."from_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "assignments_to" CHECK ("assignments"."to_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "assignments_order" CHECK ("assignments"."to_month" is null or "assignments"."to_month" >= "assignments"."from_month")
);
--> statement-breakpoint
CREATE TABLE "audit_entries" (
	"seq" bigint PRIMARY KEY NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"actor_kind" text NOT NULL,
	"actor_id" text,
	"actor_name" text NOT NULL,
	"action" text NOT NULL,
	"subject_type" text NOT NULL,
	"subject_id" text NOT NULL,
	"before" text,
	"after" text,
	"request_id" text NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "audit_entries_hash" UNIQUE("hash"),
	CONSTRAINT "audit_entries_seq" CHECK ("audit_entries"."seq" > 0)
);
--> statement-breakpoint
CREATE TABLE "audit_head" (
	"id" bigint PRIMARY KEY NOT NULL,
	"seq" bigint NOT NULL,
	"hash" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "baselines" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"from_month" text NOT NULL,
	"to_month" text NOT NULL,
	"applies_from" text,
	"left_out" jsonb NOT NULL,
	"limits" text NOT NULL,
	"reason" text NOT NULL,
	"state" text NOT NULL,
	"proposed_by_id" text,
	"proposed_by" text NOT NULL,
	"proposed_at" timestamp (3) with time zone NOT NULL,
	"decided_by_id" text,
	"decided_by" text,
	"decided_at" timestamp (3) with time zone,
	"decision_reason" text,
	"superseded_at" timestamp (3) with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "baselines_state" CHECK ("baselines"."state" in ('proposed', 'decided', 'superseded', 'declined')),
	CONSTRAINT "baselines_from" CHECK ("baselines"."from_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "baselines_to" CHECK ("baselines"."to_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "baselines_applies_from" CHECK ("baselines"."applies_from" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "baselines_order" CHECK ("baselines"."to_month" >= "baselines"."from_month"),
	CONSTRAINT "baselines_decided" CHECK ("baselines"."state" in ('proposed') or "baselines"."decided_at" is not null)
);
--> statement-breakpoint
CREATE TABLE "corrections" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"month" text NOT NULL,
	"numerator" bigint,
	"denominator" bigint,
	"reason" text NOT NULL,
	"state" text NOT NULL,
	"tally_version" integer NOT NULL,
	"asked_by_id" text,
	"asked_by" text NOT NULL,
	"asked_at" timestamp (3) with time zone NOT NULL,
	"decided_by" text,
	"decided_at" timestamp (3) with time zone,
	"decision_reason" text,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "corrections_month" CHECK ("corrections"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "corrections_state" CHECK ("corrections"."state" in ('waiting', 'agreed', 'declined'))
);
--> statement-breakpoint
CREATE TABLE "hospital" (
	"id" integer PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"due_day" integer NOT NULL,
	"holidays" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "hospital_single_row" CHECK ("hospital"."id" = 1),
	CONSTRAINT "hospital_due_day" CHECK ("hospital"."due_day" between 1 and 28)
);
--> statement-breakpoint
CREATE TABLE "import_rows" (
	"import_run_id" uuid NOT NULL,
	"row" integer NOT NULL,
	"ward_id" uuid,
	"indicator_id" uuid,
	"ward" text NOT NULL,
	"indicator" text NOT NULL,
	"month" text NOT NULL,
	"numerator" bigint,
	"denominator" bigint,
	"not_collected" text,
	"note" text,
	"outcome" text NOT NULL,
	"messages" jsonb NOT NULL,
	"tally_version" integer DEFAULT 0 NOT NULL,
	"denominator_version" integer DEFAULT 0 NOT NULL,
	"before" jsonb,
	"committed_version" integer,
	CONSTRAINT "import_rows_import_run_id_row_pk" PRIMARY KEY("import_run_id","row"),
	CONSTRAINT "import_rows_outcome" CHECK ("import_rows"."outcome" in ('new', 'changed', 'same', 'rejected', 'skipped'))
);
--> statement-breakpoint
CREATE TABLE "import_runs" (
	"id" uuid PRIMARY KEY NOT NULL,
	"file_name" text NOT NULL,
	"sheet_name" text NOT NULL,
	"checksum" text NOT NULL,
	"state" text NOT NULL,
	"counts" jsonb NOT NULL,
	"columns" jsonb NOT NULL,
	"uploaded_by_id" text,
	"uploaded_by" text NOT NULL,
	"uploaded_at" timestamp (3) with time zone NOT NULL,
	"committed_at" timestamp (3) with time zone,
	"committed_by" text,
	"reason" text,
	"accepted" boolean DEFAULT false NOT NULL,
	"taken_back_at" timestamp (3) with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "import_runs_state" CHECK ("import_runs"."state" in ('checked', 'committed', 'taken-back'))
);
--> statement-breakpoint
CREATE TABLE "indicator_definitions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"indicator_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"effective_from" text NOT NULL,
	"numerator_label" text NOT NULL,
	"denominator_label" text NOT NULL,
	"attribution" text DEFAULT '' NOT NULL,
	"comparable" boolean NOT NULL,
	"reason" text NOT NULL,
	"decided_by" text NOT NULL,
	"decided_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "indicator_definitions_number" UNIQUE("indicator_id","number"),
	CONSTRAINT "indicator_definitions_effective" UNIQUE("indicator_id","effective_from"),
	CONSTRAINT "indicator_definitions_month" CHECK ("indicator_definitions"."effective_from" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "indicator_definitions_number_positive" CHECK ("indicator_definitions"."number" > 0)
);
--> statement-breakpoint
CREATE TABLE "indicators" (
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"per" integer NOT NULL,
	"better_when" text NOT NULL,
	"team" text NOT NULL,
	"numerator_by" text DEFAULT 'ward' NOT NULL,
	"mature_after_days" integer DEFAULT 0 NOT NULL,
	"shared_denominator_id" uuid,
	"limits" text DEFAULT 'auto' NOT NULL,
	"rules" jsonb NOT NULL,
	"target" double precision,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "indicators_code_unique" UNIQUE("code"),
	CONSTRAINT "indicators_code" CHECK ("indicators"."code" ~ '^[A-Z0-9-]{1,16}$' and "indicators"."code" <> 'HOSPITAL'),
	CONSTRAINT "indicators_kind" CHECK ("indicators"."kind" in ('proportion', 'rate')),
	CONSTRAINT "indicators_better_when" CHECK ("indicators"."better_when" in ('lower', 'higher', 'neither')),
	CONSTRAINT "indicators_team" CHECK ("indicators"."team" in ('infection_control', 'quality')),
	CONSTRAINT "indicators_numerator_by" CHECK ("indicators"."numerator_by" in ('ward', 'team')),
	CONSTRAINT "indicators_limits" CHECK ("indicators"."limits" in ('auto', 'three-sigma', 'exact', 'overdispersed')),
	CONSTRAINT "indicators_per" CHECK ("indicators"."per" > 0),
	CONSTRAINT "indicators_mature" CHECK ("indicators"."mature_after_days" between 0 and 366),
	CONSTRAINT "indicators_target" CHECK ("indicators"."target" is null or "indicators"."target" >= 0)
);
--> statement-breakpoint
CREATE TABLE "shared_denominators" (
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"label" text NOT NULL,
	CONSTRAINT "shared_denominators_code_unique" UNIQUE("code"),
	CONSTRAINT "shared_denominators_code" CHECK ("shared_denominators"."code" ~ '^[A-Z0-9-]{1,16}$' and "shared_denominators"."code" <> 'HOSPITAL')
);
--> statement-breakpoint
CREATE TABLE "cover" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"ward_id" uuid NOT NULL,
	"from_date" text NOT NULL,
	"until_date" text NOT NULL,
	CONSTRAINT "cover_order" CHECK ("cover"."until_date" >= "cover"."from_date")
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"used_at" timestamp (3) with time zone,
	CONSTRAINT "invitations_token" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"role" text NOT NULL,
	"grants" jsonb NOT NULL,
	"state" text NOT NULL,
	"password_hash" text,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "people_email_unique" UNIQUE("email"),
	CONSTRAINT "people_email" CHECK ("people"."email" = lower("people"."email") and "people"."email" like '%_@_%'),
	CONSTRAINT "people_role" CHECK ("people"."role" in ('ward_nurse', 'infection_control', 'board_member', 'quality_lead')),
	CONSTRAINT "people_state" CHECK ("people"."state" in ('invited', 'active', 'off')),
	CONSTRAINT "people_active" CHECK ("people"."state" <> 'active' or "people"."password_hash" is not null),
	CONSTRAINT "people_board_grants" CHECK ("people"."role" <> 'board_member' or jsonb_array_length("people"."grants") = 0)
);
--> statement-breakpoint
CREATE TABLE "person_wards" (
	"person_id" uuid NOT NULL,
	"ward_id" uuid NOT NULL,
	CONSTRAINT "person_wards_person_id_ward_id_pk" PRIMARY KEY("person_id","ward_id")
);
--> statement-breakpoint
CREATE TABLE "series_state" (
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"columns" jsonb NOT NULL,
	"centre" double precision,
	"baseline_status" text NOT NULL,
	"has_limits" boolean NOT NULL,
	"active_signals" integer NOT NULL,
	"newest_month" text,
	"updated_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "series_state_ward_id_indicator_id_pk" PRIMARY KEY("ward_id","indicator_id")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"last_seen_at" timestamp (3) with time zone NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"ended_at" timestamp (3) with time zone,
	"ended_why" text
);
--> statement-breakpoint
CREATE TABLE "sign_in_throttle" (
	"key" text PRIMARY KEY NOT NULL,
	"failures" integer NOT NULL,
	"window_started_at" timestamp (3) with time zone NOT NULL,
	"blocked_until" timestamp (3) with time zone
);
--> statement-breakpoint
CREATE TABLE "signal_history" (
	"id" uuid PRIMARY KEY NOT NULL,
	"signal_id" uuid NOT NULL,
	"change" text NOT NULL,
	"from_month" text NOT NULL,
	"to_month" text NOT NULL,
	"why" text,
	"at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "signal_history_change" CHECK ("signal_history"."change" in ('born', 'grew', 'shrank', 'withdrawn', 'came-back'))
);
--> statement-breakpoint
CREATE TABLE "signals" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"rule" text NOT NULL,
	"side" text NOT NULL,
	"towards" text NOT NULL,
	"from_month" text NOT NULL,
	"to_month" text NOT NULL,
	"segment_from" text NOT NULL,
	"spans_gap" boolean DEFAULT false NOT NULL,
	"on_newest" boolean NOT NULL,
	"status" text DEFAULT 'new' NOT NULL,
	"withdrawn_why" text,
	"born_at" timestamp (3) with time zone NOT NULL,
	"changed_at" timestamp (3) with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "signals_side" CHECK ("signals"."side" in ('upper', 'lower')),
	CONSTRAINT "signals_towards" CHECK ("signals"."towards" in ('adverse', 'favourable', 'neither')),
	CONSTRAINT "signals_status" CHECK ("signals"."status" in ('new', 'in_review', 'closed', 'withdrawn')),
	CONSTRAINT "signals_why" CHECK ("signals"."withdrawn_why" in ('correction', 'baseline', 'definition', 'rules', 'trial-limits', 'recall', 'import-taken-back')),
	CONSTRAINT "signals_withdrawn" CHECK (("signals"."status" = 'withdrawn') = ("signals"."withdrawn_why" is not null)),
	CONSTRAINT "signals_from" CHECK ("signals"."from_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "signals_to" CHECK ("signals"."to_month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "signals_segment" CHECK ("signals"."segment_from" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "signals_order" CHECK ("signals"."to_month" >= "signals"."from_month")
);
--> statement-breakpoint
CREATE TABLE "denominator_values" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"shared_denominator_id" uuid NOT NULL,
	"month" text NOT NULL,
	"value" bigint,
	"awaited" text,
	"version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp (3) with time zone NOT NULL,
	"updated_by" text NOT NULL,
	CONSTRAINT "denominator_values_key" UNIQUE("ward_id","shared_denominator_id","month"),
	CONSTRAINT "denominator_values_month" CHECK ("denominator_values"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "denominator_values_value" CHECK ("denominator_values"."value" between 0 and 1000000000),
	CONSTRAINT "denominator_values_awaited" CHECK ("denominator_values"."awaited" is null or "denominator_values"."value" is null)
);
--> statement-breakpoint
CREATE TABLE "tallies" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"month" text NOT NULL,
	"numerator" bigint,
	"denominator" bigint,
	"not_collected" text,
	"awaited" text,
	"note" text,
	"version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp (3) with time zone NOT NULL,
	"updated_by" text NOT NULL,
	"charted" boolean DEFAULT false NOT NULL,
	"charted_numerator" bigint,
	"charted_denominator" bigint,
	"charted_not_collected" text,
	"charted_awaited" text,
	"corrected" boolean DEFAULT false NOT NULL,
	CONSTRAINT "tallies_key" UNIQUE("ward_id","indicator_id","month"),
	CONSTRAINT "tallies_month" CHECK ("tallies"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "tallies_numerator" CHECK ("tallies"."numerator" between 0 and 1000000000),
	CONSTRAINT "tallies_denominator" CHECK ("tallies"."denominator" between 0 and 1000000000),
	CONSTRAINT "tallies_not_collected" CHECK ("tallies"."not_collected" is null or ("tallies"."numerator" is null and "tallies"."denominator" is null)),
	CONSTRAINT "tallies_awaited" CHECK ("tallies"."awaited" is null or "tallies"."denominator" is null)
);
--> statement-breakpoint
CREATE TABLE "tally_revisions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"indicator_id" uuid NOT NULL,
	"month" text NOT NULL,
	"event" text NOT NULL,
	"charted" boolean,
	"numerator" bigint,
	"denominator" bigint,
	"not_collected" text,
	"awaited" text,
	"note" text,
	"tally_version" integer NOT NULL,
	"source" text NOT NULL,
	"reason" text,
	"import_run_id" uuid,
	"actor_id" text,
	"actor_name" text NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "tally_revisions_month" CHECK ("tally_revisions"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "tally_revisions_event" CHECK ("tally_revisions"."event" in ('saved', 'sent', 'recalled', 'reopened', 'correction-asked', 'correction-declined', 'corrected', 'completed')),
	CONSTRAINT "tally_revisions_source" CHECK ("tally_revisions"."source" in ('form', 'import', 'api', 'correction', 'set-up'))
);
--> statement-breakpoint
CREATE TABLE "ward_returns" (
	"id" uuid PRIMARY KEY NOT NULL,
	"ward_id" uuid NOT NULL,
	"month" text NOT NULL,
	"status" text DEFAULT 'open' NOT NULL,
	"due_on" text NOT NULL,
	"first_submitted_at" timestamp (3) with time zone,
	"submitted_at" timestamp (3) with time zone,
	"submitted_by" text,
	"accepted_at" timestamp (3) with time zone,
	"accepted_by" text,
	"reopened" boolean DEFAULT false NOT NULL,
	"reopened_reason" text,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "ward_returns_pair" UNIQUE("ward_id","month"),
	CONSTRAINT "ward_returns_month" CHECK ("ward_returns"."month" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "ward_returns_due_on" CHECK ("ward_returns"."due_on" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])-(0[1-9]|[12][0-9]|3[01])$'),
	CONSTRAINT "ward_returns_status" CHECK ("ward_returns"."status" in ('open', 'submitted', 'accepted')),
	CONSTRAINT "ward_returns_sent" CHECK ("ward_returns"."status" = 'open' or "ward_returns"."submitted_at" is not null),
	CONSTRAINT "ward_returns_accepted" CHECK (("ward_returns"."status" = 'accepted') = ("ward_returns"."accepted_at" is not null))
);
--> statement-breakpoint
CREATE TABLE "wards" (
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"division" text NOT NULL,
	"open_from" text NOT NULL,
	"open_to" text,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "wards_code_unique" UNIQUE("code"),
	CONSTRAINT "wards_code" CHECK ("wards"."code" ~ '^[A-Z0-9-]{1,16}$' and "wards"."code" <> 'HOSPITAL'),
	CONSTRAINT "wards_open_from" CHECK ("wards"."open_from" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "wards_open_to" CHECK ("wards"."open_to" ~ '^(19|20|21)[0-9]{2}-(0[1-9]|1[0-2])$'),
	CONSTRAINT "wards_open_order" CHECK ("wards"."open_to" is null or "wards"."open_to" >= "wards"."open_from")
);
--> statement-breakpoint
ALTER TABLE "annotations" ADD CONSTRAINT "annotations_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotations" ADD CONSTRAINT "annotations_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "assignments" ADD CONSTRAINT "assignments_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "assignments" ADD CONSTRAINT "assignments_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "baselines" ADD CONSTRAINT "baselines_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "baselines" ADD CONSTRAINT "baselines_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "corrections" ADD CONSTRAINT "corrections_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "corrections" ADD CONSTRAINT "corrections_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "import_rows" ADD CONSTRAINT "import_rows_import_run_id_import_runs_id_fk" FOREIGN KEY ("import_run_id") REFERENCES "public"."import_runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "indicator_definitions" ADD CONSTRAINT "indicator_definitions_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "indicators" ADD CONSTRAINT "indicators_shared_denominator_id_shared_denominators_id_fk" FOREIGN KEY ("shared_denominator_id") REFERENCES "public"."shared_denominators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cover" ADD CONSTRAINT "cover_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cover" ADD CONSTRAINT "cover_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_wards" ADD CONSTRAINT "person_wards_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_wards" ADD CONSTRAINT "person_wards_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "series_state" ADD CONSTRAINT "series_state_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "series_state" ADD CONSTRAINT "series_state_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signal_history" ADD CONSTRAINT "signal_history_signal_id_signals_id_fk" FOREIGN KEY ("signal_id") REFERENCES "public"."signals"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signals" ADD CONSTRAINT "signals_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signals" ADD CONSTRAINT "signals_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "denominator_values" ADD CONSTRAINT "denominator_values_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "denominator_values" ADD CONSTRAINT "denominator_values_shared_denominator_id_shared_denominators_id_fk" FOREIGN KEY ("shared_denominator_id") REFERENCES "public"."shared_denominators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tallies" ADD CONSTRAINT "tallies_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tallies" ADD CONSTRAINT "tallies_indicator_id_indicators_id_fk" FOREIGN KEY ("indicator_id") REFERENCES "public"."indicators"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ward_returns" ADD CONSTRAINT "ward_returns_ward_id_wards_id_fk" FOREIGN KEY ("ward_id") REFERENCES "public"."wards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "annotations_series" ON "annotations" USING btree ("ward_id","indicator_id");--> statement-breakpoint
CREATE INDEX "assignments_indicator" ON "assignments" USING btree ("indicator_id");--> statement-breakpoint
CREATE INDEX "audit_entries_subject" ON "audit_entries" USING btree ("subject_type","subject_id");--> statement-breakpoint
CREATE INDEX "baselines_series" ON "baselines" USING btree ("ward_id","indicator_id");--> statement-breakpoint
CREATE UNIQUE INDEX "baselines_one_decided" ON "baselines" USING btree ("ward_id","indicator_id",coalesce("applies_from", '')) WHERE "baselines"."state" = 'decided';--> statement-breakpoint
CREATE INDEX "corrections_series" ON "corrections" USING btree ("ward_id","month","indicator_id");--> statement-breakpoint
CREATE INDEX "import_runs_uploader" ON "import_runs" USING btree ("uploaded_by_id");--> statement-breakpoint
CREATE INDEX "cover_person" ON "cover" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "sessions_person" ON "sessions" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "signal_history_signal" ON "signal_history" USING btree ("signal_id");--> statement-breakpoint
CREATE INDEX "signals_series" ON "signals" USING btree ("ward_id","indicator_id");--> statement-breakpoint
CREATE INDEX "signals_born" ON "signals" USING btree ("born_at");--> statement-breakpoint
CREATE INDEX "tallies_indicator_month" ON "tallies" USING btree ("indicator_id","month");--> statement-breakpoint
CREATE INDEX "tallies_ward_month" ON "tallies" USING btree ("ward_id","month");--> statement-breakpoint
CREATE INDEX "tally_revisions_series" ON "tally_revisions" USING btree ("ward_id","indicator_id","month","at");--> statement-breakpoint
CREATE INDEX "tally_revisions_import" ON "tally_revisions" USING btree ("import_run_id");--> statement-breakpoint
CREATE INDEX "ward_returns_month" ON "ward_returns" USING btree ("month");