import type { Points } from '@/lib/scoring';

/** One attempt with two scores, both of the new total. */
export interface Mover {
  key: string;
  name: string;
  before: Points;
  after: Points;
}

interface PlacedText {
  x: number;
  text: string;
  anchor: 'start' | 'end';
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

export interface MoveMark {
  value: number;
  x: number;
  size: 'long' | 'middle' | 'short';
  numbered: boolean;
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

/** Paper left free at both ends; more where a stroke runs from end to end and its words must stand beside it. */
const PAD = 14;
const WIDE_PAD = 64;
const EDGE = 42;
const HEAD = 26;
const PITCH = 20;
/** Where rows lie closer than this, no name fits into one. */
const NAMED = 15;
/** Strokes of a large class share this height, down to a hair's breadth each. */
const DENSE = 640;
const THINNEST = 2.5;
const SIGN = 7.2;
const GAP = 6;
const FEWEST = 20;
const MOST_MARKS = 60;

/** Distances of short, middle and long marks; the first that keeps the marks apart is taken. */
const GRADUATIONS = [
  [1, 5, 10],
  [5, 10, 50],
  [10, 50, 100],
  [50, 100, 500],
  [100, 500, 1000],
] as const;

const COARSEST = [1000, 5000, 10_000] as const;

/**
 * The picture of who moves, in pixels of a drawing of that width: one rule for all, a row a student who drops or
 * gains, each group from the highest score down, and a square on the base line for each who stays. Pure.
 */
export function layOutMoves(movers: readonly Mover[], total: Points, width: number): MoveLayout {
  const [low, high] = stretchOf(movers, total);
  const pad = padOf(movers, low, high);
  const point = (width - 2 * pad) / (high - low);
  const place = (points: Points) => pad + (points / 100 - low) * point;
  const drops = movers.filter(({ before, after }) => after < before).sort(fromHighest);
  const gains = movers.filter(({ before, after }) => after > before).sort(fromHighest);
  const stays = movers.filter(({ before, after }) => after === before);
  const pitch = pitchOf(drops.length + gains.length);
  const groups: MoveGroup[] = [];
  const strokes: MoveStroke[] = [];
  let y = EDGE;
  for (const [words, group] of [['drop', drops] as const, ['gain', gains] as const]) {
    if (group.length === 0) continue;
    groups.push({ words, count: group.length, lower: 0, y: y + HEAD - 6 });
    y += HEAD;
    for (const mover of group) {
      strokes.push(strokeOf(mover, words, y + pitch / 2, pitch >= NAMED, place, width));
      y += pitch;
    }
    y += 4;
  }
  const shown = stays.filter(({ after }) => after >= low * 100);
  if (stays.length > 0) {
    const lower = stays.length - shown.length;
    groups.push({ words: 'stay', count: stays.length, lower, y: y + HEAD - 6 });
  }
  const stacked = stack(shown, place, point);
  const base = y + (stays.length > 0 ? HEAD + stacked.height + 2 : 6);
  return {
    width,
    height: Math.ceil(base + 3),
    edge: EDGE,
    base,
    thickness: Math.max(1.5, Math.min(10, pitch * 0.5)),
    marks: marksOf(low, high, place, point),
    groups,
    strokes,
    squares: stacked.squares.map(({ key, x, up }) => ({ key, x, y: base - up })),
    square: stacked.square,
  };
}

function fromHighest(a: Mover, b: Mover): number {
  return b.before - a.before || b.after - a.after;
}

/**
 * A stretch of whole fives that holds who moves and is never too short to be read; upwards who stays too, for a score
 * far below all others would press the rest together.
 */
function stretchOf(movers: readonly Mover[], total: Points): [low: number, high: number] {
  if (movers.length === 0) return [0, Math.max(FEWEST, total / 100)];
  const moving = movers.filter(({ before, after }) => before !== after);
  const least = Math.min(
    ...(moving.length > 0 ? moving : movers).map((each) => Math.min(each.before, each.after)),
  );
  const most = Math.max(...movers.map(({ before, after }) => Math.max(before, after)));
  const ends = Math.ceil(total / 500) * 5;
  const high = Math.ceil((most + 50) / 500) * 5;
  const low = Math.floor((least - 50) / 500) * 5;
  const top = Math.max(most <= ends * 100 ? Math.min(high, ends) : high, Math.min(ends, low + FEWEST));
  return [Math.max(0, Math.min(low, top - FEWEST)), Math.max(top, FEWEST)];
}

function padOf(movers: readonly Mover[], low: number, high: number): number {
  const longest = Math.max(0, ...movers.map(({ before, after }) => Math.abs(after - before)));
  return longest > (high - low) * 70 ? WIDE_PAD : PAD;
}

function pitchOf(rows: number): number {
  return Math.min(PITCH, Math.max(THINNEST, DENSE / Math.max(1, rows)));
}

function strokeOf(
  { key, name, before, after }: Mover,
  side: 'drop' | 'gain',
  y: number,
  named: boolean,
  place: (points: Points) => number,
  width: number,
): MoveStroke {
  const [from, to] = [place(before), place(after)];
  const change = (Math.abs(after - before) / 100).toFixed(2).replace(/\.?0+$/, '');
  const texts = placeTexts({
    left: Math.min(from, to),
    right: Math.max(from, to),
    toRight: side === 'gain',
    figure: `${side === 'gain' ? '+' : '−'}${change}`,
    name,
    width,
  });
  return { key, side, y, from, to, figure: texts.figure, name: named ? texts.name : null };
}

interface TextRoom {
  left: number;
  right: number;
  toRight: boolean;
  figure: string;
  name: string;
  width: number;
}

/**
 * The change stands at the stroke's point and the name behind its beginning; what would run off the paper goes to the
 * other side, and a name that fits on neither is cut.
 */
function placeTexts({ left, right, toRight, figure, name, width }: TextRoom) {
  const room = { left: left - GAP, right: width - right - GAP };
  const wide = figure.length * SIGN;
  const ahead = toRight ? 'right' : 'left';
  const figureSide = room[ahead] >= wide ? ahead : toRight ? 'left' : 'right';
  const free = { ...room, [figureSide]: room[figureSide] - wide - 2 * GAP };
  const behind = figureSide === 'right' ? 'left' : 'right';
  const nameSide =
    free[behind] >= name.length * SIGN || free[behind] >= free[figureSide] ? behind : figureSide;
  const signs = Math.max(1, Math.floor(free[nameSide] / SIGN));
  const text = name.length <= signs ? name : `${name.slice(0, signs - 1).trimEnd()}…`;
  const at = (which: 'left' | 'right', away: number, words: string): PlacedText =>
    which === 'right'
      ? { x: right + GAP + away, text: words, anchor: 'start' }
      : { x: left - GAP - away, text: words, anchor: 'end' };
  return {
    figure: at(figureSide, 0, figure),
    name: at(nameSide, nameSide === figureSide ? wide + 2 * GAP : 0, text),
  };
}

function marksOf(low: number, high: number, place: (points: Points) => number, point: number): MoveMark[] {
  const graduation =
    GRADUATIONS.find(([short]) => (high - low) / short <= MOST_MARKS && point * short >= 4) ?? COARSEST;
  const [short, middle, long] = graduation;
  const apart = point * middle;
  const first = Math.ceil(low / short);
  return Array.from({ length: Math.floor(high / short) - first + 1 }, (_, index) => {
    const value = (first + index) * short;
    const size = value % long === 0 ? 'long' : value % middle === 0 ? 'middle' : 'short';
    const numbered = size === 'long' || (size === 'middle' && apart >= 38);
    return { value, x: place(value * 100), size, numbered };
  });
}

/** Who stays, one square each on the nearest whole point. */
function stack(stays: readonly Mover[], place: (points: Points) => number, point: number) {
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
