import { sql } from 'drizzle-orm';
import {
  check,
  date,
  foreignKey,
  index,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { createdAt, moment, rowId, schoolId } from './columns';
import { departments, people, schools } from './school';

export const terms = pgTable(
  'terms',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    name: text('name').notNull(),
    startsOn: date('starts_on', { mode: 'string' }).notNull(),
    endsOn: date('ends_on', { mode: 'string' }).notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    uniqueIndex('terms_name').on(t.schoolId, sql`lower(${t.name})`),
    check('terms_order', sql`${t.startsOn} < ${t.endsOn}`),
    check('terms_name_length', sql`length(btrim(${t.name})) between 1 and 60`),
  ],
);

export const sections = pgTable(
  'sections',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    departmentId: uuid('department_id').notNull(),
    termId: uuid('term_id').notNull(),
    name: text('name').notNull(),
    period: text('period').notNull(),
    archivedAt: moment('archived_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({
      columns: [t.schoolId, t.departmentId],
      foreignColumns: [departments.schoolId, departments.id],
    }),
    foreignKey({ columns: [t.schoolId, t.termId], foreignColumns: [terms.schoolId, terms.id] }),
    check('sections_name', sql`length(btrim(${t.name})) between 1 and 80`),
    check('sections_period', sql`length(btrim(${t.period})) between 1 and 20`),
  ],
);

/** Who works in a section: its teachers, and its aides for the days they were given. */
export const sectionStaff = pgTable(
  'section_staff',
  {
    schoolId: schoolId(),
    sectionId: uuid('section_id').notNull(),
    personId: uuid('person_id').notNull(),
    duty: text('duty', { enum: ['teacher', 'aide'] }).notNull(),
    fromDay: date('from_day', { mode: 'string' }),
    toDay: date('to_day', { mode: 'string' }),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.sectionId, t.personId, t.duty] }),
    foreignKey({ columns: [t.schoolId, t.sectionId], foreignColumns: [sections.schoolId, sections.id] }),
    foreignKey({ columns: [t.schoolId, t.personId], foreignColumns: [people.schoolId, people.id] }),
    index('section_staff_person').on(t.schoolId, t.personId),
    check('section_staff_duty', sql`${t.duty} in ('teacher', 'aide')`),
    check(
      'section_staff_days',
      sql`${t.fromDay} is null or ${t.toDay} is null or ${t.fromDay} <= ${t.toDay}`,
    ),
    check('section_staff_aide_days', sql`${t.duty} = 'teacher' or ${t.toDay} is not null`),
  ],
);

export const enrollments = pgTable(
  'enrollments',
  {
    schoolId: schoolId(),
    sectionId: uuid('section_id').notNull(),
    studentId: uuid('student_id').notNull(),
    joinedOn: date('joined_on', { mode: 'string' }).notNull(),
    leftOn: date('left_on', { mode: 'string' }),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.sectionId, t.studentId] }),
    foreignKey({ columns: [t.schoolId, t.sectionId], foreignColumns: [sections.schoolId, sections.id] }),
    foreignKey({ columns: [t.schoolId, t.studentId], foreignColumns: [people.schoolId, people.id] }),
    index('enrollments_student').on(t.schoolId, t.studentId),
    check('enrollments_days', sql`${t.leftOn} is null or ${t.joinedOn} <= ${t.leftOn}`),
  ],
);
