import { z } from 'zod';
import { readPoints } from '@/lib/practicals/field-reader';
import { AXES, type Axis } from '@/lib/scoring';
import type { Modification } from '@/lib/scoring/modification';
import { parseFactor } from '@/lib/scoring/modification-factor';
import { modificationSchema } from '@/lib/scoring/modification-schema';

const sectionId = z.uuid('This address is not complete.');
const studentId = z.uuid('Choose a student.');
const accommodationId = z.uuid('This is not a modified rubric.');
const MOST_REASON = 2000;

const reason = z
  .string('Type the reason.')
  .trim()
  .min(1, 'Type the reason.')
  .max(MOST_REASON, `Use at most ${MOST_REASON} characters.`);

export const sectionAccommodationsInput = z.strictObject({ sectionId });

export const departmentAccommodationsInput = z.strictObject({});

/** `change`: the one that is to be replaced, with its student. */
export const accommodationDeskInput = z.strictObject({
  sectionId,
  studentId: z.uuid().nullable().catch(null),
  change: z.uuid().nullable().catch(null),
});

/** `sittingId` null: for the term. `replaces`: the one that stands and is ended by this one. */
export const makeAccommodationInput = z.strictObject({
  sectionId,
  studentId,
  sittingId: z.uuid().nullable(),
  replaces: accommodationId.nullable(),
  modification: modificationSchema,
  reason,
});

export const endAccommodationInput = z.strictObject({ accommodationId });

export const readReasonInput = z.strictObject({ accommodationId });

/** How a line and an axis are named by a box of the form; `*` for every line or axis. */
export function excusedKey(lineId: string | null, axis: Axis | null): string {
  return `${lineId ?? '*'}/${axis ?? '*'}`;
}

const excusedBox = z.string().transform((key, context): Modification['excused'][number] => {
  const [line = '', name = ''] = key.split('/');
  const axis = AXES.find((each) => each === name) ?? null;
  if (line === '*' && axis === null)
    context.addIssue({ code: 'custom', message: 'This is no line and no axis.' });
  return { lineId: line === '*' ? null : line, axis };
});

const typedCheck = z.object({
  label: z.string(),
  as: z.enum(['rubric', 'not held', 'priced']).default('rubric'),
  /** A price for each level but the first, which loses nothing. */
  lose: z.array(z.string().default('')).default([]),
});

/** What stands in the form, as typed. */
export type TypedModification = {
  widen: string;
  excused: string[];
  checks: { label: string; as: 'rubric' | 'not held' | 'priced'; lose: string[] }[];
};

const typedModification = {
  widen: z.string().default('1'),
  excused: z.array(excusedBox).default([]),
  checks: z.array(typedCheck).default([]),
};

type Typed = z.output<z.ZodObject<typeof typedModification>>;

/** A typed modification as it prices; what cannot be read is told at its field. */
function readModification({ widen, excused, checks }: Typed, context: z.RefinementCtx): Modification {
  const refuse = (path: (string | number)[], message: string) =>
    context.addIssue({ code: 'custom', path, message });
  const factor = parseFactor(widen.trim() === '' ? '1' : widen);
  if (!factor.ok) refuse(['widen'], factor.reason);
  const priced = checks.flatMap(({ label, as, lose }, check): Modification['checks'] => {
    if (as === 'rubric') return [];
    if (as === 'not held') return [{ label, lose: null }];
    const prices = lose.map((text, level) => {
      const points = readPoints(text);
      if (points === null) refuse(['checks', check, 'lose', level], 'Type points, such as 1 or 0.5.');
      else if (points > 100_000) refuse(['checks', check, 'lose', level], 'This is more than 1000 points.');
      return points ?? 0;
    });
    return [{ label, lose: [0, ...prices] }];
  });
  return { format: 1, widen: factor.ok ? factor.widen : { num: 1, den: 1 }, excused, checks: priced };
}

/** The modification that stands in the form, for what it does to be shown at once. */
export const modificationForm = z.object(typedModification).transform(readModification);

const orNothing = z.preprocess((value) => value || null, z.uuid().nullable());

/** The form of a modified rubric, read into what the verb takes. */
export const accommodationForm = z
  .object({
    sectionId,
    studentId,
    sittingId: orNothing,
    replaces: orNothing,
    ...typedModification,
    reason,
  })
  .transform(({ widen, excused, checks, ...rest }, context) => ({
    ...rest,
    modification: readModification({ widen, excused, checks }, context),
  }));

/** A modification as it would be typed, for a form that changes it. */
export function asTypedChecks(checks: Modification['checks']): TypedModification['checks'] {
  return checks.map(({ label, lose }) => ({
    label,
    as: lose === null ? 'not held' : 'priced',
    lose: (lose ?? []).slice(1).map((points) => String(points / 100)),
  }));
}
