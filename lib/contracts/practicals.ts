import { z } from 'zod';
import { practicalDraftSchema } from '@/lib/practicals/draft';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';

const practicalId = z.uuid('This is not a practical.');

const title = z
  .string('Give the practical a title.')
  .trim()
  .min(1, 'Give the practical a title.')
  .max(120, 'Use at most 120 characters.');

/** From nothing, or as a copy of a starter practical. */
export const createPracticalInput = z.discriminatedUnion('from', [
  z.object({
    from: z.literal('empty'),
    title,
    unit: z.enum(['in', 'mm'], 'Choose inches or millimetres.'),
  }),
  z.object({ from: z.literal('starter'), starter: z.enum(STARTER_IDS, 'Choose one of the starters.') }),
]);

export const listPracticalsInput = z.object({ archived: z.boolean().default(false) });

export const readPracticalInput = z.object({ practicalId });

/** An own practical as it stands, or a version that somebody published. */
export const copyPracticalInput = z.object({ practicalId, versionId: z.uuid().nullable().default(null) });

export const saveDraftInput = z.object({
  practicalId,
  revision: z.int().min(1),
  content: practicalDraftSchema,
});

export const LONGEST_REASON = 400;

/** `reason`: why the version differs from the department’s, where it does. */
export const publishVersionInput = z.object({
  practicalId,
  revision: z.int().min(1),
  reason: z
    .string()
    .trim()
    .max(LONGEST_REASON, `Use at most ${LONGEST_REASON} characters for the reason.`)
    .transform((text) => text || null)
    .nullable()
    .default(null),
});

export const readVersionInput = z.object({ versionId: z.uuid('This is not a version.') });

export const archivePracticalInput = z.object({ practicalId, archived: z.boolean() });

export const offerPracticalInput = z.object({ practicalId, offered: z.boolean() });

/** `revision`: the draft that is to give way, as it was looked at; `versionId`: a newer version of the original. */
export const takeNewerVersionInput = z.object({
  practicalId,
  revision: z.int().min(1),
  versionId: z.uuid('This is not a version.'),
});

export const putBackDraftInput = z.object({ practicalId, revision: z.int().min(1) });
