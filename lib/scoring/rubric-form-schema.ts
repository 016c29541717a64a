import { z } from 'zod';
import { recordById } from './record-by-id-schema';
import { PRESET_IDS } from './rubric-form';
import { lineSchema, rubricSchema, sizeRuleSchema } from './schemas';

const { floor, roundTo, readTo, margin, grossLimit, ceiling, late, unit, basis, start, outOf, workChecks } =
  rubricSchema.shape;
const { worth, missing, checks, swap, set } = lineSchema.shape;
const points = worth;

export const cutListLineSchema = lineSchema.pick({ id: true, label: true, quantity: true, target: true });

/** Refuses what no rubric could price: no lines, too many pieces, an id twice, a size of 0. */
export const cutListSchema = z.strictObject({
  lines: z
    .array(cutListLineSchema)
    .min(1, 'a cut list has at least one line')
    .max(200, 'a cut list has at most 200 lines')
    .refine((lines) => new Set(lines.map(({ id }) => id)).size === lines.length, 'two lines have the same id')
    .refine(
      (lines) => lines.reduce((sum, { quantity }) => sum + quantity, 0) <= 400,
      'a cut list has at most 400 pieces in all',
    ),
});

const shareSchema = z
  .strictObject({ num: z.int().min(1, 'a share is more than none'), den: z.int().min(1).max(1_000_000) })
  .refine(({ num, den }) => num <= den, { path: ['num'], message: 'a share is at most the whole' });

export const redoPolicySchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.enum(['higher', 'latest']), capPercent: z.int().min(0).max(100) }),
  z.strictObject({ kind: z.literal('average'), roundTo }),
]);

export const predictionPolicySchema = z.strictObject({
  agreeWithin: margin,
  agreeShare: shareSchema,
  caughtShare: shareSchema,
  valueShare: shareSchema,
  full: points,
  closeWithin: points,
  close: points,
});

const sizesSchema = z.strictObject({
  thickness: sizeRuleSchema,
  width: sizeRuleSchema,
  length: sizeRuleSchema,
});

const lineDefaultsSchema = z.strictObject({
  worth,
  missing: missing.nullable(),
  sizes: sizesSchema,
  checks,
  swap,
  set,
});

const lineExceptionSchema = lineDefaultsSchema.extend({ sizes: sizesSchema.partial() }).partial();

/** The authored rubric as stored, exported and imported; its JSON is its wire form. */
export const rubricFormSchema = z
  .strictObject({
    format: z.literal(1),
    unit,
    basis,
    start,
    outOf,
    floor,
    roundTo,
    readTo,
    margin,
    grossLimit,
    ceiling,
    presets: z.array(z.enum(PRESET_IDS)),
    defaults: lineDefaultsSchema,
    exceptions: recordById(lineExceptionSchema),
    workChecks,
    policies: z.strictObject({ late, redo: redoPolicySchema, prediction: predictionPolicySchema }),
  })
  .refine((form) => (form.basis === 'start') === (form.start !== null), {
    path: ['start'],
    message: 'a starting score is given when the basis is start, and only then',
  });
