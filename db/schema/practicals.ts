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
  ],
);
