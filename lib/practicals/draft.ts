import { z } from 'zod';
import { AXES } from '@/lib/scoring';
import { PRESET_IDS } from '@/lib/scoring/rubric-form';

/** More than any field can use: what is too long is kept as typed and told at the field, up to here. */
export const MOST_TYPED = { cell: 400, title: 400, note: 1000, instructions: 20_000 };

/** A rubric has at most half as many; a draft keeps a list that is still to be shortened. */
export const MOST_DRAFT_LINES = 400;

const upTo = (most: number) => z.string().max(most, `This is longer than ${most} characters.`);

const typed = upTo(MOST_TYPED.cell);

const bandSchema = z.strictObject({ within: typed, lose: typed });

/** The bands of one side, nearest first; what the first one loses is always nothing. */
const sideSchema = z.strictObject({ bands: z.array(bandSchema).min(1).max(20), beyond: typed });

/** `mirrored`: the editor keeps both sides alike; what holds is what the sides say. */
const sizeRuleSchema = z.strictObject({
  mirrored: z.boolean(),
  over: sideSchema,
  under: sideSchema,
  cap: typed,
});

const checkSchema = z.strictObject({
  id: z.string().max(64),
  label: typed,
  levels: z
    .array(z.strictObject({ label: typed, lose: typed }))
    .min(1)
    .max(10),
  assume: z.int().nullable(),
});

const checksSchema = z.array(checkSchema).max(20);

const axesSchema = z.strictObject({ thickness: typed, width: typed, length: typed });

/** What a line has otherwise than all lines: an empty text or null means "as all". */
const lineSchema = z.strictObject({
  id: z.string().max(64),
  label: typed,
  quantity: typed,
  ...axesSchema.shape,
  note: upTo(MOST_TYPED.note),
  worth: typed,
  missing: typed,
  sizes: z.strictObject({
    thickness: sizeRuleSchema.nullable(),
    width: sizeRuleSchema.nullable(),
    length: sizeRuleSchema.nullable(),
  }),
  checks: checksSchema.nullable(),
  swap: z.boolean().nullable(),
  set: z.enum(['each', 'worst']).nullable(),
});

/** What a teacher is writing: every figure as it was typed, so that nothing is lost before it can be read. */
export const practicalDraftSchema = z.strictObject({
  format: z.literal(1),
  title: upTo(MOST_TYPED.title),
  unit: z.enum(['in', 'mm']),
  instructions: upTo(MOST_TYPED.instructions),
  material: typed,
  blank: axesSchema,
  kerf: typed,
  lines: z.array(lineSchema).max(MOST_DRAFT_LINES, `A draft keeps at most ${MOST_DRAFT_LINES} lines.`),
  all: z.strictObject({
    worth: typed,
    missing: typed,
    sizes: z.strictObject({ thickness: sizeRuleSchema, width: sizeRuleSchema, length: sizeRuleSchema }),
    checks: checksSchema,
    swap: z.boolean(),
    set: z.enum(['each', 'worst']),
  }),
  workChecks: checksSchema,
  total: z.strictObject({
    basis: z.enum(['worth', 'start']),
    start: typed,
    outOf: typed,
    roundTo: typed,
    floor: typed,
    ceiling: typed,
  }),
  reading: z.strictObject({ margin: typed, readTo: typed, grossLimit: typed }),
  late: z.strictObject({ perDay: typed, max: typed }),
  redo: z.strictObject({
    kind: z.enum(['higher', 'latest', 'average']),
    capPercent: typed,
    roundTo: typed,
  }),
  prediction: z.strictObject({
    agreeWithin: typed,
    agreeShare: typed,
    caughtShare: typed,
    valueShare: typed,
    full: typed,
    closeWithin: typed,
    close: typed,
  }),
  presets: z.array(z.enum(PRESET_IDS)).max(PRESET_IDS.length),
});

export type PracticalDraft = z.infer<typeof practicalDraftSchema>;
export type DraftLine = PracticalDraft['lines'][number];
export type DraftSizeRule = z.infer<typeof sizeRuleSchema>;
export type DraftSide = z.infer<typeof sideSchema>;
export type DraftCheck = z.infer<typeof checkSchema>;

/** The columns of a cut list in the order they stand, are typed and are pasted in. */
export const SHEET_COLUMNS = ['label', 'quantity', 'thickness', 'width', 'length', 'note'] as const;

export type SheetColumn = (typeof SHEET_COLUMNS)[number];

/** The first of `line-1`, `line-2` … (or another stem) that no line or check of the list is called. */
export function freshId(stem: string, taken: readonly { id: string }[]): string {
  const ids = new Set(taken.map(({ id }) => id));
  for (let number = 1; ; number++) {
    if (!ids.has(`${stem}-${number}`)) return `${stem}-${number}`;
  }
}

/** A line on which nothing is typed yet and everything is priced as all lines are. */
export function emptyLine(taken: readonly { id: string }[]): DraftLine {
  return {
    id: freshId('line', taken),
    label: '',
    quantity: '1',
    thickness: '',
    width: '',
    length: '',
    note: '',
    worth: '',
    missing: '',
    sizes: { thickness: null, width: null, length: null },
    checks: null,
    swap: null,
    set: null,
  };
}

/** Whether anything of the line is priced otherwise than all lines. */
export function isException(line: DraftLine): boolean {
  const { worth, missing, sizes, checks, swap, set } = line;
  const own =
    worth.trim() !== '' || missing.trim() !== '' || checks !== null || swap !== null || set !== null;
  return own || AXES.some((axis) => sizes[axis] !== null);
}
