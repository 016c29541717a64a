import { z } from 'zod';
import { judgementSchema } from './results';

const points = z.int();
const length = z.int();

export const gradebookInput = z.strictObject({ sectionId: z.uuid('This address is not complete.') });

export const cellInput = z.strictObject({ sectionId: z.uuid(), attemptId: z.uuid() });

export const exportInput = z.strictObject({
  sectionId: z.uuid('This address is not complete.'),
  /** Null: every published sitting of the section. */
  sittingId: z.uuid('This address is not complete.').nullish(),
});

export const fileInput = z.strictObject({ fileId: z.uuid('This address is not complete.') });

/**
 * `scored` and `zero` alone are numbers. A published cell tells what went out; otherwise the bench is still
 * recording, and a number is what the work comes to so far.
 */
const cellSchema = z.strictObject({
  attemptId: z.string(),
  attemptNumber: z.int(),
  published: z.boolean(),
  status: z.enum(['scored', 'zero', 'absent', 'excused', 'not read', 'reading', 'conflict']),
  score: points.nullable(),
  total: points,
  lost: z.strictObject({ under: points, over: points, dearestUnder: points, dearestOver: points }),
  missing: z.int(),
  held: z.int(),
  daysLate: z.int(),
  notArrived: z.int(),
  /** What is recorded now is no longer what was published. */
  changed: z.boolean(),
});

export type GradebookCell = z.infer<typeof cellSchema>;

export const gradebookSchema = z.strictObject({
  section: z.strictObject({
    sectionId: z.string(),
    name: z.string(),
    period: z.string(),
    termName: z.string(),
    studentCount: z.int(),
  }),
  /** The person's other sections of this term, this one among them, to go to. */
  sections: z.array(z.strictObject({ sectionId: z.string(), name: z.string(), period: z.string() })),
  sittings: z.array(
    z.strictObject({
      sittingId: z.string(),
      title: z.string(),
      versionNumber: z.int(),
      open: z.boolean(),
      openedAt: z.string(),
      /** The latest publication; null before the first. */
      publication: z
        .strictObject({ number: z.int(), publishedAt: z.string(), changedSince: z.int() })
        .nullable(),
      notArrived: z.int(),
    }),
  ),
  students: z.array(
    z.strictObject({
      studentId: z.string(),
      localId: z.string().nullable(),
      familyName: z.string(),
      givenName: z.string(),
      joinedOn: z.string().nullable(),
      leftOn: z.string().nullable(),
      /** In the order of the sittings; null where the student has no attempt. */
      cells: z.array(cellSchema.nullable()),
      /** Tenths of a percent: the simple mean of the published scores. */
      mean: z.int().nullable(),
    }),
  ),
  /** Files that went out, the latest first; empty for those who may not send any. */
  files: z.array(
    z.strictObject({
      fileId: z.string(),
      kind: z.enum(['grades', 'sizes']),
      fileName: z.string(),
      sentAt: z.string(),
      sentBy: z.string(),
      rows: z.int(),
      bytes: z.int(),
      sha256: z.string(),
    }),
  ),
  may: z.strictObject({ export: z.boolean(), change: z.boolean() }),
  timeZone: z.string(),
});

export type GradebookView = z.infer<typeof gradebookSchema>;

const lossRowSchema = z.strictObject({
  kind: z.enum(['size', 'check', 'missing', 'held', 'gross', 'capped', 'set', 'work']),
  /** "end 2"; '' for what concerns the whole work. */
  piece: z.string(),
  /** The axis or the check. */
  what: z.string(),
  target: length.nullable(),
  reading: length.nullable(),
  /** Instead of a reading: spoiled, not read. */
  word: z.string().nullable(),
  deviation: length.nullable(),
  points,
  ofTotal: points,
});

/** Where the points of one attempt went: rows that add up on both scales. */
export const explanationSchema = z.strictObject({
  attemptId: z.string(),
  attemptNumber: z.int(),
  sittingId: z.string(),
  studentId: z.string(),
  familyName: z.string(),
  givenName: z.string(),
  title: z.string(),
  versionNumber: z.int(),
  unit: z.enum(['in', 'mm']),
  published: z.boolean(),
  status: cellSchema.shape.status,
  /** The scores of all the student's attempts, and the one that counts after a redo. */
  attempts: z.array(z.strictObject({ attemptId: z.string(), number: z.int(), score: points.nullable() })),
  counted: points.nullable(),
  redo: z.string().nullable(),
  score: points.nullable(),
  total: points,
  possible: points,
  rows: z.array(lossRowSchema),
  /** Sizes that cost nothing; `within` where one free distance held for all. */
  free: z.strictObject({ sizes: z.int(), within: length.nullable() }),
  goodChecks: z.array(z.string()),
  unread: z.int(),
  lost: z.strictObject({ points, ofTotal: points }),
  kept: z.strictObject({ points, ofTotal: points }),
  floorGives: points,
  bonus: points,
  /** Added because an earlier version gave more and nobody was to drop; part of the score. */
  held: z.strictObject({ points, versionNumber: z.int() }).nullable(),
  /** Priced by a modified rubric. */
  modified: z.boolean(),
  rest: points,
  roundTo: points,
  daysLate: z.int(),
  predicted: points.nullable(),
  judgement: judgementSchema.nullable(),
});

export type ExplanationView = z.infer<typeof explanationSchema>;
