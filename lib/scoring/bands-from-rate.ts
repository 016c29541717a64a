import type { Length } from '@/lib/length';
import type { Band, Points, SizeRule } from './types';

const MOST_BANDS = 20;

export interface Rate {
  /** The distance that costs nothing. */
  free: Length;
  /** Each step begun past it costs `lose` more. */
  step: Length;
  lose: Points;
  cap: Points | null;
}

/**
 * Bands that charge `lose` for every begun `step` past the `free` distance, both sides alike. With a cap the bands end
 * at the last step before the cap is reached, and everything beyond loses the cap. Lengths in whole ticks, points in
 * whole hundredths; exact.
 *
 * @throws RangeError when free is negative, step or lose is not positive, or more than 20 bands a side would be needed,
 * as without a cap to end at.
 * @example bandsFromRate({ free: 10, step: 5, lose: 100, cap: 300 }).over // within 10, 15, 20: 0, 100, 200; beyond 300
 */
export function bandsFromRate({ free, step, lose, cap }: Rate): SizeRule {
  if (free < 0 || step <= 0 || lose <= 0) throw new RangeError('a rate has a step and a loss above 0');
  const bandCount = cap === null ? Number.POSITIVE_INFINITY : Math.max(1, Math.ceil(cap / lose));
  if (cap === null || bandCount > MOST_BANDS) {
    throw new RangeError(
      `this rate needs more than ${MOST_BANDS} bands a side: cap the dimension or widen the step`,
    );
  }
  const bands = (): Band[] =>
    Array.from({ length: bandCount }, (_, index) => ({ within: free + index * step, lose: index * lose }));
  return { over: bands(), under: bands(), beyondOver: cap, beyondUnder: cap, cap };
}
