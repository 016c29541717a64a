import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
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
import { createdAt, moment, rowId, schoolId, ticks } from './columns';
import { practicals, rubricVersions } from './practicals';
import { people } from './school';
import { sections } from './sections';

export const sittings = pgTable(
  'sittings',
  {
    schoolId: schoolId(),
    id: rowId(),
    sectionId: uuid('section_id').notNull(),
    practicalId: uuid('practical_id').notNull(),
    rubricVersionId: uuid('rubric_version_id').notNull(),
    state: text('state', { enum: ['open', 'published'] })
      .notNull()
      .default('open'),
    dueOn: date('due_on', { mode: 'string' }),
    openedBy: uuid('opened_by').notNull(),
    openedAt: moment('opened_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.sectionId], foreignColumns: [sections.schoolId, sections.id] }),
    foreignKey({
      columns: [t.schoolId, t.practicalId],
      foreignColumns: [practicals.schoolId, practicals.id],
    }),
    foreignKey({
      columns: [t.schoolId, t.rubricVersionId, t.practicalId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id, rubricVersions.practicalId],
    }),
    foreignKey({ columns: [t.schoolId, t.openedBy], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('sittings_practical_once').on(t.schoolId, t.sectionId, t.practicalId),
    check('sittings_state', sql`${t.state} in ('open', 'published')`),
  ],
);

/** A sitting's way from one version to the next. An undone one stays, and says who took it back. */
export const sittingMoves = pgTable(
  'sitting_moves',
  {
    schoolId: schoolId(),
    id: rowId(),
    sittingId: uuid('sitting_id').notNull(),
    number: integer('number').notNull(),
    practicalId: uuid('practical_id').notNull(),
    fromVersionId: uuid('from_version_id').notNull(),
    toVersionId: uuid('to_version_id').notNull(),
    /** Nobody's score drops by this move. */
    holdHarmless: boolean('hold_harmless').notNull(),
    /** The number of the latest publication when it was made, 0 before the first; a later one ends the undoing. */
    afterPublication: integer('after_publication').notNull(),
    movedBy: uuid('moved_by').notNull(),
    movedAt: moment('moved_at').notNull().defaultNow(),
    undoneBy: uuid('undone_by'),
    undoneAt: moment('undone_at'),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.sittingId], foreignColumns: [sittings.schoolId, sittings.id] }),
    foreignKey({
      columns: [t.schoolId, t.fromVersionId, t.practicalId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id, rubricVersions.practicalId],
    }),
    foreignKey({
      columns: [t.schoolId, t.toVersionId, t.practicalId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id, rubricVersions.practicalId],
    }),
    foreignKey({ columns: [t.schoolId, t.movedBy], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.undoneBy], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('sitting_moves_number').on(t.schoolId, t.sittingId, t.number),
    check('sitting_moves_number_positive', sql`${t.number} >= 1`),
    check('sitting_moves_publication', sql`${t.afterPublication} >= 0`),
    check('sitting_moves_undone', sql`(${t.undoneBy} is null) = (${t.undoneAt} is null)`),
  ],
);

/** `standing` tells why there is no number: only `zero` is one. It follows the events of its cell. */
export const attempts = pgTable(
  'attempts',
  {
    schoolId: schoolId(),
    id: rowId(),
    sittingId: uuid('sitting_id').notNull(),
    studentId: uuid('student_id').notNull(),
    number: integer('number').notNull(),
    standing: text('standing', { enum: ['expected', 'absent', 'excused', 'zero'] })
      .notNull()
      .default('expected'),
    daysLate: integer('days_late').notNull().default(0),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.sittingId], foreignColumns: [sittings.schoolId, sittings.id] }),
    foreignKey({ columns: [t.schoolId, t.studentId], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('attempts_number').on(t.schoolId, t.sittingId, t.studentId, t.number),
    unique('attempts_of_sitting').on(t.schoolId, t.id, t.sittingId),
    index('attempts_student').on(t.schoolId, t.studentId),
    check('attempts_number_positive', sql`${t.number} between 1 and 20`),
    check('attempts_days_late', sql`${t.daysLate} between 0 and 365`),
    check('attempts_standing', sql`${t.standing} in ('expected', 'absent', 'excused', 'zero')`),
  ],
);

/** Append-only. `side`: the bench's own record, or the student's own readings of the same cell. */
export const readingEvents = pgTable(
  'reading_events',
  {
    schoolId: schoolId(),
    id: uuid('id').notNull(),
    sittingId: uuid('sitting_id').notNull(),
    attemptId: uuid('attempt_id').notNull(),
    side: text('side', { enum: ['bench', 'own'] }).notNull(),
    lineId: text('line_id').notNull(),
    ordinal: integer('ordinal').notNull(),
    what: text('what').notNull(),
    value: jsonb('value').notNull(),
    readingTicks: ticks('reading_ticks'),
    typed: text('typed'),
    unit: text('unit', { enum: ['in', 'mm'] }),
    instrument: text('instrument'),
    supersedes: uuid('supersedes').array().notNull().default(sql`'{}'`),
    deviceId: uuid('device_id').notNull(),
    sequence: integer('sequence').notNull(),
    capturedAt: moment('captured_at').notNull(),
    authorId: uuid('author_id').notNull(),
    senderId: uuid('sender_id').notNull(),
    flags: text('flags').array().notNull().default(sql`'{}'`),
    receivedAt: moment('received_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({
      columns: [t.schoolId, t.attemptId, t.sittingId],
      foreignColumns: [attempts.schoolId, attempts.id, attempts.sittingId],
    }),
    foreignKey({ columns: [t.schoolId, t.authorId], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.senderId], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('reading_events_sequence').on(t.schoolId, t.deviceId, t.sequence),
    index('reading_events_attempt').on(t.schoolId, t.attemptId),
    index('reading_events_sitting').on(t.schoolId, t.sittingId),
    check('reading_events_side', sql`${t.side} in ('bench', 'own')`),
    check('reading_events_ticks', sql`${t.readingTicks} is null or ${t.readingTicks} > 0`),
    check('reading_events_value', sql`(${t.value}->>'kind' = 'value') = (${t.readingTicks} is not null)`),
    check('reading_events_unit', sql`${t.unit} in ('in', 'mm')`),
    check('reading_events_instrument', sql`${t.instrument} in ('rule', 'caliper', 'gauge', 'keyed')`),
    check('reading_events_ordinal', sql`${t.ordinal} between 0 and 200`),
    check('reading_events_sequence_positive', sql`${t.sequence} >= 1`),
  ],
);

/** Whose pieces each device has on its bench now. */
export const inHand = pgTable(
  'in_hand',
  {
    schoolId: schoolId(),
    sittingId: uuid('sitting_id').notNull(),
    deviceId: uuid('device_id').notNull(),
    personId: uuid('person_id').notNull(),
    attemptId: uuid('attempt_id').notNull(),
    since: moment('since').notNull().defaultNow(),
    seenAt: moment('seen_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.sittingId, t.deviceId] }),
    foreignKey({ columns: [t.schoolId, t.sittingId], foreignColumns: [sittings.schoolId, sittings.id] }),
    foreignKey({ columns: [t.schoolId, t.personId], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({ columns: [t.schoolId, t.attemptId], foreignColumns: [attempts.schoolId, attempts.id] }),
  ],
);
