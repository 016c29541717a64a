import type { Length } from '@/lib/length';
import type { Band, Points, SizeRule } from '@/lib/scoring';

function side(bands: Band[], beyond: Points, margin: Length, cap: Points | null) {
  let from = 1;
  const steps = [] as { from: number; to: number; lose: number }[];
  for (const b of bands) {
    const to = b.within + margin;
    if (to >= from) steps.push({ from, to, lose: Math.min(b.lose, cap ?? Infinity) });
    from = Math.max(from, to + 1);
  }
  steps.push({ from, to: Infinity, lose: Math.min(beyond, cap ?? Infinity) });
  return steps;
}
export function priceCurve(rule: SizeRule, { margin }: { margin: Length }) {
  const under = side(rule.under, rule.beyondUnder, margin, rule.cap)
    .map((s) => ({ from: -s.to, to: -s.from, lose: s.lose }))
    .reverse();
  return [...under, { from: 0, to: 0, lose: 0 }, ...side(rule.over, rule.beyondOver, margin, rule.cap)];
}
