import { deviationInWords, lengthInWords } from '@/components/ui/length-in-words';
import { pointsAsText } from '@/components/ui/points-text';
import type { Length, Unit } from '@/lib/length';
import type { Points, SizeRule } from '@/lib/scoring';
import { type PriceStep, priceAt, type Side } from './price-steps';

interface SummaryInput {
  unit: Unit;
  target: Length;
  rule: SizeRule;
  steps: readonly PriceStep[];
  pointers?: readonly { kind: 'bench' | 'own'; ticks: Length }[];
  label?: string;
}

function capped(points: Points, cap: Points | null): Points {
  return cap === null ? points : Math.min(points, cap);
}

function sideInWords(rule: SizeRule, side: Side, unit: Unit): string {
  const [bands, beyond] = side === 'under' ? [rule.under, rule.beyondUnder] : [rule.over, rule.beyondOver];
  const parts = bands.map(
    (band) => `within ${lengthInWords(band.within, unit)} loses ${pointsAsText(capped(band.lose, rule.cap))}`,
  );
  return [...parts, `beyond loses ${pointsAsText(capped(beyond, rule.cap))}`].join(', ');
}

/** What a rule face shows, in words. Sides that cost the same are told once. */
export function ruleSummary({ unit, target, rule, steps, pointers = [], label }: SummaryInput): string {
  const under = sideInWords(rule, 'under', unit);
  const over = sideInWords(rule, 'over', unit);
  const readings = pointers.map((pointer) => {
    const deviation = pointer.ticks - target;
    const whose = pointer.kind === 'bench' ? 'Bench reading' : 'Own reading';
    return `${whose} ${deviationInWords(deviation, unit)}, loses ${pointsAsText(priceAt(steps, deviation))}.`;
  });
  return [
    `${label ? `${label}: t` : 'T'}arget ${lengthInWords(target, unit)}.`,
    under === over ? `Over or under: ${over}.` : `Under: ${under}. Over: ${over}.`,
    ...readings,
  ].join(' ');
}
