import { type Length, MAX_LENGTH } from '@/lib/length';
import type { Band, Points, SizeRule } from './types';
import { divideUp } from './whole-division';

const MOST_BANDS = 20;

export interface Rate {
  /** The distance that costs nothing. */
  free: Length;
  /** Each step begun past it costs `lose` more. */
  step: Length;
  lose: Points;
  /** The most the dimension can lose. Without it the price never ends, which no list of bands can say. */
  cap: Points | null;
}

/**
 * Bands that charge `lose` for every begun `step` past the `free` distance, both sides alike. They end at the last
 * step before the cap is reached, and everything beyond loses the cap. Lengths in whole ticks, points in whole
 * hundredths; exact.
 *
 * @throws RangeError when an amount is not whole, free or cap is negative, step or lose is not above 0, a band would
 * reach past 10 m, or more than 20 bands a side would be needed, as they are without a cap.
 * @example bandsFromRate({ free: 10, step: 5, lose: 100, cap: 300 }).over.length // 3: within 10, 15 and 20
 */
export function bandsFromRate({ free, step, lose, cap }: Rate): SizeRule {
  if (![free, step, lose, cap ?? 0].every(Number.isSafeInteger))
    throw new RangeError('a rate is in whole ticks and hundredths');
  if (free < 0 || step <= 0 || lose <= 0 || (cap !== null && cap < 0))
    throw new RangeError('a rate has a step and a loss above 0, and nothing below it');
  const count = cap === null ? Number.POSITIVE_INFINITY : Math.max(1, divideUp(cap, lose));
  if (cap === null || count > MOST_BANDS)
    throw new RangeError(
      `this rate needs more than ${MOST_BANDS} bands a side: give it a lower cap or a greater loss a step`,
    );
  if (free + (count - 1) * step > MAX_LENGTH) throw new RangeError('the last band would reach past 10 m');
  const bands = (): Band[] =>
    Array.from({ length: count }, (_, index) => ({ within: free + index * step, lose: index * lose }));
  return { over: bands(), under: bands(), beyondOver: cap, beyondUnder: cap, cap };
}
