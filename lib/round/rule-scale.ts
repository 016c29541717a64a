import { formatLength, type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Axis, Line, Rubric } from '@/lib/scoring';
import { priceSize } from './price-size';

/** Eleven graduations and two `far` fill the strip of a tablet. */
const EACH_SIDE = 5;
const NEIGHBOURS = 4;

const STEPS: Record<Unit, readonly Length[]> = {
  in: [2, 4, 8, 16, 32, 64].map((parts) => TICKS_PER_INCH / parts),
  mm: [TICKS_PER_MM, TICKS_PER_MM / 2],
};

/** As fine as one reads a rule without being asked to. */
const PLAIN: Record<Unit, Length> = { in: TICKS_PER_INCH / 32, mm: TICKS_PER_MM / 2 };

export interface Graduation {
  ticks: Length;
  deviation: Length;
  lose: number;
  /** As it is typed into the record when it is pressed. */
  text: string;
}

export interface RuleScale {
  step: Length;
  graduations: Graduation[];
  /** What a reading just past the strip's ends loses. */
  farUnder: number;
  farOver: number;
}

/**
 * The graduations of a rule centred on the target: every band edge falls on one and the first step past the last band
 * is on the strip. Null when the edges lie on no rule's graduations or eleven do not reach: then the keypad serves.
 */
export function ruleScale(rubric: Rubric, line: Line, axis: Axis): RuleScale | null {
  const step = graduationStep(rubric, line, axis);
  if (step === null || lastEdge(line, axis) / step + 1 > EACH_SIDE) return null;
  const target = line.target[axis];
  if (target <= step * EACH_SIDE) return null;
  return {
    step,
    graduations: graduationsAt(rubric, line, axis, step, EACH_SIDE),
    farUnder: priceSize(rubric, line, axis, Math.max(1, target - step * (EACH_SIDE + 1))).lose,
    farOver: priceSize(rubric, line, axis, target + step * (EACH_SIDE + 1)).lose,
  };
}

/** The target and the readings next to it, for the keypad's first row; where no rule fits, a thousandth or tenth apart. */
export function neighbours(rubric: Rubric, line: Line, axis: Axis): Graduation[] {
  const step = graduationStep(rubric, line, axis) ?? FINE[rubric.unit];
  return graduationsAt(rubric, line, axis, step, NEIGHBOURS);
}

const FINE: Record<Unit, Length> = { in: TICKS_PER_INCH / 200, mm: TICKS_PER_MM / 10 };

function graduationStep(rubric: Rubric, line: Line, axis: Axis): Length | null {
  const { over, under } = line.sizes[axis];
  const edges = [line.target[axis], ...[...over, ...under].map(({ within }) => within)];
  const fits = STEPS[rubric.unit].filter((step) => edges.every((edge) => edge % step === 0));
  const [coarsest] = fits;
  if (coarsest === undefined) return null;
  const plain = Math.min(coarsest, PLAIN[rubric.unit]);
  return lastEdge(line, axis) / plain + 1 <= EACH_SIDE ? plain : coarsest;
}

function lastEdge(line: Line, axis: Axis): Length {
  const { over, under } = line.sizes[axis];
  return Math.max(...[...over, ...under].map(({ within }) => within));
}

function graduationsAt(rubric: Rubric, line: Line, axis: Axis, step: Length, eachSide: number): Graduation[] {
  const target = line.target[axis];
  return Array.from({ length: 2 * eachSide + 1 }, (_, index) => (index - eachSide) * step)
    .filter((deviation) => target + deviation > 0)
    .map((deviation) => ({
      ticks: target + deviation,
      deviation,
      lose: priceSize(rubric, line, axis, target + deviation).lose,
      text: graduationText(target + deviation, rubric.unit),
    }));
}

/** The shortest exact text of a graduation. */
export function graduationText(ticks: Length, unit: Unit): string {
  if (unit === 'in') {
    const denominator = ([2, 4, 8, 16, 32, 64, 128] as const).find(
      (parts) => ticks % (TICKS_PER_INCH / parts) === 0,
    );
    if (denominator) return formatLength(ticks, { unit, denominator });
  }
  const perUnit = unit === 'in' ? TICKS_PER_INCH : TICKS_PER_MM;
  const decimals = [0, 1, 2, 3, 4].find((places) => ticks % (perUnit / 10 ** places) === 0) ?? 7;
  return formatLength(ticks, { unit, decimals });
}
