import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Axis, Line, Rubric } from '@/lib/scoring';

const STEPS: Record<Unit, readonly Length[]> = {
  in: [1 / 64, 1 / 32, 1 / 16, 1 / 8, 1 / 4].map((part) => part * TICKS_PER_INCH),
  mm: [0.5, 1, 2, 5, 10].map((part) => part * TICKS_PER_MM),
};
/** As fine as one reads a rule without being asked to. */
const PLAIN: Record<Unit, Length> = { in: TICKS_PER_INCH / 32, mm: TICKS_PER_MM / 2 };
const MOST_EACH_SIDE = 8;
const FEWEST_EACH_SIDE = 2;

/**
 * The graduation and the stretch of a rule face on which the bands of a size, and one step past them, can be seen:
 * 1/32 in or 0.5 mm, finer where an edge needs it, coarser only where eight graduations a side would not reach.
 * `also` names deviations that should be on the face too, as far as there is room.
 */
export function faceScale(
  rubric: Rubric,
  line: Line,
  axis: Axis,
  also: readonly Length[] = [],
): { graduation: Length; span: number } {
  const { over, under } = line.sizes[axis];
  const edges = [...over, ...under].map(({ within }) => within);
  const last = Math.max(...edges);
  const fine = edges.some((edge) => edge % PLAIN[rubric.unit] !== 0);
  const steps = STEPS[rubric.unit].filter((step) => fine || step >= PLAIN[rubric.unit]);
  const graduation =
    steps.find((step) => Math.ceil(last / step) + 1 <= MOST_EACH_SIDE) ?? steps.at(-1) ?? PLAIN[rubric.unit];
  const reach = Math.max(last, ...also.map(Math.abs)) + graduation;
  const span = Math.min(MOST_EACH_SIDE, Math.max(FEWEST_EACH_SIDE, Math.ceil(reach / graduation)));
  return { graduation, span };
}
