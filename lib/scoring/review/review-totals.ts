import type { Points, Rubric } from '../types';
import type { ReviewRule } from './finding';
import { mostOfPresent } from './most-lost';
import { sayLength, sayPoints } from './review-words';

export const findRoundingAndMargin: ReviewRule = (rubric) => {
  const { readTo, margin } = rubric;
  if (readTo === null || margin === 0) return [];
  const text =
    `Deviations are rounded to ${sayLength(readTo, rubric)} and have a reading margin of ${sayLength(margin, rubric)} ` +
    'besides, so the instrument is allowed for twice. Keep one of the two.';
  return [{ text }];
};

/** What each piece can lose at most, present or missing, the dearest first. */
function dearestFirst(rubric: Rubric): Points[] {
  return rubric.lines
    .flatMap((line) => Array<Points>(line.quantity).fill(Math.max(mostOfPresent(line, rubric), line.missing)))
    .sort((a, b) => b - a);
}

/** What the dearest half of the pieces can lose together. */
export function loseByDearestHalf(rubric: Rubric): { half: number; of: number; lost: Points } {
  const pieces = dearestFirst(rubric);
  const half = Math.ceil(pieces.length / 2);
  return { half, of: pieces.length, lost: pieces.slice(0, half).reduce((sum, lose) => sum + lose, 0) };
}

export const findShortStart: ReviewRule = (rubric) => {
  const { start } = rubric;
  if (rubric.basis !== 'start' || start === null) return [];
  const { half, of, lost } = loseByDearestHalf(rubric);
  if (lost <= start) return [];
  const text =
    `The score starts at ${sayPoints(start)}, but ${half} of ${of} pieces can lose ${sayPoints(lost)}: ` +
    'after that nothing more can be lost. Raise the starting score, or lower the prices.';
  return [{ text }];
};

export const findOffGrid: ReviewRule = (rubric) => {
  const { roundTo } = rubric;
  const worth = rubric.lines.reduce((sum, line) => sum + line.worth * line.quantity, 0);
  const possible = rubric.basis === 'start' ? (rubric.start ?? 0) : worth;
  const total = rubric.outOf ?? possible;
  const off = [total, possible].find((points) => points % roundTo !== 0);
  if (off === undefined) return [];
  const what = off === total ? 'The total' : 'What the pieces are worth together';
  const text =
    `${what}, ${sayPoints(off)}, is no multiple of the ${sayPoints(roundTo)} that scores are rounded to, so a perfect ` +
    'set may miss the full score. Change the worth or the total, or round finer.';
  return [{ text }];
};
