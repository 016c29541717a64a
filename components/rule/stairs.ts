import type { Length } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import { type PriceStep, priceAt, type Side, sideOf } from './price-steps';
import { type Graduation, placeOf, type RuleScale } from './rule-scale';

/** One tread of the stair: a stretch of the rule at one price. */
export interface Tread {
  left: number;
  right: number;
  lose: Points;
  side: Side;
}

/** How high a price stands: so many px a point, less where the dearest would pass the limit. */
export function risePerPoint(dearestPoints: Points, pxPerPoint: number, limitPx: number): number {
  const points = dearestPoints / 100;
  return points * pxPerPoint <= limitPx ? pxPerPoint : limitPx / points;
}

/** Treads with their risers where the price really changes: at band edge plus margin. */
export function treadsByEdge(
  steps: readonly PriceStep[],
  scale: RuleScale,
  frame: { left: number; right: number; centre: number; pitch: number },
): Tread[] {
  return steps
    .map((step) => {
      const left = Math.max(frame.left, placeOf(step.from, scale, frame.centre, frame.pitch));
      const right = Math.min(frame.right, placeOf(step.to, scale, frame.centre, frame.pitch));
      return { left, right, lose: step.lose, side: step.to < 0 ? 'under' : 'over' } as const;
    })
    .filter((tread) => tread.right > tread.left);
}

/** Treads that fill whole columns, since only graduations can be entered; neighbours of one price joined. */
export function treadsByColumn(
  steps: readonly PriceStep[],
  columns: readonly Graduation[],
  columnLeft: (step: number) => number,
  pitch: number,
): Tread[] {
  const treads: Tread[] = [];
  for (const column of columns) {
    const lose = priceAt(steps, column.deviation);
    const side = sideOf(column.deviation);
    const left = columnLeft(column.step);
    const last = treads.at(-1);
    if (last && last.lose === lose && (lose === 0 || last.side === side)) last.right = left + pitch;
    else treads.push({ left, right: left + pitch, lose, side });
  }
  return treads;
}

/** Prices past the shown stretch on one side, cheapest and dearest. */
export function priceBeyond(steps: readonly PriceStep[], side: Side, reach: Length): [Points, Points] {
  const past = steps.filter((step) => (side === 'under' ? step.from < -reach : step.to > reach));
  const prices = past.map((step) => step.lose);
  return prices.length === 0 ? [0, 0] : [Math.min(...prices), Math.max(...prices)];
}

/** The stair's upper line, from its first riser to its last, over a foot line. */
export function stairOutline(treads: readonly Tread[], foot: number, rise: number): string {
  const parts: string[] = [];
  treads.forEach((tread, index) => {
    const y = foot - (tread.lose / 100) * rise;
    parts.push(index === 0 ? `M${tread.left} ${y}` : `V${y}`, `H${tread.right}`);
  });
  return parts.join('');
}
