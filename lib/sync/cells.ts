import { z } from 'zod';
import { MAX_LENGTH } from '@/lib/length';
import { AXES, type Rubric } from '@/lib/scoring';

/**
 * A cell is one thing that can be recorded of an attempt. `what` names it:
 * an axis or a check id of a piece, `piece` for the piece's state; with line '' and ordinal 0 a work check,
 * or one of the attempt's own cells, whose names begin with `@` so that no check can be called the same.
 */
export interface Cell {
  lineId: string;
  ordinal: number;
  what: string;
}

export const ATTEMPT_CELLS = [
  '@standing',
  '@finish',
  '@lock',
  '@receipt',
  '@days-late',
  /** What closed jaws showed while this attempt was in hand: every check stands beside the others. */
  '@zero',
] as const;

export const SIDES = ['bench', 'own'] as const;

export type Side = (typeof SIDES)[number];

const id = z.string().regex(/^[a-z0-9][a-z0-9_-]{0,63}$/, 'An id has small letters, digits, - and _.');

export const cellSchema = z.strictObject({
  lineId: z.union([id, z.literal('')]),
  ordinal: z.int().min(0).max(200),
  what: z.union([id, z.enum(ATTEMPT_CELLS)]),
});

/** Text that PostgreSQL can keep: no control characters and no half of a surrogate pair. */
export const shortText = (most: number) =>
  z
    .string()
    .max(most)
    .regex(/^[^\p{Cc}\p{Cs}]*$/u, 'This text has characters that cannot be kept.');

/** What a cell can hold. `cleared` takes a value back: the cell is unread again. */
export const cellValueSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('value'), ticks: z.int().positive().max(MAX_LENGTH) }),
  z.strictObject({ kind: z.literal('gauged') }),
  z.strictObject({ kind: z.literal('spoiled') }),
  z.strictObject({ kind: z.literal('excused') }),
  z.strictObject({ kind: z.literal('unreadable') }),
  z.strictObject({ kind: z.literal('cleared') }),
  z.strictObject({
    kind: z.literal('state'),
    state: z.enum(['present', 'missing', 'held', 'excused']),
    note: shortText(120).optional(),
  }),
  z.strictObject({ kind: z.literal('level'), level: z.int().min(0).max(9) }),
  z.strictObject({
    kind: z.literal('standing'),
    standing: z.enum(['expected', 'absent', 'excused', 'zero']),
  }),
  z.strictObject({ kind: z.literal('finish'), done: z.boolean() }),
  z.strictObject({ kind: z.literal('lock'), locked: z.boolean(), receipt: shortText(40) }),
  z.strictObject({ kind: z.literal('receipt'), receipt: shortText(40) }),
  z.strictObject({ kind: z.literal('days-late'), days: z.int().min(0).max(365) }),
  z.strictObject({ kind: z.literal('zero'), ticks: z.int().min(-MAX_LENGTH).max(MAX_LENGTH) }),
]);

export type CellValue = z.infer<typeof cellValueSchema>;

/** Whether a rubric has the cell; an attempt's own cells are there under every rubric. */
export function hasCell({ lines, workChecks }: Rubric, { lineId, ordinal, what }: Cell): boolean {
  if (what.startsWith('@')) return true;
  if (lineId === '') return ordinal === 0 && workChecks.some(({ id }) => id === what);
  const line = lines.find(({ id }) => id === lineId);
  if (!line || ordinal < 1 || ordinal > line.quantity) return false;
  return what === 'piece' || AXES.some((axis) => axis === what) || line.checks.some(({ id }) => id === what);
}

/** One text for one cell, to use as a key. */
export function cellKey(cell: Cell): string {
  return `${cell.lineId}/${cell.ordinal}/${cell.what}`;
}

/** Equal for equal values, whatever the order of their keys. */
export function valueKey(value: CellValue): string {
  return JSON.stringify(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)));
}
