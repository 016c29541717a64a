import { z } from 'zod';
import { MAX_PRACTICAL_FILE_BYTES } from '@/lib/practicals/practical-file';

const practicalId = z.uuid('This is not a practical.');
const number = z.int('This is not a version.').min(1).max(1_000_000);

export const listVersionsInput = z.object({ practicalId });

/** By its practical and number, as it is linked to, or by its own id. */
export const readVersionSheetInput = z.union([
  z.object({ practicalId, number }),
  z.object({ versionId: z.uuid('This is not a version.') }),
]);

/** `version` null: the draft as it stands. */
export const exportPracticalInput = z.object({ practicalId, version: number.nullable() });

export const importPracticalInput = z.object({
  text: z
    .string('Choose a file, or paste what it says.')
    .min(1, 'Choose a file, or paste what it says.')
    .max(MAX_PRACTICAL_FILE_BYTES, 'A practical file has at most 1 MB. This one has more.'),
});

/** `revision`: the draft that is to give way, as it was looked at. */
export const takeBackVersionInput = z.object({ practicalId, number, revision: z.int().min(1) });
