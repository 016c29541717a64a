import type { RedoPolicy } from './rubric-form';
import type { Points } from './types';
import { divideDown, divideHalfUp } from './whole-division';

export interface AttemptScore {
  score: Points | null;
  total: Points;
}

/**
 * One score out of the attempts at a sitting, oldest first. Attempts without a score are skipped, whatever their
 * total; null when none is left. `higher` and `latest`: each after the first that counts is worth at most
 * `capPercent` of the total (rounded down), or as much as the first if that was more; then the highest or the last.
 * `average`: the mean, rounded half up to a multiple of `roundTo`. Whole hundredths, exact.
 *
 * @throws RangeError when the totals differ.
 * @example
 * combineAttempts({ kind: 'higher', capPercent: 90 }, [{ score: 7000, total: 10_000 }, { score: 9800, total: 10_000 }]) // 9000
 */
export function combineAttempts(policy: RedoPolicy, scores: readonly AttemptScore[]): Points | null {
  const counted = scores.flatMap(({ score, total }) => (score === null ? [] : [{ score, total }]));
  const [first] = counted;
  if (!first) return null;
  if (counted.some(({ total }) => total !== first.total))
    throw new RangeError('the attempts have different totals');
  if (policy.kind === 'average') {
    const sum = counted.reduce((all, { score }) => all + score, 0);
    return divideHalfUp(sum, policy.roundTo * counted.length) * policy.roundTo;
  }
  const most = Math.max(first.score, divideDown(first.total * policy.capPercent, 100));
  const capped = counted.map(({ score }, at) => (at === 0 ? score : Math.min(score, most)));
  return policy.kind === 'higher' ? Math.max(...capped) : (capped.at(-1) ?? null);
}
