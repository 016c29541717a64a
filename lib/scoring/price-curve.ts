import { type Length, MAX_LENGTH } from '@/lib/length';
import type { Band, Points, SizeRule } from './types';

/** One tread of the step function: every deviation from `from` to `to`, both included, loses `lose`. */
export interface PriceStep {
  from: Length;
  to: Length;
  band: number | 'beyond';
  lose: Points;
}

/**
 * The price of one dimension as a step function of its signed deviation, from 10 m under to 10 m over without a gap.
 * Whole ticks, both ends inclusive, margin counted in, points after the cap; band 0 of both sides, and with it a
 * deviation of 0, is one step. The rule is already parsed (`sizeRuleSchema`), margin >= 0; nothing is rounded.
 *
 * @example priceCurve(rule, { margin: 0 }).find((step) => step.from <= 0 && step.to >= 0)?.lose // 0
 */
export function priceCurve(rule: SizeRule, { margin }: { margin: Length }): PriceStep[] {
  const cap = rule.cap ?? Number.POSITIVE_INFINITY;
  const [freeOver, ...over] = climb(rule.over, rule.beyondOver, margin, cap);
  const [freeUnder, ...under] = climb(rule.under, rule.beyondUnder, margin, cap);
  const free: PriceStep = { from: 0 - (freeUnder?.to ?? 0), to: freeOver?.to ?? 0, band: 0, lose: 0 };
  const mirrored = under.map((step) => ({ ...step, from: -step.to, to: -step.from })).reverse();
  return [...mirrored, free, ...over];
}

/** The steps of one side by distance; the first is always band 0 and begins at 0. */
function climb(bands: readonly Band[], beyond: Points, margin: Length, cap: number): PriceStep[] {
  const steps: PriceStep[] = [];
  let from = 0;
  bands.forEach(({ within, lose }, band) => {
    const to = Math.min(within + margin, MAX_LENGTH);
    if (to < from) return;
    steps.push({ from, to, band, lose: Math.min(lose, cap) });
    from = to + 1;
  });
  if (from <= MAX_LENGTH) steps.push({ from, to: MAX_LENGTH, band: 'beyond', lose: Math.min(beyond, cap) });
  return steps;
}
