import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { SizeRule } from '@/lib/scoring';

const GRADUATIONS: Record<Unit, Length[]> = {
  in: [TICKS_PER_INCH / 32, TICKS_PER_INCH / 64, TICKS_PER_INCH / 128],
  mm: [TICKS_PER_MM / 2, TICKS_PER_MM / 10, TICKS_PER_MM / 20],
};

/**
 * The stretch of rule on which every band edge of the prices can be seen: the coarsest graduation that all edges stand
 * on and that shows them within 13 graduations, and `room` more to each side; never fewer than twice that. Pure.
 *
 * @example ruleScaleOf([defaultRule], 'in') // { graduation: 7_937_500, span: 6 }: 1/32 in
 */
export function ruleScaleOf(
  rules: readonly SizeRule[],
  unit: Unit,
  room = 3,
): { graduation: Length; span: number } {
  const bands = rules.flatMap(({ over, under }) => [...over, ...under]);
  const edges = bands.map(({ within }) => within).filter((within) => within > 0);
  const [coarse = 1, ...finer] = GRADUATIONS[unit];
  const farthest = Math.max(coarse, ...edges);
  const fits = (graduation: Length) => edges.every((edge) => edge % graduation === 0);
  const seen = [coarse, ...finer].filter((graduation) => farthest / graduation <= 13);
  const graduation =
    seen.find(fits) ?? (seen.length > 0 ? coarse : Math.ceil(farthest / 8 / coarse) * coarse);
  return { graduation, span: Math.max(2 * room, Math.ceil(farthest / graduation) + room) };
}
