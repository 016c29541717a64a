import { z } from 'zod';
import type { PreviewLine } from './moves';

const points = z.int();

const version = z.object({ versionId: z.string(), number: z.int(), total: points });

const movedAttempt = z.object({
  attemptId: z.string(),
  studentId: z.string(),
  familyName: z.string(),
  givenName: z.string(),
  attemptNumber: z.int(),
  before: points.nullable(),
  after: points.nullable(),
  held: points.nullable(),
  change: points.nullable(),
  told: z.boolean(),
  modified: z.boolean(),
});

const preview = z.object({
  sittingId: z.string(),
  from: version,
  to: version,
  students: z.array(movedAttempt),
  gain: z.int(),
  same: z.int(),
  lose: z.int(),
  meanChange: points.nullable(),
  notAsked: z.array(z.object({ label: z.string(), attempts: z.int() })),
  seen: z.string(),
});

/** A line of the preview's stream, as a page reads it. */
export const previewLineSchema: z.ZodType<PreviewLine> = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('progress'), done: z.int(), of: z.int() }),
  z.object({ kind: z.literal('preview'), preview }),
  z.object({ kind: z.literal('problem'), message: z.string() }),
]);
