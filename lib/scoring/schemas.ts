import { z } from 'zod';
import { MAX_LENGTH } from '@/lib/length';
import { idSchema, recordById } from './record-by-id-schema';

export { idSchema };

const NOT_A_CHECK = ['thickness', 'width', 'length', 'piece', 'held'];
const MOST_POINTS = 100_000;
const MOST_TOTAL = 1_000_000;
const MOST_LINES = 200;
const MOST_PIECES = 400;
const ROUNDINGS = [100, 50, 10, 1];

/** A whole number between two bounds. Adding 0 turns a −0 that JSON can carry into 0. */
function whole(what: string, least: number, most: number) {
  return z
    .int(`${what} is a whole number`)
    .min(least, `${what} is at least ${least}`)
    .max(most, `${what} is at most ${most}`)
    .overwrite((value) => value + 0);
}

const tooLong = 'a length is at most 10 m';
const wholeLength = z
  .int('a length is a whole number of ticks')
  .max(MAX_LENGTH, tooLong)
  .overwrite((value) => value + 0);
const signedLength = wholeLength.min(-MAX_LENGTH, tooLong);
const distance = wholeLength.min(0, 'a distance is not negative');
const positiveLength = wholeLength.min(1, 'a length is more than 0');

const points = whole('an amount of points, in hundredths,', 0, MOST_POINTS);
const totalPoints = whole('a total, in hundredths of a point,', 0, MOST_TOTAL);
const percent = (what: string) => whole(what, 0, 100);

/** The first value that stands in the list twice. */
function findRepeated(values: readonly string[]): string | undefined {
  const seen = new Set<string>();
  return values.find((value) => seen.has(value) || !seen.add(value));
}

export const bandSchema = z.strictObject({ within: distance, lose: points });

type Band = z.infer<typeof bandSchema>;

/** The bands of one side, nearest first. */
const sideSchema = z
  .array(bandSchema)
  .min(1, 'a side has at least one band')
  .max(20, 'a side has at most 20 bands')
  .refine((bands) => bands[0] === undefined || bands[0].lose === 0, 'the first band loses 0')
  .refine(
    (bands) => ascends(bands, (before, band) => before.within < band.within),
    'each band reaches further than the one before it',
  )
  .refine(
    (bands) => ascends(bands, (before, band) => before.lose <= band.lose),
    'a band loses no less than the one before it',
  );

function ascends(bands: readonly Band[], holds: (before: Band, band: Band) => boolean): boolean {
  return bands.every((band, index) => {
    const before = bands[index - 1];
    return before === undefined || holds(before, band);
  });
}

function beyondIsDearest(bands: readonly Band[], beyond: number): boolean {
  return beyond >= (bands.at(-1)?.lose ?? 0);
}

export const sizeRuleSchema = z
  .strictObject({
    over: sideSchema,
    under: sideSchema,
    beyondOver: points,
    beyondUnder: points,
    cap: points.nullable(),
  })
  .refine((rule) => beyondIsDearest(rule.over, rule.beyondOver), {
    path: ['beyondOver'],
    message: 'past the last band a size loses no less than in it',
  })
  .refine((rule) => beyondIsDearest(rule.under, rule.beyondUnder), {
    path: ['beyondUnder'],
    message: 'past the last band a size loses no less than in it',
  });

export const checkSchema = z
  .strictObject({
    id: idSchema.refine(
      (id) => !NOT_A_CHECK.includes(id),
      'a check is not called thickness, width, length, piece or held',
    ),
    label: z.string(),
    levels: z
      .array(z.strictObject({ label: z.string(), lose: points }))
      .min(1, 'a check has at least one level')
      .max(10, 'a check has at most 10 levels')
      .refine((levels) => levels[0] === undefined || levels[0].lose === 0, 'the first level loses 0'),
    assume: whole('the assumed level', 0, 9).nullable(),
  })
  .refine(({ assume, levels }) => assume === null || levels[assume] !== undefined, {
    path: ['assume'],
    message: 'the assumed level is one of the levels',
  });

