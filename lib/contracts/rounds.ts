import { z } from 'zod';
import { taskSchema } from '@/lib/practicals/task';
import { rubricSchema } from '@/lib/scoring/schemas';
import { pushEnvelopeSchema, readingEventSchema, uuid } from '@/lib/sync/protocol';

export const sittingInput = z.strictObject({ sittingId: uuid });

export const keepEventsInput = z.strictObject({ sittingId: uuid, push: pushEnvelopeSchema });

export const takeInHandInput = z.strictObject({
  sittingId: uuid,
  deviceId: uuid,
  attemptId: uuid.nullable(),
});

export const readInHandInput = z.strictObject({ sittingId: uuid, deviceId: uuid });

/** Whose pieces another device has on its bench. */
const inHandSchema = z.strictObject({
  attemptId: uuid,
  deviceId: uuid,
  name: z.string(),
  since: z.iso.datetime(),
});

export type InHand = z.infer<typeof inHandSchema>;

/** `benchEvents` tells a device, at no cost, that others have recorded something it has not seen. */
export const inHandViewSchema = z.strictObject({
  others: z.array(inHandSchema),
  benchEvents: z.int().min(0),
});

export type InHandView = z.infer<typeof inHandViewSchema>;

const roundStudentSchema = z.strictObject({
  attemptId: uuid,
  attemptNumber: z.int().min(1),
  studentId: uuid,
  givenName: z.string(),
  familyName: z.string(),
});

/** A stored event with the device that made it: what a round is rebuilt from. */
export const storedEventSchema = readingEventSchema.extend({ deviceId: uuid });

export type StoredEvent = z.infer<typeof storedEventSchema>;

/** All a device needs to record a sitting, with or without a network. Nothing of the students' own side is in it. */
export const roundBundleSchema = z.strictObject({
  sittingId: uuid,
  published: z.boolean(),
  sectionName: z.string(),
  period: z.string(),
  schoolName: z.string(),
  task: taskSchema,
  rubric: rubricSchema,
  versionNumber: z.int().min(1).nullable(),
  students: z.array(roundStudentSchema),
  events: z.array(storedEventSchema),
  /** Names of those who recorded, by person. */
  authors: z.record(z.string(), z.string()),
  inHand: inHandViewSchema,
  /** What the person who opened the round may do beyond recording. */
  may: z.strictObject({ finish: z.boolean(), settle: z.boolean() }),
});

export type RoundBundle = z.infer<typeof roundBundleSchema>;
