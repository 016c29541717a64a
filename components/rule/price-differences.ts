import type { Length } from '@/lib/length';
import { type PriceStep, priceAt } from './price-steps';

/** The stretches of deviation on which several price lists do not all agree, within ± reach. */
export function differingStretches(
  lists: readonly (readonly PriceStep[])[],
  reach: Length,
): { from: Length; to: Length }[] {
  const starts = new Set<Length>([-reach]);
  for (const steps of lists) {
    for (const step of steps) if (step.from > -reach && step.from <= reach) starts.add(step.from);
  }
  const sorted = [...starts].sort((a, b) => a - b);
  const stretches: { from: Length; to: Length }[] = [];
  sorted.forEach((from, index) => {
    const prices = new Set(lists.map((steps) => priceAt(steps, from)));
    if (prices.size < 2) return;
    const to = (sorted[index + 1] ?? reach + 1) - 1;
    const last = stretches.at(-1);
    if (last && last.to === from - 1) last.to = to;
    else stretches.push({ from, to });
  });
  return stretches;
}
