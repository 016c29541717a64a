import type { Length } from '@/lib/length';
import { AXES, type Axis, type Line, type Points, type SizeRule } from '@/lib/scoring';
import { differingSpans, type PricedSize } from './compare-curves';
import type { ComparedRow, ComparedSizes, Phrase } from './compare-types';
import { comparedRow, pointsValue } from './compare-values';

/** A line of the first rubric with the line of each rubric that asks for the same piece; the first's own comes first. */
export type MatchedLine = readonly [first: Line, ...others: Line[]];

/** All sizes of the cut list, gathered where every rubric prices them alike; in cut-list order. */
export function compareSizes(lines: readonly MatchedLine[], margins: readonly Length[]): ComparedSizes[] {
  const groups = new Map<string, { prices: PricedSize[]; sizes: ComparedSizes['sizes'] }>();
  for (const matched of lines) {
    for (const axis of AXES) {
      const prices = matched.map((line, index) => ({ rule: line.sizes[axis], margin: margins[index] ?? 0 }));
      const key = JSON.stringify(prices.map(({ rule }) => canonicalRule(rule)));
      const group = groups.get(key) ?? { prices, sizes: [] };
      const [{ id, label, target }] = matched;
      group.sizes.push({ lineId: id, label, axis, target: target[axis] });
      groups.set(key, group);
    }
  }
  return [...groups.values()].map(({ prices, sizes }) => ({
    name: nameSizes(sizes, lines.length),
    sizes,
    prices,
    spans: differingSpans(prices),
    rows: [...sideRows(prices, 'under'), ...sideRows(prices, 'over'), capRow(prices)],
  }));
}

function canonicalRule({ over, under, beyondOver, beyondUnder, cap }: SizeRule) {
  const side = (bands: SizeRule['over']) => bands.map(({ within, lose }) => [within, lose]);
  return [side(over), beyondOver, side(under), beyondUnder, cap];
}

/** "every size", "every length", "length of end and side", or a list of them. */
export function nameSizes(sizes: ComparedSizes['sizes'], lineCount: number): Phrase {
  if (sizes.length === lineCount * AXES.length) return ['every size'];
  const whole = AXES.filter((axis) => sizes.filter((size) => size.axis === axis).length === lineCount);
  const rest = sizes.filter(({ axis }) => !whole.includes(axis));
  const named = [...whole.map((axis) => `every ${axis}`), ...restByLine(rest)];
  return [joinWords(named)];
}

function restByLine(sizes: ComparedSizes['sizes']): string[] {
  const byLine = new Map<string, { label: string; axes: Axis[] }>();
  for (const { lineId, label, axis } of sizes) {
    const line = byLine.get(lineId) ?? { label, axes: [] };
    line.axes.push(axis);
    byLine.set(lineId, line);
  }
  const byAxes = new Map<string, string[]>();
  for (const { label, axes } of byLine.values()) {
    const words = axes.length === AXES.length ? 'all' : joinWords(axes);
    byAxes.set(words, [...(byAxes.get(words) ?? []), label]);
  }
  return [...byAxes].map(([words, labels]) => `${words} of ${joinWords(labels)}`);
}

export function joinWords(words: readonly string[]): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} and ${last}`;
}

/** A row for each stretch between two edges that any of the rubrics has on this side, and one past the last. */
function sideRows(prices: readonly PricedSize[], side: 'over' | 'under'): ComparedRow[] {
  const edges = [...new Set(prices.flatMap(({ rule }) => rule[side].map(({ within }) => within)))];
  edges.sort((a, b) => a - b);
  const last = edges.at(-1) ?? 0;
  const rows = edges
    .filter((edge) => edge > 0)
    .map((edge) =>
      comparedRow(
        ['to ', { ticks: edge }, ` ${side}`],
        prices.map(({ rule }) => pointsValue(priceWithin(rule, side, edge))),
      ),
    );
  const beyond = prices.map(({ rule }) => pointsValue(priceWithin(rule, side, last + 1)));
  return [...rows, comparedRow(['past ', { ticks: last }, ` ${side}`], beyond)];
}

/** What a deviation costs by the bands alone, without the reading margin. */
function priceWithin(rule: SizeRule, side: 'over' | 'under', deviation: Length): Points {
  const beyond = side === 'over' ? rule.beyondOver : rule.beyondUnder;
  const lose = rule[side].find(({ within }) => deviation <= within)?.lose ?? beyond;
  return Math.min(lose, rule.cap ?? lose);
}

/** A cap above every price changes nothing, so what counts is the dearest that can come about. */
function capRow(prices: readonly PricedSize[]): ComparedRow {
  const dearest = ({ rule: { beyondOver, beyondUnder, cap } }: PricedSize) => {
    const most = Math.max(beyondOver, beyondUnder);
    return Math.min(most, cap ?? most);
  };
  return comparedRow(
    'most that a size loses',
    prices.map((price) => pointsValue(dearest(price))),
  );
}
