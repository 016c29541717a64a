import { AXES } from '@/lib/scoring';
import type { DraftLine } from './draft';
import { readQuantity } from './field-reader';

export interface LineCount {
  lines: number;
  pieces: number;
  sizes: number;
  /** Lines whose number of pieces cannot be read; the sums are without them. */
  unread: number;
}

/**
 * How many pieces a cut list asks for as typed, and how many sizes one attempt then has. Pure.
 *
 * @example countLines([{ ...line, quantity: '2' }]) // { lines: 1, pieces: 2, sizes: 6, unread: 0 }
 */
export function countLines(lines: readonly DraftLine[]): LineCount {
  const read = lines.map(({ quantity }) => readQuantity(quantity));
  const pieces = read.reduce((sum: number, quantity) => sum + (quantity ?? 0), 0);
  return {
    lines: lines.length,
    pieces,
    sizes: pieces * AXES.length,
    unread: read.filter((quantity) => quantity === null).length,
  };
}
