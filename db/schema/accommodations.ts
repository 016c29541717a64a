import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { moment, rowId, schoolId } from './columns';
import { departments, people } from './school';
import { terms } from './sections';
import { sittings } from './sittings';

/**
 * A modified rubric for one student: in one sitting, or in every sitting of the term that has none of its own.
 * Never changed, only ended; a change is another row, so that a result keeps the one that priced it.
 */
export const accommodations = pgTable(
  'accommodations',
  {
    schoolId: schoolId(),
    id: rowId(),
    studentId: uuid('student_id').notNull(),
    departmentId: uuid('department_id').notNull(),
    termId: uuid('term_id').notNull(),
    sittingId: uuid('sitting_id'),
    modification: jsonb('modification').notNull(),
    madeBy: uuid('made_by').notNull(),
    madeAt: moment('made_at').notNull().defaultNow(),
    endedBy: uuid('ended_by'),
    endedAt: moment('ended_at'),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.studentId], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({
      columns: [t.schoolId, t.departmentId],
      foreignColumns: [departments.schoolId, departments.id],
    }),
    foreignKey({ columns: [t.schoolId, t.termId], foreignColumns: [terms.schoolId, terms.id] }),
    foreignKey({ columns: [t.schoolId, t.sittingId], foreignColumns: [sittings.schoolId, sittings.id] }),
    foreignKey({ columns: [t.schoolId, t.madeBy], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.endedBy], foreignColumns: [people.schoolId, people.id] }),
    index('accommodations_student').on(t.schoolId, t.studentId),
    uniqueIndex('accommodations_of_sitting')
      .on(t.schoolId, t.studentId, t.sittingId)
      .where(sql`${t.endedAt} is null and ${t.sittingId} is not null`),
    uniqueIndex('accommodations_of_term')
      .on(t.schoolId, t.studentId, t.departmentId, t.termId)
      .where(sql`${t.endedAt} is null and ${t.sittingId} is null`),
    check('accommodations_ended', sql`(${t.endedBy} is null) = (${t.endedAt} is null)`),
  ],
);

/** Why, apart from the record of scores: read by itself, and each look is logged. */
export const accommodationReasons = pgTable(
  'accommodation_reasons',
  {
    schoolId: schoolId(),
    accommodationId: uuid('accommodation_id').notNull(),
    reason: text('reason').notNull(),
    writtenBy: uuid('written_by').notNull(),
    writtenAt: moment('written_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.accommodationId] }),
    foreignKey({
      columns: [t.schoolId, t.accommodationId],
      foreignColumns: [accommodations.schoolId, accommodations.id],
    }),
    foreignKey({ columns: [t.schoolId, t.writtenBy], foreignColumns: [people.schoolId, people.id] }),
    check('accommodation_reasons_text', sql`length(btrim(${t.reason})) between 1 and 2000`),
  ],
);
