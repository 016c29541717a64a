import type { Points } from '@/lib/scoring';
import type { Mover } from './move-layout';

/** Which stretch of the score lies where on the paper. */
export interface MoveScale {
  low: number;
  high: number;
  /** Pixels of a whole point. */
  point: number;
  place(points: Points): number;
}

export interface MoveMark {
  value: number;
  x: number;
  size: 'long' | 'middle' | 'short';
  numbered: boolean;
}

/** Paper left free at both ends; more where a stroke runs from end to end and its words must stand beside it. */
const PAD = 14;
const WIDE_PAD = 64;
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

/** The rule for these scores on paper of that width. */
export function scaleOf(movers: readonly Mover[], total: Points, width: number): MoveScale {
  const [low, high] = stretchOf(movers, total);
  const pad = padOf(movers, low, high);
  const point = (width - 2 * pad) / (high - low);
  return { low, high, point, place: (points) => pad + (points / 100 - low) * point };
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

/** The rule's marks, never so close that they run together. */
export function marksOf({ low, high, point, place }: MoveScale): MoveMark[] {
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
