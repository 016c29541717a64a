import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';

/** The stretch of a rule that is shown: so many graduations to each side of the target. */
export interface RuleScale {
  unit: Unit;
  target: Length;
  graduation: Length;
  span: number;
}

export interface Graduation {
  /** Graduations from the target: below zero is under. */
  step: number;
  ticks: Length;
  deviation: Length;
}

/** The narrowest a column may be that is pressed per reading: 15 mm on the bench's tablet. */
export const TOUCH_PX = 78;

const INCH_TICKS = [
  { every: TICKS_PER_INCH / 2, length: 54 },
  { every: TICKS_PER_INCH / 4, length: 48 },
  { every: TICKS_PER_INCH / 8, length: 44 },
  { every: TICKS_PER_INCH / 16, length: 36 },
  { every: TICKS_PER_INCH / 32, length: 28 },
  { every: TICKS_PER_INCH / 64, length: 20 },
];
const MM_TICKS = [
  { every: 10 * TICKS_PER_MM, length: 54 },
  { every: 5 * TICKS_PER_MM, length: 44 },
  { every: TICKS_PER_MM, length: 36 },
  { every: TICKS_PER_MM / 2, length: 20 },
];
const OFF_THE_RULE = 16;

/** The graduations shown, from the shortest; one that would be no length at all is left out. */
export function graduationsOf({ target, graduation, span }: RuleScale): Graduation[] {
  return Array.from({ length: 2 * span + 1 }, (_, index) => {
    const step = index - span;
    return { step, ticks: target + step * graduation, deviation: step * graduation };
  }).filter((each) => each.ticks > 0);
}

/** How far a tick hangs from the edge, as on a steel rule: longer for halves, quarters, eighths; tens, fives, ones. */
export function tickLength(ticks: Length, unit: Unit): number {
  const marks = unit === 'in' ? INCH_TICKS : MM_TICKS;
  return marks.find((mark) => ticks % mark.every === 0)?.length ?? OFF_THE_RULE;
}

/** The most graduations a side that stay wide enough to press, with a `far` column at each end; 0 if none do. */
export function spanThatFits(widthPx: number, most = 5): number {
  const columns = Math.floor(widthPx / TOUCH_PX);
  return Math.max(0, Math.min(most, Math.floor((columns - 3) / 2)));
}

/** Where a deviation falls on paper, given where the target stands and how wide a graduation is. */
export function placeOf(deviation: Length, scale: RuleScale, centre: number, pitch: number): number {
  return centre + (deviation / scale.graduation) * pitch;
}
