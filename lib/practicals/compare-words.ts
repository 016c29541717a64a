import { type Length, MAX_LENGTH } from '@/lib/length';
import { pointsAsTyped } from './as-typed';
import { type DifferingSpan, differingSpans } from './compare-curves';
import { joinWords } from './compare-sizes';
import type { ComparedRow, ComparedSizes, ComparedValue, Phrase } from './compare-types';

type Side = 'under' | 'over';

/** A sentence for each stretch of sizes and side on which the bands part; margins have a row of their own. */
export function priceSentences(sizes: readonly ComparedSizes[], labels: readonly string[]): Phrase[] {
  return sizes.flatMap((group) => {
    const byBands = differingSpans(group.prices.map(({ rule }) => ({ rule, margin: 0 })));
    const bySide = (['under', 'over'] as const).map((side) => ({
      side,
      spans: byBands.filter(({ to }) => (side === 'under' ? to < 0 : to > 0)),
    }));
    const [under, over] = bySide.map(({ spans }) => spans);
    if (under && over && under.length > 0 && areMirrored(under, over)) {
      return [priceSentence(group.name, 'over', over, labels, 'over or under')];
    }
    return bySide
      .filter(({ spans }) => spans.length > 0)
      .map(({ side, spans }) => priceSentence(group.name, side, spans, labels, side));
  });
}

function areMirrored(under: readonly DifferingSpan[], over: readonly DifferingSpan[]): boolean {
  const turned = [...under].reverse().map(({ from, to, lose }) => ({ from: -to, to: -from, lose }));
  return JSON.stringify(turned) === JSON.stringify(over);
}

function priceSentence(
  name: Phrase,
  side: Side,
  spans: readonly DifferingSpan[],
  labels: readonly string[],
  sideWords: string,
): Phrase {
  const where: Phrase = [...name, ` ${sideWords}, `, ...stretchWords(side, spans)];
  return labels.length === 2 ? betweenTwo(where, spans, labels) : amongMany(where, spans, labels);
}

/** "past 1/64", or "between 1/64 and 1/16" when they agree again further out. */
function stretchWords(side: Side, spans: readonly DifferingSpan[]): Phrase {
  const near = Math.min(...spans.map(({ from, to }) => (side === 'under' ? -to : from)));
  const far = Math.max(...spans.map(({ from, to }) => (side === 'under' ? -from : to)));
  const reaches = spans.some(({ from, to }) => isEnd(from) || isEnd(to));
  if (reaches) return ['past ', { ticks: near - 1 }];
  return ['between ', { ticks: near - 1 }, ' and ', { ticks: far }];
}

function isEnd(ticks: Length): boolean {
  return Math.abs(ticks) >= MAX_LENGTH;
}

function betweenTwo(where: Phrase, spans: readonly DifferingSpan[], labels: readonly string[]): Phrase {
  const [first = '', second = ''] = labels;
  const changes = spans.map(({ lose: [a = 0, b = 0] }) => b - a);
  const more = changes.filter((change) => change > 0);
  const less = changes.filter((change) => change < 0).map((change) => -change);
  const dearer = more.length > 0 ? [`${range(more)} more`] : [];
  const cheaper = less.length > 0 ? [`${range(less)} less`] : [];
  return [`${second} takes ${joinWords([...dearer, ...cheaper])} than ${first} for `, ...where, '.'];
}

function range(amounts: readonly number[]): string {
  const [least, most] = [Math.min(...amounts), Math.max(...amounts)];
  const words = least === most ? pointsAsTyped(most) : `${pointsAsTyped(least)} to ${pointsAsTyped(most)}`;
  return `${words} ${words === '1' ? 'point' : 'points'}`;
}

function amongMany(where: Phrase, spans: readonly DifferingSpan[], labels: readonly string[]): Phrase {
  const spread = ({ lose }: DifferingSpan) => Math.max(...lose) - Math.min(...lose);
  const widest = spans.reduce((best, span) => (spread(span) > spread(best) ? span : best));
  const named = (price: number) => joinWords(labels.filter((_, index) => widest.lose[index] === price));
  const [most, least] = [Math.max(...widest.lose), Math.min(...widest.lose)];
  return [
    'For ',
    ...where,
    `, the prices are up to ${range([most - least])} apart: ${named(most)} most, ${named(least)} least.`,
  ];
}

/** "Besides, they differ in reading margin (0.002, 0, 0.002) and missing piece (9, 6, 9)." */
export function otherSentence(rows: readonly ComparedRow[], afterPrices: boolean): Phrase[] {
  const differing = rows.filter(({ differs }) => differs);
  if (differing.length === 0) return [];
  const opening = afterPrices ? 'Besides, they differ in ' : 'They price every size alike, and differ in ';
  const words = differing.flatMap(
    (row, index): Phrase => [
      ...(index === 0 ? [] : [index === differing.length - 1 ? ' and ' : ', ']),
      ...row.label,
      ' (',
      ...row.values.flatMap((value, place): Phrase => [...(place === 0 ? [] : [', ']), ...valueWords(value)]),
      ')',
    ],
  );
  return [[opening, ...words, '.']];
}

export function valueWords(value: ComparedValue): Phrase {
  switch (value.kind) {
    case 'length':
      return [{ ticks: value.ticks }];
    case 'points':
      return [pointsAsTyped(value.points)];
    case 'percent':
      return [`${value.percent}%`];
    case 'text':
      return [value.text];
    case 'none':
      return ['none'];
  }
}
