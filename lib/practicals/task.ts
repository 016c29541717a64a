import { z } from 'zod';
import { MAX_LENGTH } from '@/lib/length';
import { AXES } from '@/lib/scoring';
import { cutListSchema } from '@/lib/scoring/rubric-form-schema';

const length = z.int().positive().max(MAX_LENGTH);

export const targetSchema = z.strictObject({ thickness: length, width: length, length });

/**
 * What a practical asks for, apart from its prices: it is stored with every published version, so that a sitting
 * shows what its students were given. Lengths are in ticks.
 */
export const taskSchema = z.strictObject({
  title: z.string().min(1).max(120),
  unit: z.enum(['in', 'mm']),
  instructions: z.string().max(4000),
  material: z.string().max(80),
  blank: targetSchema.nullable(),
  kerf: length.nullable(),
  cutList: cutListSchema,
  lineNotes: z.record(z.string(), z.string().max(200)),
});

export type Task = z.infer<typeof taskSchema>;

/** How many pieces, and how many sizes, one attempt has. */
export function countTask(task: Task): { pieces: number; sizes: number } {
  const pieces = task.cutList.lines.reduce((sum, line) => sum + line.quantity, 0);
  return { pieces, sizes: pieces * AXES.length };
}

/** How many sizes one attempt under a price list has. */
export function countSizes({ lines }: { lines: readonly { quantity: number }[] }): number {
  return lines.reduce((sum, { quantity }) => sum + quantity, 0) * AXES.length;
}

/** "side 2", or the bare label when the line is a single piece. */
export function pieceLabel(line: { label: string; quantity: number }, ordinal: number): string {
  return line.quantity > 1 ? `${line.label} ${ordinal}` : line.label;
}
