import { z } from 'zod';

export const MOST_COMPARED = 6;

export const listRubricsInput = z.object({});

export const compareVersionsInput = z.object({
  versionIds: z
    .array(z.uuid('This is not a version.'))
    .min(2, 'Choose two rubrics or more.')
    .max(MOST_COMPARED, `Compare at most ${MOST_COMPARED} rubrics at once.`)
    .refine((ids) => new Set(ids).size === ids.length, 'The same version is named twice.'),
});
