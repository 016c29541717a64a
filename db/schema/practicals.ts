import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { createdAt, moment, rowId, schoolId } from './columns';
import { departments, people, schools } from './school';

export const practicals = pgTable(
  'practicals',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    departmentId: uuid('department_id').notNull(),
    ownerId: uuid('owner_id').notNull(),
    title: text('title').notNull(),
    unit: text('unit', { enum: ['in', 'mm'] }).notNull(),
    copiedFromVersionId: uuid('copied_from_version_id'),
    /** What the copy is to the version it was taken from; null for one that was not taken from a version. */
    sourceKind: text('source_kind', { enum: ['copy', 'adopted', 'variant'] }),
    /** Since when the department may take copies of what is published of it. */
    offeredAt: moment('offered_at'),
    archivedAt: moment('archived_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({
      columns: [t.schoolId, t.departmentId],
      foreignColumns: [departments.schoolId, departments.id],
    }),
    foreignKey({ columns: [t.schoolId, t.ownerId], foreignColumns: [people.schoolId, people.id] }),
    index('practicals_owner').on(t.schoolId, t.ownerId),
    check('practicals_title', sql`length(btrim(${t.title})) between 1 and 120`),
    check('practicals_unit', sql`${t.unit} in ('in', 'mm')`),
    check('practicals_source_kind', sql`${t.sourceKind} in ('copy', 'adopted', 'variant')`),
    check('practicals_source', sql`(${t.sourceKind} is null) = (${t.copiedFromVersionId} is null)`),
  ],
);

/** What a teacher is writing, as typed; `revision` tells a stale editor from a current one. */
export const practicalDrafts = pgTable(
  'practical_drafts',
  {
    schoolId: schoolId(),
    practicalId: uuid('practical_id').notNull(),
    content: jsonb('content').notNull(),
    revision: integer('revision').notNull(),
    savedBy: uuid('saved_by').notNull(),
    savedAt: moment('saved_at').notNull().defaultNow(),
    /** The draft that a newer version of the original was taken over, kept so that it can be put back. */
    replaced: jsonb('replaced'),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.practicalId] }),
    foreignKey({
      columns: [t.schoolId, t.practicalId],
      foreignColumns: [practicals.schoolId, practicals.id],
    }),
    foreignKey({ columns: [t.schoolId, t.savedBy], foreignColumns: [people.schoolId, people.id] }),
    check('practical_drafts_revision', sql`${t.revision} >= 1`),
  ],
);

/** Published versions alone; the database refuses to change or delete one. */
export const rubricVersions = pgTable(
  'rubric_versions',
  {
    schoolId: schoolId(),
    id: rowId(),
    practicalId: uuid('practical_id').notNull(),
    number: integer('number').notNull(),
    task: jsonb('task').notNull(),
    form: jsonb('form').notNull(),
    rubric: jsonb('rubric').notNull(),
    engineVersion: integer('engine_version').notNull(),
    /** In its author's words, why it differs from the rubric that the department approved. */
    differenceReason: text('difference_reason'),
    publishedBy: uuid('published_by').notNull(),
    publishedAt: moment('published_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({
      columns: [t.schoolId, t.practicalId],
      foreignColumns: [practicals.schoolId, practicals.id],
    }),
    foreignKey({ columns: [t.schoolId, t.publishedBy], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('rubric_versions_number').on(t.schoolId, t.practicalId, t.number),
    unique('rubric_versions_of_practical').on(t.schoolId, t.id, t.practicalId),
    check('rubric_versions_number_positive', sql`${t.number} >= 1`),
    check('rubric_versions_reason', sql`length(btrim(${t.differenceReason})) between 1 and 400`),
  ],
);

/** A version that a head approved as the department's; at most one of a practical at a time. */
export const rubricApprovals = pgTable(
  'rubric_approvals',
  {
    schoolId: schoolId(),
    id: rowId(),
    practicalId: uuid('practical_id').notNull(),
    rubricVersionId: uuid('rubric_version_id').notNull(),
    approvedBy: uuid('approved_by').notNull(),
    approvedAt: moment('approved_at').notNull().defaultNow(),
    endedBy: uuid('ended_by'),
    endedAt: moment('ended_at'),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({
      columns: [t.schoolId, t.rubricVersionId, t.practicalId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id, rubricVersions.practicalId],
    }),
    foreignKey({ columns: [t.schoolId, t.approvedBy], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.endedBy], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('rubric_approvals_standing').on(t.schoolId, t.practicalId).where(sql`${t.endedAt} is null`),
    check('rubric_approvals_ended', sql`(${t.endedBy} is null) = (${t.endedAt} is null)`),
  ],
);
