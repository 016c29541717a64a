import { z } from 'zod';
import { MAX_LENGTH } from '@/lib/length';
import { VARIANT_GRADUATIONS } from '@/lib/practicals/propose-variants-graduation';

const practicalId = z.uuid('This is not a practical.');
const size = z
  .int('Type a size.')
  .min(1, 'A size is more than nothing.')
  .max(MAX_LENGTH, 'This is over 10 m.');

export const listVariantsInput = z.strictObject({ practicalId });

export const proposeVariantsInput = z.strictObject({
  practicalId,
  count: z.coerce
    .number('Type how many.')
    .int('Type a whole number of variants.')
    .min(1, 'Ask for at least one.')
    .max(6, 'Ask for at most six at a time.'),
  graduation: z.enum(VARIANT_GRADUATIONS, 'Choose a graduation.').nullish(),
});

/** Widths and lengths in ticks, line by line; thicknesses are the version's. */
export const makeVariantsInput = z.strictObject({
  practicalId,
  /** The version that the sizes were proposed from. */
  versionId: z.uuid(),
  variants: z
    .array(
      z.strictObject({
        /** As it was proposed: "B". */
        letter: z.string().regex(/^[A-Z]{1,2}$/, 'A variant has a letter.'),
        lines: z
          .array(z.strictObject({ lineId: z.string().max(64), width: size, length: size }))
          .min(1)
          .max(200),
      }),
    )
    .min(1, 'Choose at least one variant.')
    .max(6, 'Make at most six at a time.'),
});

export const takePricesInput = z.strictObject({
  practicalId,
  revision: z.int().min(1),
  /** The version of the original whose prices were looked at. */
  versionId: z.uuid(),
});
