import { z } from 'zod';

const id = z.uuid('This address is not complete.');

export const sittingIdInput = z.strictObject({ sittingId: id });

export const openChoicesInput = z.strictObject({ sectionId: z.uuid().nullish() });

export const openSittingInput = z.object({
  sectionId: z.uuid('Choose a period.'),
  versionId: z.uuid('Choose a practical.'),
  dueOn: z.preprocess(
    (value) => (value === '' || value === undefined ? null : value),
    z.iso.date('Choose a day, or leave it empty.').nullable(),
  ),
});

export const changeDueInput = z.object({
  sittingId: id,
  dueOn: openSittingInput.shape.dueOn,
});

export const STANDINGS = ['expected', 'absent', 'excused', 'zero'] as const;

export const changeAttemptInput = z.object({
  sittingId: id,
  attemptId: z.uuid(),
  standing: z.enum(STANDINGS, 'Choose what holds for this student.').optional(),
  days: z.coerce
    .number('Type a whole number of days.')
    .int('Type a whole number of days.')
    .min(0, 'Type 0 or more days.')
    .max(365, 'Type at most 365 days.')
    .optional(),
});

export const startRedoInput = z.object({ sittingId: id, studentId: z.uuid() });

/** What becomes of predictions that were locked after the bench had begun, without a receipt. */
export const LATE_LOCK_CHOICES = ['count', 'leave out'] as const;

export const publishInput = z.object({
  sittingId: id,
  /** Students with unread sizes go out as "not read". */
  withoutUnread: z.preprocess((value) => value === true || value === 'on', z.boolean()),
  lateLocks: z.enum(LATE_LOCK_CHOICES, 'Choose whether late predictions count.').nullish(),
  /** The mark of the preview that this answers. */
  seen: z.string().regex(/^[0-9a-f]{64}$/, 'Look at what goes out first.'),
});
