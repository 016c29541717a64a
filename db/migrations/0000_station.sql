CREATE TABLE "access_log" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"actor_id" uuid,
	"actor_role" text,
	"action" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" uuid,
	"about_person_id" uuid,
	"details" jsonb DEFAULT '{}' NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "access_log_school_id_id_pk" PRIMARY KEY("school_id","id")
);
--> statement-breakpoint
CREATE TABLE "export_files" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"section_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"file_name" text NOT NULL,
	"storage_key" text NOT NULL,
	"sha256" text NOT NULL,
	"byte_count" integer NOT NULL,
	"row_count" integer NOT NULL,
	"exported_by" uuid NOT NULL,
	"exported_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "export_files_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "export_files_kind" CHECK ("export_files"."kind" in ('grades', 'sizes'))
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "practical_drafts" (
	"school_id" uuid NOT NULL,
	"practical_id" uuid NOT NULL,
	"content" jsonb NOT NULL,
	"revision" integer NOT NULL,
	"saved_by" uuid NOT NULL,
	"saved_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "practical_drafts_school_id_practical_id_pk" PRIMARY KEY("school_id","practical_id"),
	CONSTRAINT "practical_drafts_revision" CHECK ("practical_drafts"."revision" >= 1)
);
--> statement-breakpoint
CREATE TABLE "practicals" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"owner_id" uuid NOT NULL,
	"title" text NOT NULL,
	"unit" text NOT NULL,
	"copied_from_version_id" uuid,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "practicals_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "practicals_title" CHECK (length(btrim("practicals"."title")) between 1 and 120),
	CONSTRAINT "practicals_unit" CHECK ("practicals"."unit" in ('in', 'mm'))
);
--> statement-breakpoint
CREATE TABLE "rubric_versions" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"practical_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"task" jsonb NOT NULL,
	"form" jsonb NOT NULL,
	"rubric" jsonb NOT NULL,
	"engine_version" integer NOT NULL,
	"published_by" uuid NOT NULL,
	"published_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "rubric_versions_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "rubric_versions_of_practical" UNIQUE("school_id","id","practical_id"),
	CONSTRAINT "rubric_versions_number_positive" CHECK ("rubric_versions"."number" >= 1)
);
--> statement-breakpoint
CREATE TABLE "credentials" (
	"school_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"password_hash" text NOT NULL,
	"must_change" boolean NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "credentials_school_id_person_id_pk" PRIMARY KEY("school_id","person_id")
);
--> statement-breakpoint
CREATE TABLE "departments" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "departments_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "departments_name_length" CHECK (length(btrim("departments"."name")) between 1 and 120)
);
--> statement-breakpoint
CREATE TABLE "people" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"family_name" text NOT NULL,
	"given_name" text NOT NULL,
	"email" text,
	"local_id" text,
	"left_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "people_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "people_known_by" CHECK ("people"."email" is not null or "people"."local_id" is not null),
	CONSTRAINT "people_local_id_text" CHECK ("people"."local_id" ~ '^[^[:cntrl:]]{1,40}$' and "people"."local_id" !~ '^[-=+@]'),
	CONSTRAINT "people_names" CHECK (length("people"."family_name") between 0 and 80 and length("people"."given_name") between 0 and 80 and length(btrim("people"."family_name" || "people"."given_name")) > 0)
);
--> statement-breakpoint
CREATE TABLE "person_roles" (
	"school_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	"department_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "person_roles_school_id_person_id_role_pk" PRIMARY KEY("school_id","person_id","role"),
	CONSTRAINT "person_roles_role" CHECK ("person_roles"."role" in ('teacher', 'student', 'head', 'aide', 'admin')),
	CONSTRAINT "person_roles_head" CHECK ("person_roles"."role" <> 'head' or "person_roles"."department_id" is not null)
);
--> statement-breakpoint
CREATE TABLE "schools" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"unit" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "schools_code_unique" UNIQUE("code"),
	CONSTRAINT "schools_code" CHECK ("schools"."code" ~ '^[a-z0-9][a-z0-9-]{2,31}$'),
	CONSTRAINT "schools_name" CHECK (length(btrim("schools"."name")) between 1 and 120),
	CONSTRAINT "schools_unit" CHECK ("schools"."unit" in ('in', 'mm'))
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"school_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"active_role" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "setup_tokens" (
	"secret_hash" text PRIMARY KEY NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "tokens" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"secret_hash" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "tokens_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "tokens_secret_hash_unique" UNIQUE("secret_hash"),
	CONSTRAINT "tokens_kind" CHECK ("tokens"."kind" in ('invitation', 'reset'))
);
--> statement-breakpoint
CREATE TABLE "enrollments" (
	"school_id" uuid NOT NULL,
	"section_id" uuid NOT NULL,
	"student_id" uuid NOT NULL,
	"joined_on" date NOT NULL,
	"left_on" date,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "enrollments_school_id_section_id_student_id_pk" PRIMARY KEY("school_id","section_id","student_id"),
	CONSTRAINT "enrollments_days" CHECK ("enrollments"."left_on" is null or "enrollments"."joined_on" <= "enrollments"."left_on")
);
--> statement-breakpoint
CREATE TABLE "section_staff" (
	"school_id" uuid NOT NULL,
	"section_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"duty" text NOT NULL,
	"from_day" date,
	"to_day" date,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "section_staff_school_id_section_id_person_id_duty_pk" PRIMARY KEY("school_id","section_id","person_id","duty"),
	CONSTRAINT "section_staff_duty" CHECK ("section_staff"."duty" in ('teacher', 'aide')),
	CONSTRAINT "section_staff_days" CHECK ("section_staff"."from_day" is null or "section_staff"."to_day" is null or "section_staff"."from_day" <= "section_staff"."to_day"),
	CONSTRAINT "section_staff_aide_days" CHECK ("section_staff"."duty" = 'teacher' or "section_staff"."to_day" is not null)
);
--> statement-breakpoint
CREATE TABLE "sections" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"term_id" uuid NOT NULL,
	"name" text NOT NULL,
	"period" text NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sections_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "sections_name" CHECK (length(btrim("sections"."name")) between 1 and 80),
	CONSTRAINT "sections_period" CHECK (length(btrim("sections"."period")) between 1 and 20)
);
--> statement-breakpoint
CREATE TABLE "terms" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"starts_on" date NOT NULL,
	"ends_on" date NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "terms_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "terms_order" CHECK ("terms"."starts_on" < "terms"."ends_on"),
	CONSTRAINT "terms_name_length" CHECK (length(btrim("terms"."name")) between 1 and 60)
);
--> statement-breakpoint
CREATE TABLE "attempts" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"sitting_id" uuid NOT NULL,
	"student_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"standing" text DEFAULT 'expected' NOT NULL,
	"days_late" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "attempts_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "attempts_of_sitting" UNIQUE("school_id","id","sitting_id"),
	CONSTRAINT "attempts_number_positive" CHECK ("attempts"."number" between 1 and 20),
	CONSTRAINT "attempts_days_late" CHECK ("attempts"."days_late" between 0 and 365),
	CONSTRAINT "attempts_standing" CHECK ("attempts"."standing" in ('expected', 'absent', 'excused', 'zero'))
);
--> statement-breakpoint
CREATE TABLE "in_hand" (
	"school_id" uuid NOT NULL,
	"sitting_id" uuid NOT NULL,
	"device_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"attempt_id" uuid NOT NULL,
	"since" timestamp with time zone DEFAULT now() NOT NULL,
	"seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "in_hand_school_id_sitting_id_device_id_pk" PRIMARY KEY("school_id","sitting_id","device_id")
);
--> statement-breakpoint
CREATE TABLE "publications" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"sitting_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"rubric_version_id" uuid NOT NULL,
	"published_by" uuid NOT NULL,
	"published_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "publications_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "publications_number_positive" CHECK ("publications"."number" >= 1)
);
--> statement-breakpoint
CREATE TABLE "reading_events" (
	"school_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"sitting_id" uuid NOT NULL,
	"attempt_id" uuid NOT NULL,
	"side" text NOT NULL,
	"line_id" text NOT NULL,
	"ordinal" integer NOT NULL,
	"what" text NOT NULL,
	"value" jsonb NOT NULL,
	"reading_ticks" bigint,
	"typed" text,
	"unit" text,
	"instrument" text,
	"supersedes" uuid[] DEFAULT '{}' NOT NULL,
	"device_id" uuid NOT NULL,
	"sequence" integer NOT NULL,
	"captured_at" timestamp with time zone NOT NULL,
	"author_id" uuid NOT NULL,
	"sender_id" uuid NOT NULL,
	"flags" text[] DEFAULT '{}' NOT NULL,
	"received_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reading_events_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "reading_events_side" CHECK ("reading_events"."side" in ('bench', 'own')),
	CONSTRAINT "reading_events_ticks" CHECK ("reading_events"."reading_ticks" is null or "reading_events"."reading_ticks" > 0),
	CONSTRAINT "reading_events_value" CHECK (("reading_events"."value"->>'kind' = 'value') = ("reading_events"."reading_ticks" is not null)),
	CONSTRAINT "reading_events_unit" CHECK ("reading_events"."unit" in ('in', 'mm')),
	CONSTRAINT "reading_events_instrument" CHECK ("reading_events"."instrument" in ('rule', 'caliper', 'gauge', 'keyed')),
	CONSTRAINT "reading_events_ordinal" CHECK ("reading_events"."ordinal" between 0 and 200),
	CONSTRAINT "reading_events_sequence_positive" CHECK ("reading_events"."sequence" >= 1)
);
--> statement-breakpoint
CREATE TABLE "results" (
	"school_id" uuid NOT NULL,
	"publication_id" uuid NOT NULL,
	"attempt_id" uuid NOT NULL,
	"status" text NOT NULL,
	"score_points" integer,
	"total_points" integer NOT NULL,
	"bonus_points" integer NOT NULL,
	"predicted_points" integer,
	"measured_at" timestamp with time zone,
	"sheet" jsonb,
	"own_sheet" jsonb,
	"judgement" jsonb,
	CONSTRAINT "results_school_id_publication_id_attempt_id_pk" PRIMARY KEY("school_id","publication_id","attempt_id"),
	CONSTRAINT "results_status" CHECK ("results"."status" in ('scored', 'absent', 'excused', 'zero', 'not read')),
	CONSTRAINT "results_points" CHECK ("results"."total_points" >= 0 and "results"."bonus_points" >= 0),
	CONSTRAINT "results_number" CHECK (("results"."status" in ('scored', 'zero')) = ("results"."score_points" is not null))
);
--> statement-breakpoint
CREATE TABLE "score_sheets" (
	"school_id" uuid NOT NULL,
	"attempt_id" uuid NOT NULL,
	"side" text NOT NULL,
	"rubric_version_id" uuid NOT NULL,
	"engine_version" integer NOT NULL,
	"recorded" jsonb NOT NULL,
	"sheet" jsonb NOT NULL,
	"score_points" integer,
	"provisional_points" integer,
	"total_points" integer NOT NULL,
	"lost_points" integer NOT NULL,
	"complete" boolean NOT NULL,
	"conflicts" integer NOT NULL,
	"finished" boolean NOT NULL,
	"locked_at" timestamp with time zone,
	"measured_at" timestamp with time zone,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "score_sheets_school_id_attempt_id_side_pk" PRIMARY KEY("school_id","attempt_id","side"),
	CONSTRAINT "score_sheets_side" CHECK ("score_sheets"."side" in ('bench', 'own'))
);
--> statement-breakpoint
CREATE TABLE "sittings" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"section_id" uuid NOT NULL,
	"practical_id" uuid NOT NULL,
	"rubric_version_id" uuid NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"due_on" date,
	"opened_by" uuid NOT NULL,
	"opened_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sittings_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "sittings_state" CHECK ("sittings"."state" in ('open', 'published'))
);
--> statement-breakpoint
ALTER TABLE "access_log" ADD CONSTRAINT "access_log_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "access_log" ADD CONSTRAINT "access_log_school_id_actor_id_people_school_id_id_fk" FOREIGN KEY ("school_id","actor_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "access_log" ADD CONSTRAINT "access_log_school_id_about_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","about_person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "export_files" ADD CONSTRAINT "export_files_school_id_section_id_sections_school_id_id_fk" FOREIGN KEY ("school_id","section_id") REFERENCES "public"."sections"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "export_files" ADD CONSTRAINT "export_files_school_id_exported_by_people_school_id_id_fk" FOREIGN KEY ("school_id","exported_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practical_drafts" ADD CONSTRAINT "practical_drafts_school_id_practical_id_practicals_school_id_id_fk" FOREIGN KEY ("school_id","practical_id") REFERENCES "public"."practicals"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practical_drafts" ADD CONSTRAINT "practical_drafts_school_id_saved_by_people_school_id_id_fk" FOREIGN KEY ("school_id","saved_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practicals" ADD CONSTRAINT "practicals_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practicals" ADD CONSTRAINT "practicals_school_id_department_id_departments_school_id_id_fk" FOREIGN KEY ("school_id","department_id") REFERENCES "public"."departments"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practicals" ADD CONSTRAINT "practicals_school_id_owner_id_people_school_id_id_fk" FOREIGN KEY ("school_id","owner_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rubric_versions" ADD CONSTRAINT "rubric_versions_school_id_practical_id_practicals_school_id_id_fk" FOREIGN KEY ("school_id","practical_id") REFERENCES "public"."practicals"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rubric_versions" ADD CONSTRAINT "rubric_versions_school_id_published_by_people_school_id_id_fk" FOREIGN KEY ("school_id","published_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "credentials" ADD CONSTRAINT "credentials_school_id_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "departments" ADD CONSTRAINT "departments_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "people" ADD CONSTRAINT "people_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_roles" ADD CONSTRAINT "person_roles_school_id_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "person_roles" ADD CONSTRAINT "person_roles_school_id_department_id_departments_school_id_id_fk" FOREIGN KEY ("school_id","department_id") REFERENCES "public"."departments"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_school_id_user_id_people_school_id_id_fk" FOREIGN KEY ("school_id","user_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tokens" ADD CONSTRAINT "tokens_school_id_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "enrollments" ADD CONSTRAINT "enrollments_school_id_section_id_sections_school_id_id_fk" FOREIGN KEY ("school_id","section_id") REFERENCES "public"."sections"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "enrollments" ADD CONSTRAINT "enrollments_school_id_student_id_people_school_id_id_fk" FOREIGN KEY ("school_id","student_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "section_staff" ADD CONSTRAINT "section_staff_school_id_section_id_sections_school_id_id_fk" FOREIGN KEY ("school_id","section_id") REFERENCES "public"."sections"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "section_staff" ADD CONSTRAINT "section_staff_school_id_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_school_id_department_id_departments_school_id_id_fk" FOREIGN KEY ("school_id","department_id") REFERENCES "public"."departments"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sections" ADD CONSTRAINT "sections_school_id_term_id_terms_school_id_id_fk" FOREIGN KEY ("school_id","term_id") REFERENCES "public"."terms"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms" ADD CONSTRAINT "terms_school_id_schools_id_fk" FOREIGN KEY ("school_id") REFERENCES "public"."schools"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "attempts" ADD CONSTRAINT "attempts_school_id_sitting_id_sittings_school_id_id_fk" FOREIGN KEY ("school_id","sitting_id") REFERENCES "public"."sittings"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "attempts" ADD CONSTRAINT "attempts_school_id_student_id_people_school_id_id_fk" FOREIGN KEY ("school_id","student_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "in_hand" ADD CONSTRAINT "in_hand_school_id_sitting_id_sittings_school_id_id_fk" FOREIGN KEY ("school_id","sitting_id") REFERENCES "public"."sittings"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "in_hand" ADD CONSTRAINT "in_hand_school_id_person_id_people_school_id_id_fk" FOREIGN KEY ("school_id","person_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "in_hand" ADD CONSTRAINT "in_hand_school_id_attempt_id_attempts_school_id_id_fk" FOREIGN KEY ("school_id","attempt_id") REFERENCES "public"."attempts"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "publications" ADD CONSTRAINT "publications_school_id_sitting_id_sittings_school_id_id_fk" FOREIGN KEY ("school_id","sitting_id") REFERENCES "public"."sittings"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "publications" ADD CONSTRAINT "publications_school_id_rubric_version_id_rubric_versions_school_id_id_fk" FOREIGN KEY ("school_id","rubric_version_id") REFERENCES "public"."rubric_versions"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "publications" ADD CONSTRAINT "publications_school_id_published_by_people_school_id_id_fk" FOREIGN KEY ("school_id","published_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading_events" ADD CONSTRAINT "reading_events_school_id_attempt_id_sitting_id_attempts_school_id_id_sitting_id_fk" FOREIGN KEY ("school_id","attempt_id","sitting_id") REFERENCES "public"."attempts"("school_id","id","sitting_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading_events" ADD CONSTRAINT "reading_events_school_id_author_id_people_school_id_id_fk" FOREIGN KEY ("school_id","author_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading_events" ADD CONSTRAINT "reading_events_school_id_sender_id_people_school_id_id_fk" FOREIGN KEY ("school_id","sender_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_school_id_publication_id_publications_school_id_id_fk" FOREIGN KEY ("school_id","publication_id") REFERENCES "public"."publications"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_school_id_attempt_id_attempts_school_id_id_fk" FOREIGN KEY ("school_id","attempt_id") REFERENCES "public"."attempts"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "score_sheets" ADD CONSTRAINT "score_sheets_school_id_attempt_id_attempts_school_id_id_fk" FOREIGN KEY ("school_id","attempt_id") REFERENCES "public"."attempts"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "score_sheets" ADD CONSTRAINT "score_sheets_school_id_rubric_version_id_rubric_versions_school_id_id_fk" FOREIGN KEY ("school_id","rubric_version_id") REFERENCES "public"."rubric_versions"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sittings" ADD CONSTRAINT "sittings_school_id_section_id_sections_school_id_id_fk" FOREIGN KEY ("school_id","section_id") REFERENCES "public"."sections"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sittings" ADD CONSTRAINT "sittings_school_id_practical_id_practicals_school_id_id_fk" FOREIGN KEY ("school_id","practical_id") REFERENCES "public"."practicals"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sittings" ADD CONSTRAINT "sittings_school_id_rubric_version_id_practical_id_rubric_versions_school_id_id_practical_id_fk" FOREIGN KEY ("school_id","rubric_version_id","practical_id") REFERENCES "public"."rubric_versions"("school_id","id","practical_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sittings" ADD CONSTRAINT "sittings_school_id_opened_by_people_school_id_id_fk" FOREIGN KEY ("school_id","opened_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "access_log_at" ON "access_log" USING btree ("school_id","at");--> statement-breakpoint
CREATE INDEX "access_log_about" ON "access_log" USING btree ("school_id","about_person_id");--> statement-breakpoint
CREATE INDEX "practicals_owner" ON "practicals" USING btree ("school_id","owner_id");--> statement-breakpoint
CREATE UNIQUE INDEX "rubric_versions_number" ON "rubric_versions" USING btree ("school_id","practical_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "departments_name" ON "departments" USING btree ("school_id",lower("name"));--> statement-breakpoint
CREATE UNIQUE INDEX "people_id" ON "people" USING btree ("id");--> statement-breakpoint
CREATE UNIQUE INDEX "people_email" ON "people" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "people_local_id" ON "people" USING btree ("school_id","local_id");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("school_id","user_id");--> statement-breakpoint
CREATE INDEX "enrollments_student" ON "enrollments" USING btree ("school_id","student_id");--> statement-breakpoint
CREATE INDEX "section_staff_person" ON "section_staff" USING btree ("school_id","person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "terms_name" ON "terms" USING btree ("school_id",lower("name"));--> statement-breakpoint
CREATE UNIQUE INDEX "attempts_number" ON "attempts" USING btree ("school_id","sitting_id","student_id","number");--> statement-breakpoint
CREATE INDEX "attempts_student" ON "attempts" USING btree ("school_id","student_id");--> statement-breakpoint
CREATE UNIQUE INDEX "publications_number" ON "publications" USING btree ("school_id","sitting_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "reading_events_sequence" ON "reading_events" USING btree ("school_id","device_id","sequence");--> statement-breakpoint
CREATE INDEX "reading_events_attempt" ON "reading_events" USING btree ("school_id","attempt_id");--> statement-breakpoint
CREATE INDEX "reading_events_sitting" ON "reading_events" USING btree ("school_id","sitting_id");--> statement-breakpoint
CREATE INDEX "results_attempt" ON "results" USING btree ("school_id","attempt_id");--> statement-breakpoint
CREATE UNIQUE INDEX "sittings_practical_once" ON "sittings" USING btree ("school_id","section_id","practical_id");--> statement-breakpoint
-- Roles: the product's own (app), sign-in (auth) and the worker. None can log in; the connection takes one on.
DO $$
DECLARE wanted text;
BEGIN
  FOREACH wanted IN ARRAY ARRAY['trymark_app', 'trymark_auth', 'trymark_worker'] LOOP
    BEGIN
      IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = wanted) THEN
        EXECUTE format('CREATE ROLE %I NOLOGIN NOINHERIT NOBYPASSRLS', wanted);
      END IF;
    EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL;
    END;
    BEGIN
      EXECUTE format('GRANT %I TO %I', wanted, current_user);
    EXCEPTION WHEN insufficient_privilege THEN
      -- Made beforehand by somebody else: then it must have been granted with them.
      IF NOT pg_has_role(current_user, wanted, 'MEMBER') THEN RAISE; END IF;
    END;
    EXECUTE format('GRANT USAGE ON SCHEMA public TO %I', wanted);
  END LOOP;
END $$;
--> statement-breakpoint
CREATE FUNCTION current_school_id() RETURNS uuid LANGUAGE sql STABLE
AS $$ SELECT nullif(current_setting('app.school_id', true), '')::uuid $$;
--> statement-breakpoint
-- Every table with a school_id is walled off by school; a table that lacks the wall fails the tests.
DO $$
DECLARE tenant record;
BEGIN
  FOR tenant IN
    SELECT c.table_name AS name FROM information_schema.columns c
    JOIN information_schema.tables t USING (table_schema, table_name)
    WHERE c.table_schema = 'public' AND c.column_name = 'school_id' AND t.table_type = 'BASE TABLE'
  LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', tenant.name);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', tenant.name);
    EXECUTE format(
      'CREATE POLICY own_school ON %I TO trymark_app USING (school_id = (SELECT current_school_id())) WITH CHECK (school_id = (SELECT current_school_id()))',
      tenant.name);
  END LOOP;
END $$;
--> statement-breakpoint
ALTER TABLE schools ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
ALTER TABLE schools FORCE ROW LEVEL SECURITY;
--> statement-breakpoint
CREATE POLICY own_school ON schools TO trymark_app
  USING (id = (SELECT current_school_id())) WITH CHECK (id = (SELECT current_school_id()));
--> statement-breakpoint
-- Sign-in must find a person before a school is known; it sees these tables and no others.
DO $$
DECLARE wide text;
BEGIN
  FOREACH wide IN ARRAY ARRAY['schools', 'departments', 'people', 'person_roles', 'credentials', 'sessions', 'tokens', 'access_log'] LOOP
    EXECUTE format('CREATE POLICY sign_in ON %I TO trymark_auth USING (true) WITH CHECK (true)', wide);
  END LOOP;
  FOREACH wide IN ARRAY ARRAY['sessions', 'tokens'] LOOP
    EXECUTE format('CREATE POLICY sweeping ON %I TO trymark_worker USING (true)', wide);
  END LOOP;
END $$;
--> statement-breakpoint
GRANT SELECT, UPDATE (name, time_zone, unit) ON schools TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON departments, people, terms, sections, enrollments, practicals, sittings, attempts, tokens TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON section_staff, practical_drafts, score_sheets, in_hand TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT, DELETE ON person_roles TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT ON rubric_versions, reading_events, publications, results, access_log, export_files TO trymark_app;
--> statement-breakpoint
-- The product may set a password, never read a hash.
GRANT SELECT (school_id, person_id, must_change, changed_at), INSERT, UPDATE (password_hash, must_change, changed_at)
  ON credentials TO trymark_app;
--> statement-breakpoint
GRANT SELECT (id, school_id, user_id, expires_at), DELETE ON sessions TO trymark_app;
--> statement-breakpoint
GRANT SELECT ON schools, departments, people, person_roles TO trymark_auth;
--> statement-breakpoint
GRANT INSERT ON schools, departments, people, person_roles, access_log TO trymark_auth;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON credentials, tokens, setup_tokens TO trymark_auth;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON sessions, rate_limits TO trymark_auth;
--> statement-breakpoint
GRANT SELECT, DELETE ON sessions, tokens, rate_limits TO trymark_worker;
--> statement-breakpoint
-- What was recorded or published stays as it was, whoever asks.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql
AS $$ BEGIN RAISE EXCEPTION '% rows are never changed', TG_TABLE_NAME USING ERRCODE = 'integrity_constraint_violation'; END $$;
--> statement-breakpoint
DO $$
DECLARE kept text;
BEGIN
  FOREACH kept IN ARRAY ARRAY['rubric_versions', 'reading_events', 'publications', 'results', 'access_log', 'export_files'] LOOP
    EXECUTE format('CREATE TRIGGER never_changed BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION refuse_change()', kept);
  END LOOP;
END $$;
