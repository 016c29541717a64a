import { z } from 'zod';

export const MOST_COMPARED = 6;

const versionId = z.uuid('This is not a version.');

export const listRubricsInput = z.object({});

export const compareVersionsInput = z.object({
  versionIds: z
    .array(versionId)
    .min(2, 'Choose two rubrics or more.')
    .max(MOST_COMPARED, `Compare at most ${MOST_COMPARED} rubrics at once.`)
    .refine((ids) => new Set(ids).size === ids.length, 'The same version is named twice.'),
});

export const listSharedInput = z.object({});

export const sharedVersionInput = z.object({ versionId });

export const endApprovalInput = z.object({ approvalId: z.uuid('This is not an approval.') });
