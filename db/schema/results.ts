import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { accommodations } from './accommodations';
import { moment, rowId, schoolId } from './columns';
import { rubricVersions } from './practicals';
import { people } from './school';
import { attempts, sittings } from './sittings';

/** Derived from the events by the version and engine named; can be rebuilt from them at any time. */
export const scoreSheets = pgTable(
  'score_sheets',
  {
    schoolId: schoolId(),
    attemptId: uuid('attempt_id').notNull(),
    side: text('side', { enum: ['bench', 'own'] }).notNull(),
    rubricVersionId: uuid('rubric_version_id').notNull(),
    engineVersion: integer('engine_version').notNull(),
    recorded: jsonb('recorded').notNull(),
    sheet: jsonb('sheet').notNull(),
    scorePoints: integer('score_points'),
    provisionalPoints: integer('provisional_points'),
    totalPoints: integer('total_points').notNull(),
    /** Added so that a change of the rubric, moved to as "nobody drops", takes nothing away. */
    heldPoints: integer('held_points').notNull().default(0),
    /** The modified rubric that priced it, if any. */
    accommodationId: uuid('accommodation_id'),
    lostPoints: integer('lost_points').notNull(),
    complete: boolean('complete').notNull(),
    conflicts: integer('conflicts').notNull(),
    finished: boolean('finished').notNull(),
    lockedAt: moment('locked_at'),
    measuredAt: moment('measured_at'),
    updatedAt: moment('updated_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.attemptId, t.side] }),
    foreignKey({ columns: [t.schoolId, t.attemptId], foreignColumns: [attempts.schoolId, attempts.id] }),
    foreignKey({
      columns: [t.schoolId, t.rubricVersionId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id],
    }),
    foreignKey({
      columns: [t.schoolId, t.accommodationId],
      foreignColumns: [accommodations.schoolId, accommodations.id],
    }),
    check('score_sheets_side', sql`${t.side} in ('bench', 'own')`),
    check('score_sheets_held', sql`${t.heldPoints} >= 0`),
  ],
);

export const publications = pgTable(
  'publications',
  {
    schoolId: schoolId(),
    id: rowId(),
    sittingId: uuid('sitting_id').notNull(),
    number: integer('number').notNull(),
    rubricVersionId: uuid('rubric_version_id').notNull(),
    publishedBy: uuid('published_by').notNull(),
    publishedAt: moment('published_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.sittingId], foreignColumns: [sittings.schoolId, sittings.id] }),
    foreignKey({
      columns: [t.schoolId, t.rubricVersionId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id],
    }),
    foreignKey({ columns: [t.schoolId, t.publishedBy], foreignColumns: [people.schoolId, people.id] }),
    uniqueIndex('publications_number').on(t.schoolId, t.sittingId, t.number),
    check('publications_number_positive', sql`${t.number} >= 1`),
  ],
);

/** What a publication told each student; a later correction is another publication. */
export const results = pgTable(
  'results',
  {
    schoolId: schoolId(),
    publicationId: uuid('publication_id').notNull(),
    attemptId: uuid('attempt_id').notNull(),
    status: text('status', { enum: ['scored', 'absent', 'excused', 'zero', 'not read'] }).notNull(),
    scorePoints: integer('score_points'),
    totalPoints: integer('total_points').notNull(),
    bonusPoints: integer('bonus_points').notNull(),
    /** Part of the score: what an earlier version of the rubric gave beyond this one. */
    heldPoints: integer('held_points').notNull().default(0),
    heldVersionId: uuid('held_version_id'),
    /** The modified rubric that priced it, if any. */
    accommodationId: uuid('accommodation_id'),
    predictedPoints: integer('predicted_points'),
    measuredAt: moment('measured_at'),
    sheet: jsonb('sheet'),
    ownSheet: jsonb('own_sheet'),
    judgement: jsonb('judgement'),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.publicationId, t.attemptId] }),
    foreignKey({
      columns: [t.schoolId, t.publicationId],
      foreignColumns: [publications.schoolId, publications.id],
    }),
    foreignKey({ columns: [t.schoolId, t.attemptId], foreignColumns: [attempts.schoolId, attempts.id] }),
    foreignKey({
      columns: [t.schoolId, t.heldVersionId],
      foreignColumns: [rubricVersions.schoolId, rubricVersions.id],
    }),
    foreignKey({
      columns: [t.schoolId, t.accommodationId],
      foreignColumns: [accommodations.schoolId, accommodations.id],
    }),
    index('results_attempt').on(t.schoolId, t.attemptId),
    check('results_status', sql`${t.status} in ('scored', 'absent', 'excused', 'zero', 'not read')`),
    check('results_points', sql`${t.totalPoints} >= 0 and ${t.bonusPoints} >= 0`),
    check(
      'results_held',
      sql`${t.heldPoints} >= 0 and (${t.heldPoints} > 0) = (${t.heldVersionId} is not null)`,
    ),
    check('results_number', sql`(${t.status} in ('scored', 'zero')) = (${t.scorePoints} is not null)`),
  ],
);
