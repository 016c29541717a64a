CREATE TABLE "accommodation_reasons" (
	"school_id" uuid NOT NULL,
	"accommodation_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"written_by" uuid NOT NULL,
	"written_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "accommodation_reasons_school_id_accommodation_id_pk" PRIMARY KEY("school_id","accommodation_id"),
	CONSTRAINT "accommodation_reasons_text" CHECK (length(btrim("accommodation_reasons"."reason")) between 1 and 2000)
);
--> statement-breakpoint
CREATE TABLE "accommodations" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"student_id" uuid NOT NULL,
	"department_id" uuid NOT NULL,
	"term_id" uuid NOT NULL,
	"sitting_id" uuid,
	"modification" jsonb NOT NULL,
	"made_by" uuid NOT NULL,
	"made_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_by" uuid,
	"ended_at" timestamp with time zone,
	CONSTRAINT "accommodations_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "accommodations_ended" CHECK (("accommodations"."ended_by" is null) = ("accommodations"."ended_at" is null))
);
--> statement-breakpoint
CREATE TABLE "rubric_approvals" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"practical_id" uuid NOT NULL,
	"rubric_version_id" uuid NOT NULL,
	"approved_by" uuid NOT NULL,
	"approved_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_by" uuid,
	"ended_at" timestamp with time zone,
	CONSTRAINT "rubric_approvals_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "rubric_approvals_ended" CHECK (("rubric_approvals"."ended_by" is null) = ("rubric_approvals"."ended_at" is null))
);
--> statement-breakpoint
CREATE TABLE "sitting_moves" (
	"school_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"sitting_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"practical_id" uuid NOT NULL,
	"from_version_id" uuid NOT NULL,
	"to_version_id" uuid NOT NULL,
	"hold_harmless" boolean NOT NULL,
	"after_publication" integer NOT NULL,
	"moved_by" uuid NOT NULL,
	"moved_at" timestamp with time zone DEFAULT now() NOT NULL,
	"undone_by" uuid,
	"undone_at" timestamp with time zone,
	CONSTRAINT "sitting_moves_school_id_id_pk" PRIMARY KEY("school_id","id"),
	CONSTRAINT "sitting_moves_number_positive" CHECK ("sitting_moves"."number" >= 1),
	CONSTRAINT "sitting_moves_publication" CHECK ("sitting_moves"."after_publication" >= 0),
	CONSTRAINT "sitting_moves_undone" CHECK (("sitting_moves"."undone_by" is null) = ("sitting_moves"."undone_at" is null))
);
--> statement-breakpoint
ALTER TABLE "practicals" ADD COLUMN "source_kind" text;--> statement-breakpoint
ALTER TABLE "practicals" ADD COLUMN "offered_at" timestamp with time zone;--> statement-breakpoint
-- Row security holds the owner too, who without this would see no row to bring up to date.
ALTER TABLE "practicals" NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "rubric_versions" NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
UPDATE "practicals" p SET "source_kind" = CASE WHEN o."owner_id" = p."owner_id" THEN 'copy' ELSE 'adopted' END
  FROM "rubric_versions" v JOIN "practicals" o ON o."school_id" = v."school_id" AND o."id" = v."practical_id"
  WHERE v."school_id" = p."school_id" AND v."id" = p."copied_from_version_id";--> statement-breakpoint
-- Until now the department could copy whatever was published; that stays on offer.
UPDATE "practicals" p SET "offered_at" = now() WHERE "archived_at" IS NULL
  AND EXISTS (SELECT FROM "rubric_versions" v WHERE v."school_id" = p."school_id" AND v."practical_id" = p."id");--> statement-breakpoint
