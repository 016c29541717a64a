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
  // The score as a fraction. Without `outOf` total / possible is 1: cancelled, the products stay below 2^53.
  const own = policy.outOf === null;
  const above = (own ? raw + given.bonus : raw * total + given.bonus * possible) * kept;
  const below = own ? 100 : possible * 100;
  // Past the limit, by itself or by rounding, the greatest multiple not above the limit counts.
  const steps = Math.min(
    divideHalfUp(above, below * policy.roundTo),
    divideDown(total * policy.ceiling, 100 * policy.roundTo),
  );
  return { raw, total, provisional: steps * policy.roundTo };
}
