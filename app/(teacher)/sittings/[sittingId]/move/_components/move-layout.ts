import { pointsAsText } from '@/components/ui/points-text';
import type { Points } from '@/lib/scoring';
import { type MoveMark, type MoveScale, marksOf, scaleOf } from './move-scale';
import { type PlacedText, placeTexts } from './place-texts';

/** One attempt with two scores, both of the new total. */
export interface Mover {
  key: string;
  name: string;
  before: Points;
  after: Points;
}

export interface MoveStroke {
  key: string;
  side: 'drop' | 'gain';
  y: number;
  /** Where the stroke begins, and its point. */
  from: number;
  to: number;
  figure: PlacedText;
  name: PlacedText | null;
}

export interface MoveGroup {
  words: 'drop' | 'gain' | 'stay';
  count: number;
  /** Of those who stay: how many have no square, as they stand below the rule's stretch. */
  lower: number;
  y: number;
}

export interface MoveLayout {
  width: number;
  height: number;
  /** The rule's edge, under which the strokes lie, and the line that the squares stand on. */
  edge: number;
  base: number;
  thickness: number;
  marks: MoveMark[];
  groups: MoveGroup[];
  strokes: MoveStroke[];
  squares: { key: string; x: number; y: number }[];
  square: number;
}

const EDGE = 42;
const HEAD = 26;
const PITCH = 20;
/** Where rows lie closer than this, no name fits into one. */
const NAMED = 15;
/** Strokes of a large class share this height, down to a hair's breadth each. */
const DENSE = 640;
const THINNEST = 2.5;

/**
 * The picture of who moves, in pixels of a drawing of that width: one rule for all, a row a student who drops or
 * gains, each group from the highest score down, and a square on the base line for each who stays. Pure.
 */
export function layOutMoves(movers: readonly Mover[], total: Points, width: number): MoveLayout {
  const scale = scaleOf(movers, total, width);
  const rows = layOutRows(movers, scale, width);
  const stays = movers.filter(({ before, after }) => after === before);
  const shown = stays.filter(({ after }) => after >= scale.low * 100);
  const lower = stays.length - shown.length;
  const stacked = stack(shown, scale);
  const base = rows.foot + (stays.length > 0 ? HEAD + stacked.height + 2 : 6);
  const stay: MoveGroup = { words: 'stay', count: stays.length, lower, y: rows.foot + HEAD - 6 };
  return {
    width,
    height: Math.ceil(base + 3),
    edge: EDGE,
    base,
    thickness: Math.max(1.5, Math.min(10, rows.pitch * 0.5)),
    marks: marksOf(scale),
    groups: stays.length > 0 ? [...rows.groups, stay] : rows.groups,
    strokes: rows.strokes,
    squares: stacked.squares.map(({ key, x, up }) => ({ key, x, y: base - up })),
    square: stacked.square,
  };
}

/** Who drops and below who gains, a row each under a head of its own. */
function layOutRows(movers: readonly Mover[], scale: MoveScale, width: number) {
  const drops = movers.filter(({ before, after }) => after < before).sort(fromHighest);
  const gains = movers.filter(({ before, after }) => after > before).sort(fromHighest);
  const pitch = Math.min(PITCH, Math.max(THINNEST, DENSE / Math.max(1, drops.length + gains.length)));
  const groups: MoveGroup[] = [];
  const strokes: MoveStroke[] = [];
  let foot = EDGE;
  for (const [words, group] of [['drop', drops] as const, ['gain', gains] as const]) {
    if (group.length === 0) continue;
    groups.push({ words, count: group.length, lower: 0, y: foot + HEAD - 6 });
    const first = foot + HEAD + pitch / 2;
    strokes.push(...group.map((mover, nth) => strokeOf(mover, words, first + nth * pitch, { scale, width })));
    foot += HEAD + group.length * pitch + 4;
  }
  return {
    ...{ pitch, groups, foot },
    strokes: pitch >= NAMED ? strokes : strokes.map((stroke) => ({ ...stroke, name: null })),
  };
}

function fromHighest(a: Mover, b: Mover): number {
  return b.before - a.before || b.after - a.after;
}

function strokeOf(
  { key, name, before, after }: Mover,
  side: 'drop' | 'gain',
  y: number,
  { scale, width }: { scale: MoveScale; width: number },
): MoveStroke {
  const [from, to] = [scale.place(before), scale.place(after)];
  const texts = placeTexts({
    left: Math.min(from, to),
    right: Math.max(from, to),
    toRight: side === 'gain',
    figure: `${side === 'gain' ? '+' : '−'}${pointsAsText(Math.abs(after - before))}`,
    name,
    width,
  });
  return { key, side, y, from, to, ...texts };
}

/** Who stays, one square each on the nearest whole point. */
function stack(stays: readonly Mover[], { place, point }: MoveScale) {
  const columns = new Map<number, string[]>();
  for (const { key, after } of stays) {
    const at = Math.round(after / 100);
    columns.set(at, [...(columns.get(at) ?? []), key]);
  }
  const tallest = Math.max(0, ...[...columns.values()].map((keys) => keys.length));
  const step = Math.max(1.5, Math.min(10, point, 120 / Math.max(1, tallest)));
  return {
    square: step * 0.85,
    height: tallest * step,
    squares: [...columns].flatMap(([at, keys]) =>
      keys.map((key, nth) => ({ key, x: place(at * 100) - (step * 0.85) / 2, up: 2 + (nth + 1) * step })),
    ),
  };
}
