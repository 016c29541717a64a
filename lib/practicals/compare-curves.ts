import { type Length, MAX_LENGTH } from '@/lib/length';
import { type Points, priceCurve, type SizeRule } from '@/lib/scoring';

/** One size's price under one rubric. */
export interface PricedSize {
  rule: SizeRule;
  margin: Length;
}

/** A stretch of deviations, inclusive, on which the prices are not all alike; `lose` in the order compared. */
export interface DifferingSpan {
  from: Length;
  to: Length;
  lose: Points[];
}

/**
 * Exactly where several prices of one size part: whole signed ticks, inclusive at both ends, ascending, within
 * ± 10 m. Neighbouring stretches are joined when every price is the same on both. Empty when the prices agree on
 * every deviation. Pure; never fails.
 *
 * @example differingSpans([{ rule, margin: 0 }, { rule, margin: 0 }]) // []
 */
export function differingSpans(prices: readonly PricedSize[]): DifferingSpan[] {
  const curves = prices.map(({ rule, margin }) => priceCurve(rule, { margin }));
  const starts = new Set([-MAX_LENGTH]);
  for (const curve of curves) {
    for (const { from } of curve) if (from > -MAX_LENGTH && from <= MAX_LENGTH) starts.add(from);
  }
  const sorted = [...starts].sort((a, b) => a - b);
  const spans: DifferingSpan[] = [];
  sorted.forEach((from, index) => {
    const lose = curves.map((curve) => curve.find(({ to }) => from <= to)?.lose ?? 0);
    if (new Set(lose).size < 2) return;
    const to = (sorted[index + 1] ?? MAX_LENGTH + 1) - 1;
    const last = spans.at(-1);
    if (last && last.to === from - 1 && last.lose.join() === lose.join()) last.to = to;
    else spans.push({ from, to, lose });
  });
  return spans;
}
