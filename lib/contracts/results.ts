import { z } from 'zod';

const length = z.int();
const points = z.int();
const axis = z.enum(['thickness', 'width', 'length']);

const sizeSheetSchema = z.strictObject({
  reading: length.nullable(),
  used: length.nullable(),
  deviation: length.nullable(),
  band: z.union([z.int().min(0), z.enum(['beyond', 'gauged', 'spoiled', 'excused', 'unread'])]),
  lose: points,
});

const checkSheetSchema = z.strictObject({ id: z.string(), level: z.int().nullable(), lose: points });

/** A score sheet as it is stored beside an attempt and with a published result. */
export const scoreSheetSchema = z.strictObject({
  complete: z.boolean(),
  unread: z.array(z.strictObject({ lineId: z.string(), ordinal: z.int(), what: z.string() })),
  possible: points,
  lost: points,
  raw: points,
  total: points,
  provisional: points.nullable(),
  score: points.nullable(),
  pieces: z.array(
    z.strictObject({
      lineId: z.string(),
      ordinal: z.int(),
      state: z.enum(['present', 'missing', 'held', 'excused', 'unread']),
      gross: z.boolean(),
      swapped: z.boolean(),
      sizes: z.record(axis, sizeSheetSchema).nullable(),
      checks: z.array(checkSheetSchema),
      uncapped: points,
      lose: points,
    }),
  ),
  work: z.array(checkSheetSchema),
});

/** How well a student measured, as `judgePrediction` gives it. */
export const judgementSchema = z.strictObject({
  of: z.int(),
  agree: z.int(),
  offBand: z.int(),
  caught: z.int(),
  gap: points.nullable(),
  bonus: points,
  because: z.enum(['full', 'close', 'too-few-agree', 'too-few-caught', 'too-few-values', 'nothing-to-judge']),
});
