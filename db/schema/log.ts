import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core';
import { ROLES } from '@/lib/auth/roles';
import { moment, rowId, schoolId } from './columns';
import { people, schools } from './school';
import { sections } from './sections';

/** Append-only: every change, and every view of another person's record by staff. */
export const accessLog = pgTable(
  'access_log',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    actorId: uuid('actor_id'),
    actorRole: text('actor_role', { enum: ROLES }),
    action: text('action').notNull(),
    subjectKind: text('subject_kind').notNull(),
    subjectId: uuid('subject_id'),
    aboutPersonId: uuid('about_person_id'),
    details: jsonb('details').notNull().default(sql`'{}'`),
    at: moment('at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.actorId], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.aboutPersonId], foreignColumns: [people.schoolId, people.id] }),
    index('access_log_at').on(t.schoolId, t.at),
    index('access_log_about').on(t.schoolId, t.aboutPersonId),
  ],
);

/** Files that went out, so that the same file can be sent again byte for byte. */
export const exportFiles = pgTable(
  'export_files',
  {
    schoolId: schoolId(),
    id: rowId(),
    sectionId: uuid('section_id').notNull(),
    kind: text('kind', { enum: ['grades', 'sizes'] }).notNull(),
    fileName: text('file_name').notNull(),
    storageKey: text('storage_key').notNull(),
    sha256: text('sha256').notNull(),
    byteCount: integer('byte_count').notNull(),
    rowCount: integer('row_count').notNull(),
    exportedBy: uuid('exported_by').notNull(),
    exportedAt: moment('exported_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.sectionId], foreignColumns: [sections.schoolId, sections.id] }),
    foreignKey({ columns: [t.schoolId, t.exportedBy], foreignColumns: [people.schoolId, people.id] }),
    check('export_files_kind', sql`${t.kind} in ('grades', 'sizes')`),
  ],
);

/** Counters of rate-limiter-flexible; they stand before anybody is known, so outside the tenants. */
export const rateLimits = pgTable('rate_limits', {
  key: text('key').primaryKey(),
  points: integer('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number' }),
});
