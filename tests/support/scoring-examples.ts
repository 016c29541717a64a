import { type Length, TICKS_PER_INCH } from '@/lib/length';
import type { Attempt, Axis, Check, Line, Piece, Reading, Rubric, SizeRule } from '@/lib/scoring';

/** Ticks of a number of 64ths of an inch. */
export function sixtyFourths(count: number): Length {
  return (count * TICKS_PER_INCH) / 64;
}

/** Within 1/32 free, 1/16 loses 1 point, 3/32 loses 2, beyond 3: both sides alike. */
export function makeRule(changes: Partial<SizeRule> = {}): SizeRule {
  const bands = [
    { within: sixtyFourths(2), lose: 0 },
    { within: sixtyFourths(4), lose: 100 },
    { within: sixtyFourths(6), lose: 200 },
  ];
  return { over: bands, under: bands, beyondOver: 300, beyondUnder: 300, cap: null, ...changes };
}

export function makeCheck(id: string, loses: readonly number[], assume: number | null = 0): Check {
  return { id, label: id, levels: loses.map((lose, at) => ({ label: `level ${at}`, lose })), assume };
}

/** A part 3/4 x 1-1/2 x 4 in, worth 9 points, one of it, no checks; `rule` is for all three axes. */
export function makeLine({ rule = makeRule(), ...changes }: Partial<Line> & { rule?: SizeRule }): Line {
  return {
    id: 'shelf',
    label: 'Shelf',
    quantity: 1,
    target: { thickness: sixtyFourths(48), width: sixtyFourths(96), length: sixtyFourths(256) },
    worth: 900,
    missing: 900,
    sizes: { thickness: rule, width: rule, length: rule },
    checks: [],
    swap: true,
    set: 'each',
    ...changes,
  };
}

/** One shelf, scored as it is: no scale, floor, margin, rounding, bonus above 102 percent or lateness. */
export function makeRubric(changes: Partial<Rubric>): Rubric {
  return {
    unit: 'in',
    basis: 'worth',
    start: null,
    outOf: null,
    floor: 0,
    roundTo: 1,
    readTo: null,
    margin: 0,
    grossLimit: null,
    lines: [makeLine({})],
    workChecks: [],
    late: null,
    ceiling: 102,
    ...changes,
  };
}

export const value = (ticks: Length): Reading => ({ kind: 'value', ticks });

/** A present piece; a number is a value in ticks, an axis not named is gauged. */
export function makePiece(
  lineId: string,
  ordinal: number,
  sizes: Partial<Record<Axis, Reading | Length>> = {},
  checks: Record<string, number> = {},
): Piece {
  const read = (axis: Axis): Reading => {
    const reading = sizes[axis] ?? { kind: 'gauged' };
    return typeof reading === 'number' ? value(reading) : reading;
  };
  return {
    lineId,
    ordinal,
    state: 'present',
    sizes: { thickness: read('thickness'), width: read('width'), length: read('length') },
    checks,
  };
}

export function makeAttempt(pieces: Piece[], changes: Partial<Attempt> = {}): Attempt {
  return { pieces, work: {}, bonus: 0, daysLate: 0, ...changes };
}
