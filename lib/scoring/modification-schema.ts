import { z } from 'zod';
import { excusedAxes, isSameLabel, type Modification } from './modification';
import { checkSchema, idSchema } from './schemas';
import { AXES } from './types';

const points = checkSchema.shape.levels.element.shape.lose;

/** Up to here twice 10 m times a numerator is exact in a number. */
const LARGEST_PART = 10_000;
const WIDEST = 10;

const part = z.int('a factor is a fraction of whole numbers').min(1).max(LARGEST_PART);

export const widenSchema = z
  .strictObject({ num: part, den: part })
  .refine(({ num, den }) => num >= den, { path: ['num'], message: 'bands are never made narrower' })
  .refine(({ num, den }) => num <= WIDEST * den, {
    path: ['num'],
    message: `bands are at most ${WIDEST} times as wide`,
  });

const axisSchema = z.enum(AXES);

const excusedSchema = z
  .strictObject({ lineId: idSchema.nullable(), axis: axisSchema.nullable() })
  .refine(({ lineId, axis }) => lineId !== null || axis !== null, 'not everything can be excused');

const pricesSchema = z
  .array(points)
  .min(1, 'a check has at least one level')
  .max(10, 'a check has at most 10 levels')
  .refine((lose) => lose[0] === undefined || lose[0] === 0, 'the first level loses 0');

const otherCheckSchema = z.strictObject({
  label: z
    .string()
    .trim()
    .min(1, 'a check is named by its label')
    .max(200, 'a label is at most 200 characters'),
  lose: pricesSchema.nullable(),
});

/** Refuses every modification that could not price an attempt: see each message. Unknown keys are refused. */
export const modificationSchema: z.ZodType<Modification> = z.strictObject({
  format: z.literal(1),
  widen: widenSchema,
  excused: z
    .array(excusedSchema)
    .max(603, 'three axes of 200 lines can be excused, and three of all')
    .refine(
      (excused) => excusedAxes('', { excused: excused.filter(({ lineId }) => lineId === null) }).length < 3,
      'not everything can be excused',
    ),
  checks: z
    .array(otherCheckSchema)
    .max(100, 'at most 100 checks can have other prices')
    .refine(
      (checks) =>
        checks.every(
          ({ label }, index) => checks.findIndex((other) => isSameLabel(other.label, label)) === index,
        ),
      'a check is named twice',
    ),
});

/** Whether anything at all is priced otherwise by it. */
export function modifiesNothing({ widen, excused, checks }: Modification): boolean {
  return widen.num === widen.den && excused.length === 0 && checks.length === 0;
}
