import { z } from 'zod';
import { cellSchema, cellValueSchema, SIDES, shortText } from './cells';

/** Raised when an old page could misread an answer; the server refuses other versions with a sentence. */
export const PROTOCOL_VERSION = 1;

export const MAX_BATCH = 500;

export const INSTRUMENTS = ['rule', 'caliper', 'gauge', 'keyed'] as const;

/** PostgreSQL writes UUIDs in small letters; one spelling everywhere keeps a repeat recognizable. */
export const uuid = z.uuid().toLowerCase();

/** One thing recorded, once, on one device. `supersedes` names the heads of the cell that its author saw. */
export const readingEventSchema = z.strictObject({
  id: uuid,
  attemptId: uuid,
  side: z.enum(SIDES),
  cell: cellSchema,
  value: cellValueSchema,
  typed: shortText(64).nullable(),
  unit: z.enum(['in', 'mm']).nullable(),
  instrument: z.enum(INSTRUMENTS).nullable(),
  supersedes: z.array(uuid).max(20),
  sequence: z.int().min(1).max(2_000_000_000),
  capturedAt: z.iso.datetime(),
  authorId: uuid,
});

export type ReadingEvent = z.infer<typeof readingEventSchema>;

export const pushSchema = z.strictObject({
  protocol: z.literal(PROTOCOL_VERSION),
  deviceId: uuid,
  events: z.array(readingEventSchema).min(1).max(MAX_BATCH),
});

export type Push = z.infer<typeof pushSchema>;

/** A push as the server opens it: each event is judged alone, so that one that is wrong holds up no other. */
export const pushEnvelopeSchema = z.strictObject({
  protocol: z.literal(PROTOCOL_VERSION),
  deviceId: uuid,
  events: z
    .array(z.looseObject({ id: uuid }))
    .min(1)
    .max(MAX_BATCH),
});

/** Marks of an event that the server kept without taking it at its word; people see them. */
export const EVENT_FLAGS = ['late-lock', 'access-ended'] as const;

export type EventFlag = (typeof EVENT_FLAGS)[number];

/** The answer names every event; one that is not named was not received. */
export const pushAnswerSchema = z.strictObject({
  protocol: z.literal(PROTOCOL_VERSION),
  answers: z.array(
    z.discriminatedUnion('outcome', [
      z.strictObject({ id: uuid, outcome: z.literal('kept') }),
      z.strictObject({ id: uuid, outcome: z.literal('already') }),
      z.strictObject({ id: uuid, outcome: z.literal('refused'), reason: z.string() }),
    ]),
  ),
});

export type PushAnswer = z.infer<typeof pushAnswerSchema>;
