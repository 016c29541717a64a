import type { GradebookView } from '@/lib/contracts/gradebook';

export interface Spread {
  median: number;
  low: number;
  high: number;
}

/** The middle value and the bounds of the middle half, by nearest rank; null for none. */
export function spreadOf(values: readonly number[]): Spread | null {
  if (values.length === 0) return null;
  const sorted = [...values].sort((a, b) => a - b);
  const rank = (share: number) => sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)] ?? 0;
  return { median: rank(0.5), low: rank(0.25), high: rank(0.75) };
}

/** Bonus points go past the hundred. */
export const SCALE_END = 105;

/** A common lower end for the histograms: a multiple of ten below all but the lowest tenth, at most 70. */
export function scaleFrom(values: readonly number[]): number {
  if (values.length === 0) return 60;
  const sorted = [...values].sort((a, b) => a - b);
  const low = sorted[Math.floor(sorted.length / 10)] ?? 60;
  return Math.max(0, Math.min(70, Math.floor((low - 1) / 10) * 10));
}

/** At least this much loss fills half a strip, so that a good class does not look like a bad one. */
const LEAST_FULL = 600;

/** The points that fill half a strip: the dearest of all cells but the very dearest, which are cut off there. */
export function fullStrip({ students }: GradebookView): number {
  const losses = students
    .flatMap(({ cells }) => cells.flatMap((cell) => (cell ? [cell.lost.under, cell.lost.over] : [])))
    .sort((a, b) => a - b);
  return Math.max(LEAST_FULL, losses[Math.ceil(losses.length * 0.97) - 1] ?? 0);
}
