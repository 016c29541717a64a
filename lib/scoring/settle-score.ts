import type { Points, Rubric } from './types';
import { divideDown, divideHalfUp, divideUp } from './whole-division';

/** What the pieces and work checks of one attempt came to. */
export interface Sums {
  possible: Points;
  lost: Points;
  /** Pieces that are not excused. */
  counted: number;
}

export interface Settled {
  raw: Points;
  total: Points;
  provisional: Points | null;
}

type Policy = Pick<Rubric, 'outOf' | 'floor' | 'roundTo' | 'late' | 'ceiling'>;

/** From losses to the score: floor, scale, bonus, lateness, ceiling, one rounding. */
export function settleScore(policy: Policy, sums: Sums, given: { bonus: Points; daysLate: number }): Settled {
  const { possible, lost } = sums;
  const raw = Math.max(divideUp(possible * policy.floor, 100), possible - lost);
  const total = policy.outOf ?? possible;
  if (sums.counted === 0 || possible === 0) return { raw, total, provisional: null };

  const late = policy.late === null ? 0 : Math.min(policy.late.max, policy.late.perDay * given.daysLate);
  const kept = 100 - late;
  // Score and limit as fractions. Without `outOf` total / possible is 1: cancelled, the products stay below 2^53.
  const below = policy.outOf === null ? 100 : possible * 100;
  const above =
    policy.outOf === null ? (raw + given.bonus) * kept : (raw * total + given.bonus * possible) * kept;
  const limit = { above: total * policy.ceiling, below: 100 };
  const overLimit = above > limit.above * (below / 100);
  const score = overLimit ? limit : { above, below };
  const steps = Math.min(
    divideHalfUp(score.above, score.below * policy.roundTo),
    divideDown(limit.above, limit.below * policy.roundTo),
  );
  return { raw, total, provisional: steps * policy.roundTo };
}
