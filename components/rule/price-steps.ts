import type { Length } from '@/lib/length';
import { type Points, priceCurve, type SizeRule } from '@/lib/scoring';

/** A stretch of deviations with one price, inclusive at both ends. */
export interface PriceStep {
  from: Length;
  to: Length;
  lose: Points;
}

export type Side = 'under' | 'over';

/** The steps of a rule's price from far under to far over, neighbours of one price joined. */
export function priceSteps(rule: SizeRule, margin: Length): PriceStep[] {
  const joined: PriceStep[] = [];
  for (const { from, to, lose } of priceCurve(rule, { margin })) {
    const last = joined.at(-1);
    if (last && last.lose === lose) last.to = to;
    else joined.push({ from, to, lose });
  }
  return joined;
}

/** What a deviation loses. */
export function priceAt(steps: readonly PriceStep[], deviation: Length): Points {
  return steps.find((step) => deviation <= step.to)?.lose ?? steps.at(-1)?.lose ?? 0;
}

export function dearest(steps: readonly PriceStep[]): Points {
  return steps.reduce((most, step) => Math.max(most, step.lose), 0);
}

export function sideOf(deviation: Length): Side {
  return deviation < 0 ? 'under' : 'over';
}

/** The tone of a price: 0 for nothing, then up to 1, 2 and 3 points, and 4 for more. */
export function rampOf(points: Points): 0 | 1 | 2 | 3 | 4 {
  if (points <= 0) return 0;
  if (points <= 100) return 1;
  if (points <= 200) return 2;
  return points <= 300 ? 3 : 4;
}
