import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Rubric, ScoreSheet } from '@/lib/scoring';

export interface LengthPattern {
  /** Lengths that were read by number, and how many of them are short or long by more than the reading margin. */
  of: number;
  short: number;
  long: number;
  /** The side on which at least four of five lengths are off; null when they do not lean. */
  leans: 'short' | 'long' | null;
  /** Every length that is off on that side is off by this or more, in whole 1/64 in or 0.1 mm; null if that is none. */
  byAtLeast: Length | null;
}

export const FEWEST_LENGTHS = 3;
const LEAN = { num: 4, den: 5 };
const STEP: Record<Unit, Length> = { in: TICKS_PER_INCH / 64, mm: TICKS_PER_MM / 10 };

/**
 * Whether the lengths of one attempt lean to one side, as when the blade runs on the wrong side of the line. Says
 * something from three lengths read by number on; gauged ones carry no number and don't count. Null below that. Pure.
 *
 * @example lengthPattern(rubric, sheetOfThreeShortByASixteenth)?.leans // 'short'
 */
export function lengthPattern(rubric: Rubric, sheet: ScoreSheet): LengthPattern | null {
  const deviations = sheet.pieces.flatMap(({ gross, sizes }) => {
    const deviation = gross ? null : (sizes?.length.deviation ?? null);
    return deviation === null ? [] : [deviation];
  });
  if (deviations.length < FEWEST_LENGTHS) return null;
  const short = deviations.filter((deviation) => deviation < -rubric.margin);
  const long = deviations.filter((deviation) => deviation > rubric.margin);
  const of = deviations.length;
  const leans = isMost(short.length, of) ? 'short' : isMost(long.length, of) ? 'long' : null;
  const off = leans === 'short' ? short : leans === 'long' ? long : [];
  const least = Math.min(...off.map(Math.abs));
  const step = STEP[rubric.unit];
  const whole = off.length > 0 ? Math.floor(least / step) * step : 0;
  return { of, short: short.length, long: long.length, leans, byAtLeast: whole > 0 ? whole : null };
}

function isMost(part: number, whole: number): boolean {
  return part * LEAN.den >= whole * LEAN.num;
}