const checksSchema = z
  .array(checkSchema)
  .max(20, 'a list has at most 20 checks')
  .refine((checks) => findRepeated(checks.map(({ id }) => id)) === undefined, 'two checks have the same id');

export const lineSchema = z.strictObject({
  id: idSchema,
  label: z.string(),
  quantity: whole('the quantity', 1, 200),
  target: z.strictObject({ thickness: positiveLength, width: positiveLength, length: positiveLength }),
  worth: points,
  missing: points,
  sizes: z.strictObject({ thickness: sizeRuleSchema, width: sizeRuleSchema, length: sizeRuleSchema }),
  checks: checksSchema,
  swap: z.boolean(),
  set: z.enum(['each', 'worst']),
});

const lateSchema = z
  .strictObject({ perDay: percent('the percent a day'), max: percent('the greatest percent') })
  .refine(({ perDay, max }) => perDay <= max, {
    path: ['max'],
    message: 'the greatest percent is no less than the percent a day',
  });

/** Refuses every rubric that scoring could not price: see each message. Types as in `Rubric`. */
export const rubricSchema = z
  .strictObject({
    unit: z.enum(['in', 'mm']),
    basis: z.enum(['worth', 'start']),
    start: totalPoints.nullable(),
    outOf: totalPoints.nullable(),
    floor: percent('the floor, in percent,'),
    roundTo: z.number().refine((step) => ROUNDINGS.includes(step), 'round to 100, 50, 10 or 1 hundredths'),
    readTo: positiveLength.nullable(),
    margin: distance,
    grossLimit: distance.nullable(),
    lines: z
      .array(lineSchema)
      .min(1, 'a rubric has at least one line')
      .max(MOST_LINES, `a rubric has at most ${MOST_LINES} lines`)
      .refine((lines) => findRepeated(lines.map(({ id }) => id)) === undefined, 'two lines have the same id')
      .refine(
        (lines) => lines.reduce((sum, { quantity }) => sum + quantity, 0) <= MOST_PIECES,
        `a rubric has at most ${MOST_PIECES} pieces in all`,
      ),
    workChecks: checksSchema,
    late: lateSchema.nullable(),
    ceiling: whole('the ceiling, in percent,', 100, 200),
  })
  .refine(({ basis, start }) => (basis === 'start') === (start !== null), {
    path: ['start'],
    message: 'a starting score is given when the basis is start, and only then',
  });

const levelsSchema = recordById(whole('a level', 0, 9));

export const readingSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('value'), ticks: positiveLength }),
  z.strictObject({ kind: z.literal('gauged') }),
  z.strictObject({ kind: z.literal('spoiled') }),
  z.strictObject({ kind: z.literal('excused') }),
]);

export const pieceSchema = z.strictObject({
  lineId: idSchema,
  ordinal: whole('the number of a piece', 1, 200),
  state: z.enum(['present', 'missing', 'held', 'excused']),
  sizes: z.strictObject({ thickness: readingSchema, width: readingSchema, length: readingSchema }).partial(),
  checks: levelsSchema,
});

const adjustmentSchema = z
  .strictObject({ thickness: signedLength, width: signedLength, length: signedLength })
  .partial();

/** Refuses what no rubric could score; what one rubric does not know is refused when it is scored by it. */
export const attemptSchema = z.strictObject({
  pieces: z
    .array(pieceSchema)
    .max(MOST_PIECES, `an attempt has at most ${MOST_PIECES} pieces`)
    .refine(
      (pieces) => findRepeated(pieces.map(({ lineId, ordinal }) => `${lineId} ${ordinal}`)) === undefined,
      'a piece is recorded twice',
    ),
  work: levelsSchema,
  bonus: points,
  daysLate: whole('the number of days late', 0, Number.MAX_SAFE_INTEGER),
  adjust: recordById(adjustmentSchema).optional(),
});
