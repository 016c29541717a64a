import type { RedoPolicy } from './rubric-form';
import type { Points } from './types';

export interface AttemptScore {
  score: Points | null;
  total: Points;
}

/**
 * One score out of the attempts at a sitting, oldest first. Attempts without a score are skipped; null when none is
 * left. `higher` and `latest`: each after the first that counts is worth at most `capPercent` of the total, or as much
 * as the first if that was more; then the highest or the last. `average`: the mean, rounded half up to `roundTo`.
 * Whole hundredths, exact.
 *
 * @throws RangeError when the totals differ.
 * @example combineAttempts({ kind: 'higher', capPercent: 90 }, [{ score: 7000, total: 10000 }, { score: 9800, total: 10000 }]) // 9000
 */
export function combineAttempts(policy: RedoPolicy, attempts: readonly AttemptScore[]): Points | null {
  const total = attempts[0]?.total ?? 0;
  if (attempts.some((attempt) => attempt.total !== total))
    throw new RangeError('the attempts have different totals');
  const scores = attempts.flatMap(({ score }) => (score === null ? [] : [score]));
  const [first] = scores;
  if (first === undefined) return null;
  if (policy.kind === 'average') return roundedMean(scores, policy.roundTo);
  const most = Math.max(first, Math.floor((total * policy.capPercent) / 100));
  const counted = scores.map((score, index) => (index === 0 ? score : Math.min(score, most)));
  return policy.kind === 'higher' ? Math.max(...counted) : (counted.at(-1) ?? null);
}

/** sum / count to a multiple of `step`, half up, in whole numbers. */
function roundedMean(scores: readonly Points[], step: Points): Points {
  const sum = scores.reduce((all, score) => all + score, 0);
  const unit = step * scores.length;
  return Math.floor((2 * sum + unit) / (2 * unit)) * step;
}
