import { chanceOfBoth, chanceOfTruth, type ReadProcess } from './joint-normal';

/** The limits of what is accepted, either of them left out. All lengths in one unit, whichever it is. */
export interface Limits {
  lower?: number;
  upper?: number;
}

/**
 * The probability that what was read truly lies within the limits, when the truth is spread normally about the reading
 * with the standard uncertainty u and nothing else is known of it. One limit or two; exact to the last digits of the
 * normal distribution.
 *
 * Source: JCGM 106:2012 (Evaluation of measurement data: the role of measurement uncertainty in conformity assessment),
 * 7.2 for one limit and 7.3 for two.
 * @throws RangeError when u is not above 0, or the limits are in the wrong order.
 * @example conformanceProbability({ reading: -5.47, u: 0.05 }, { upper: -5.4 }) // 0.9192433407662289
 */
export function conformanceProbability(
  { reading, u }: { reading: number; u: number },
  { lower = Number.NEGATIVE_INFINITY, upper = Number.POSITIVE_INFINITY }: Limits,
): number {
  requirePositive(u);
  if (lower > upper) throw new RangeError('the lower limit is above the upper');
  return chanceOfTruth({ mean: reading, sd: u, u }, { from: lower, to: upper });
}

/**
 * Both errors of judging by a reading, before anything is read: `consumer`, the chance that a part is made outside the
 * limits and accepted, and `producer`, that it is made within them and refused. Parts are spread normally about `mean` with
 * the process's spread `sd`, readings about the truth with u; accepted is what reads within the limits drawn in by the
 * guard `w` (0: the limits themselves). By quadrature, to better than 1e-12.
 *
 * Source: JCGM 106:2012, 9.5 (global risk).
 * @throws RangeError when sd or u is not above 0.
 * @example
 * globalRisks({ mean: 0, sd: 0.3, u: 0.0115 }, { lower: -0.5, upper: 0.5 }, 0).consumer // 0.00292 of all parts
 */
export function globalRisks(
  process: ReadProcess,
  { lower, upper }: Required<Limits>,
  w: number,
): { consumer: number; producer: number } {
  requirePositive(process.sd);
  requirePositive(process.u);
  const below = { from: Number.NEGATIVE_INFINITY, to: lower };
  const above = { from: upper, to: Number.POSITIVE_INFINITY };
  const within = { from: lower, to: upper };
  const accepted = { from: lower + w, to: upper - w };
  return {
    consumer: chanceOfBoth(process, below, accepted) + chanceOfBoth(process, above, accepted),
    producer:
      chanceOfBoth(process, within, { from: Number.NEGATIVE_INFINITY, to: accepted.from }) +
      chanceOfBoth(process, within, { from: accepted.to, to: Number.POSITIVE_INFINITY }),
  };
}

/** One band on one side: the truth lies further off than `inner` and no further than `outer`; past `edge` it costs more. */
export interface ReadBand {
  inner: number;
  outer: number;
  edge: number;
}

/**
 * The chance that a part truly within a band reads past the edge where the next price begins, and so is priced too dear
 * because of the instrument alone. True deviations are spread normally about the target with the spread `sd` of the work,
 * readings about the truth with the standard uncertainty u of the instrument; the edge is the band's own with its
 * reading margin. By quadrature, to better than 1e-12; null where the work so rarely gets so far that a JS number knows
 * no chance of it.
 *
 * Source: JCGM 106:2012, 9.5: the producer's risk of that band, given that the part is in it.
 * @throws RangeError when sd or u is not above 0, or inner is not below outer.
 * @example
 * chancePricedNext({ sd: 0.3, u: 0.1146 }, { inner: 0, outer: 0.79375, edge: 0.84455 }) // 0.0037: 4 in 1000
 */
export function chancePricedNext(
  { sd, u }: { sd: number; u: number },
  { inner, outer, edge }: ReadBand,
): number | null {
  requirePositive(sd);
  requirePositive(u);
  if (inner >= outer) throw new RangeError('a band reaches further than where it begins');
  const process = { mean: 0, sd, u };
  const truth = { from: inner, to: outer };
  const inBand = chanceOfTruth(process, truth);
  if (inBand === 0) return null;
  return Math.min(1, chanceOfBoth(process, truth, { from: edge, to: Number.POSITIVE_INFINITY }) / inBand);
}

function requirePositive(spread: number): void {
  if (!(spread > 0)) throw new RangeError('a spread is above 0');
}
