import { z } from 'zod';
import { cellSchema, cellValueSchema } from './cells';

/** Raised when an old page could misread an answer; the server refuses other versions with a sentence. */
export const PROTOCOL_VERSION = 1;

export const MAX_BATCH = 500;

export const INSTRUMENTS = ['rule', 'caliper', 'gauge', 'keyed'] as const;

/** One thing recorded, once, on one device. `supersedes` names the heads of the cell that its author saw. */
export const readingEventSchema = z.strictObject({
  id: z.uuid(),
  attemptId: z.uuid(),
  side: z.enum(['bench', 'own']),
  cell: cellSchema,
  value: cellValueSchema,
  typed: z.string().max(64).nullable(),
  unit: z.enum(['in', 'mm']).nullable(),
  instrument: z.enum(INSTRUMENTS).nullable(),
  supersedes: z.array(z.uuid()).max(20),
  sequence: z.int().min(1).max(2_000_000_000),
  capturedAt: z.iso.datetime(),
  authorId: z.uuid(),
});

export type ReadingEvent = z.infer<typeof readingEventSchema>;

export const pushSchema = z.strictObject({
  protocol: z.literal(PROTOCOL_VERSION),
  deviceId: z.uuid(),
  events: z.array(readingEventSchema).min(1).max(MAX_BATCH),
});

export type Push = z.infer<typeof pushSchema>;

/** The answer names every event; one that is not named was not received. */
export const pushAnswerSchema = z.strictObject({
  protocol: z.literal(PROTOCOL_VERSION),
  answers: z.array(
    z.discriminatedUnion('outcome', [
      z.strictObject({ id: z.uuid(), outcome: z.literal('kept') }),
      z.strictObject({ id: z.uuid(), outcome: z.literal('already') }),
      z.strictObject({ id: z.uuid(), outcome: z.literal('refused'), reason: z.string() }),
    ]),
  ),
});

export type PushAnswer = z.infer<typeof pushAnswerSchema>;
