import { type Length, parseLength, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import { graduationText } from '@/lib/round/rule-scale';
import type { Axis, Line } from '@/lib/scoring';

export interface OwnReadingContext {
  line: Pick<Line, 'target'>;
  axis: Axis;
  /** The unit of a number that comes without one. */
  unit: Unit;
  grossLimit: Length | null;
  margin: Length;
  blank: Record<Axis, Length> | null;
}

export type OwnReadingVerdict =
  | { verdict: 'fits' }
  /** Possible, but far off: kept as it is at the second press. */
  | { verdict: 'far'; asks: string }
  /** Cannot be: never kept, never corrected. */
  | { verdict: 'impossible'; asks: string };

const NEAR: Record<Unit, Length> = { in: TICKS_PER_INCH / 4, mm: 6 * TICKS_PER_MM };
/** A blank is seldom cut to its nominal size. */
const BLANK_ALLOWANCE = { num: 11, den: 10 };
const TIMES_LONGEST = 4;
const SMALLEST_SHARE = 10;

/**
 * Whether a piece can have what a student read. Impossible is what is over the blank's longest size by more than a
 * tenth (without a blank: over four times the piece's longest target), and what is under a tenth of its target.
 * Everything else can be; past the gross limit (1/4 in or 6 mm where there is none) it is far, and asked about once.
 * Exact, in ticks; the question is in plain words. Nothing is ever changed to what it "should" be.
 *
 * @example judgeOwnReading(lengthOfFiveInches, fortyInches, '40').verdict // 'impossible': "… Is that along the grain?"
 */
export function judgeOwnReading(context: OwnReadingContext, ticks: Length, typed: string): OwnReadingVerdict {
  const { line, axis, unit, blank } = context;
  const target = line.target[axis];
  const said = (length: Length) => `${graduationText(length, unit)} ${unit}`;
  const longest = Math.max(...Object.values(blank ?? line.target));
  const tooLong = blank
    ? ticks * BLANK_ALLOWANCE.den > longest * BLANK_ALLOWANCE.num
    : ticks > longest * TIMES_LONGEST;
  if (tooLong) {
    const why = blank
      ? `is longer than the whole blank (${said(longest)})`
      : `is over four times the longest size of this piece (${said(longest)})`;
    return {
      verdict: 'impossible',
      asks: `${said(ticks)} ${why}. ${WHERE[axis]}${unitHint(context, typed)}`,
    };
  }
  if (ticks * SMALLEST_SHARE < target) {
    const why = `is less than a tenth of the ${said(target)} asked for`;
    return {
      verdict: 'impossible',
      asks: `${said(ticks)} ${why}. ${WHERE[axis]}${unitHint(context, typed)}`,
    };
  }
  if (isNear(context, ticks)) return { verdict: 'fits' };
  const asks = `${said(ticks)} is far from ${said(target)}. ${WHERE[axis]}${unitHint(context, typed)}`;
  return { verdict: 'far', asks };
}

const WHERE: Record<Axis, string> = {
  length: 'Is that along the grain?',
  width: 'Is that across the grain, on the face?',
  thickness: 'Is that through the piece, from face to face?',
};

function isNear({ line, axis, grossLimit, margin, unit }: OwnReadingContext, ticks: Length): boolean {
  const limit = grossLimit === null ? NEAR[unit] : grossLimit + margin;
  return Math.abs(ticks - line.target[axis]) <= limit;
}

/** A bare number that would fit in the other unit is asked about, not converted. */
function unitHint(context: OwnReadingContext, typed: string): string {
  const other: Unit = context.unit === 'in' ? 'mm' : 'in';
  const read = parseLength(typed, other);
  const isBare = read.ok && read.unit === other;
  return isBare && isNear(context, read.ticks)
    ? ` Or is it in ${other === 'mm' ? 'millimetres' : 'inches'}? Then type ${typed.trim()} ${other}.`
    : '';
}
