/**
 * The standard uncertainty of a reading that is only told to the nearest graduation: graduation / √12, as the truth lies
 * anywhere within half a graduation of it. In the unit of the graduation.
 *
 * Source: GUM (JCGM 100:2008), 4.3.7 and F.2.2.1.
 * @throws RangeError for a graduation below 0 or not finite.
 * @example uncertaintyOfGraduation(12) // 3.464101615137755
 */
export function uncertaintyOfGraduation(graduation: number): number {
  return spreadOf(graduation, 12);
}

/**
 * The standard uncertainty of an instrument of which nothing is known but that it errs by no more than ± `limit`:
 * limit / √3. In the unit of the limit.
 *
 * Source: GUM (JCGM 100:2008), 4.3.7.
 * @throws RangeError for a limit below 0 or not finite.
 * @example uncertaintyOfLimits(3) // 1.7320508075688774
 */
export function uncertaintyOfLimits(limit: number): number {
  return spreadOf(limit, 3);
}

function spreadOf(width: number, divisor: number): number {
  if (!Number.isFinite(width) || width < 0) throw new RangeError('a graduation or limit is 0 or more');
  return width / Math.sqrt(divisor);
}

/**
 * The combined standard uncertainty of parts that have nothing to do with each other: the root of the sum of their
 * squares; 0 for none. All in one unit.
 *
 * Source: GUM (JCGM 100:2008), 5.1.2, with every sensitivity 1.
 * @example combineUncertainties([3, 4]) // 5
 */
export function combineUncertainties(parts: readonly number[]): number {
  return Math.hypot(...parts);
}