ALTER TABLE "practicals" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "rubric_versions" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "rubric_versions" ADD COLUMN "difference_reason" text;--> statement-breakpoint
ALTER TABLE "practical_drafts" ADD COLUMN "replaced" jsonb;--> statement-breakpoint
ALTER TABLE "results" ADD COLUMN "held_points" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "results" ADD COLUMN "held_version_id" uuid;--> statement-breakpoint
ALTER TABLE "results" ADD COLUMN "accommodation_id" uuid;--> statement-breakpoint
ALTER TABLE "score_sheets" ADD COLUMN "held_points" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "score_sheets" ADD COLUMN "accommodation_id" uuid;--> statement-breakpoint
ALTER TABLE "accommodation_reasons" ADD CONSTRAINT "accommodation_reasons_school_id_accommodation_id_accommodations_school_id_id_fk" FOREIGN KEY ("school_id","accommodation_id") REFERENCES "public"."accommodations"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodation_reasons" ADD CONSTRAINT "accommodation_reasons_school_id_written_by_people_school_id_id_fk" FOREIGN KEY ("school_id","written_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_student_id_people_school_id_id_fk" FOREIGN KEY ("school_id","student_id") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_department_id_departments_school_id_id_fk" FOREIGN KEY ("school_id","department_id") REFERENCES "public"."departments"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_term_id_terms_school_id_id_fk" FOREIGN KEY ("school_id","term_id") REFERENCES "public"."terms"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_sitting_id_sittings_school_id_id_fk" FOREIGN KEY ("school_id","sitting_id") REFERENCES "public"."sittings"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_made_by_people_school_id_id_fk" FOREIGN KEY ("school_id","made_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accommodations" ADD CONSTRAINT "accommodations_school_id_ended_by_people_school_id_id_fk" FOREIGN KEY ("school_id","ended_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rubric_approvals" ADD CONSTRAINT "rubric_approvals_school_id_rubric_version_id_practical_id_rubric_versions_school_id_id_practical_id_fk" FOREIGN KEY ("school_id","rubric_version_id","practical_id") REFERENCES "public"."rubric_versions"("school_id","id","practical_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rubric_approvals" ADD CONSTRAINT "rubric_approvals_school_id_approved_by_people_school_id_id_fk" FOREIGN KEY ("school_id","approved_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rubric_approvals" ADD CONSTRAINT "rubric_approvals_school_id_ended_by_people_school_id_id_fk" FOREIGN KEY ("school_id","ended_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sitting_moves" ADD CONSTRAINT "sitting_moves_school_id_sitting_id_sittings_school_id_id_fk" FOREIGN KEY ("school_id","sitting_id") REFERENCES "public"."sittings"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sitting_moves" ADD CONSTRAINT "sitting_moves_school_id_from_version_id_practical_id_rubric_versions_school_id_id_practical_id_fk" FOREIGN KEY ("school_id","from_version_id","practical_id") REFERENCES "public"."rubric_versions"("school_id","id","practical_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sitting_moves" ADD CONSTRAINT "sitting_moves_school_id_to_version_id_practical_id_rubric_versions_school_id_id_practical_id_fk" FOREIGN KEY ("school_id","to_version_id","practical_id") REFERENCES "public"."rubric_versions"("school_id","id","practical_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sitting_moves" ADD CONSTRAINT "sitting_moves_school_id_moved_by_people_school_id_id_fk" FOREIGN KEY ("school_id","moved_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sitting_moves" ADD CONSTRAINT "sitting_moves_school_id_undone_by_people_school_id_id_fk" FOREIGN KEY ("school_id","undone_by") REFERENCES "public"."people"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "accommodations_student" ON "accommodations" USING btree ("school_id","student_id");--> statement-breakpoint
CREATE UNIQUE INDEX "accommodations_of_sitting" ON "accommodations" USING btree ("school_id","student_id","sitting_id") WHERE "accommodations"."ended_at" is null and "accommodations"."sitting_id" is not null;--> statement-breakpoint
CREATE UNIQUE INDEX "accommodations_of_term" ON "accommodations" USING btree ("school_id","student_id","department_id","term_id") WHERE "accommodations"."ended_at" is null and "accommodations"."sitting_id" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "rubric_approvals_standing" ON "rubric_approvals" USING btree ("school_id","practical_id") WHERE "rubric_approvals"."ended_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "sitting_moves_number" ON "sitting_moves" USING btree ("school_id","sitting_id","number");--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_school_id_held_version_id_rubric_versions_school_id_id_fk" FOREIGN KEY ("school_id","held_version_id") REFERENCES "public"."rubric_versions"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_school_id_accommodation_id_accommodations_school_id_id_fk" FOREIGN KEY ("school_id","accommodation_id") REFERENCES "public"."accommodations"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "score_sheets" ADD CONSTRAINT "score_sheets_school_id_accommodation_id_accommodations_school_id_id_fk" FOREIGN KEY ("school_id","accommodation_id") REFERENCES "public"."accommodations"("school_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practicals" ADD CONSTRAINT "practicals_source_kind" CHECK ("practicals"."source_kind" in ('copy', 'adopted', 'variant'));--> statement-breakpoint
ALTER TABLE "practicals" ADD CONSTRAINT "practicals_source" CHECK (("practicals"."source_kind" is null) = ("practicals"."copied_from_version_id" is null));--> statement-breakpoint
ALTER TABLE "rubric_versions" ADD CONSTRAINT "rubric_versions_reason" CHECK (length(btrim("rubric_versions"."difference_reason")) between 1 and 400);--> statement-breakpoint
ALTER TABLE "results" ADD CONSTRAINT "results_held" CHECK ("results"."held_points" >= 0 and ("results"."held_points" > 0) = ("results"."held_version_id" is not null));--> statement-breakpoint
ALTER TABLE "score_sheets" ADD CONSTRAINT "score_sheets_held" CHECK ("score_sheets"."held_points" >= 0);--> statement-breakpoint
DO $$
DECLARE tenant text;
BEGIN
  FOREACH tenant IN ARRAY ARRAY['accommodations', 'accommodation_reasons', 'rubric_approvals', 'sitting_moves'] LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', tenant);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', tenant);
    EXECUTE format(
      'CREATE POLICY own_school ON %I TO trymark_app USING (school_id = (SELECT current_school_id())) WITH CHECK (school_id = (SELECT current_school_id()))',
      tenant);
  END LOOP;
END $$;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (ended_by, ended_at) ON accommodations, rubric_approvals TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (undone_by, undone_at) ON sitting_moves TO trymark_app;
--> statement-breakpoint
GRANT SELECT, INSERT ON accommodation_reasons TO trymark_app;
--> statement-breakpoint
CREATE TRIGGER never_changed BEFORE UPDATE OR DELETE ON accommodation_reasons FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER ended_for_good BEFORE UPDATE ON accommodations FOR EACH ROW WHEN (old.ended_at IS NOT NULL) EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER ended_for_good BEFORE UPDATE ON rubric_approvals FOR EACH ROW WHEN (old.ended_at IS NOT NULL) EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER undone_for_good BEFORE UPDATE ON sitting_moves FOR EACH ROW WHEN (old.undone_at IS NOT NULL) EXECUTE FUNCTION refuse_change();
