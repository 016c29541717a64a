import type { Points, Rubric } from '@/lib/scoring';
import { divideDown, divideUp } from '@/lib/scoring/whole-division';

export interface ScoreOfTotal {
  score: Points;
  total: Points;
}

/** What holding added, and which of the earlier scores gave it; 0 and null where none is better. */
export interface HeldScore {
  points: Points;
  from: number | null;
}

/**
 * Nobody drops: of a score and what the same work came to under earlier versions, the best by its share of the total
 * counts. An earlier one is brought to the new total and rounded up to a multiple of `roundTo`, but never above the
 * ceiling; of two that are equal the first stands. Hundredths, exact.
 *
 * @example
 * holdScore({ score: 9000, total: 10_000 }, [{ score: 42, total: 45 }], { roundTo: 100, ceiling: 102 }) // 400: 94 of 100
 */
export function holdScore(
  now: ScoreOfTotal,
  earlier: readonly ScoreOfTotal[],
  { roundTo, ceiling }: Pick<Rubric, 'roundTo' | 'ceiling'>,
): HeldScore {
  let best = now;
  let from: number | null = null;
  earlier.forEach((each, index) => {
    if (each.total > 0 && each.score * best.total > best.score * each.total) {
      best = each;
      from = index;
    }
  });
  const steps = Math.min(
    best.total === 0 ? 0 : divideUp(best.score * now.total, best.total * roundTo),
    divideDown(now.total * ceiling, 100 * roundTo),
  );
  const points = from === null ? 0 : Math.max(0, steps * roundTo - now.score);
  return points > 0 ? { points, from } : { points: 0, from: null };
}
