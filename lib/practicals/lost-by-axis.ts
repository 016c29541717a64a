import { AXES, type Axis, type Points, type ScoreSheet, type SizeSheet } from '@/lib/scoring';

export interface AxisLoss {
  axis: Axis;
  under: Points;
  over: Points;
  /** Of sizes that could not be measured. */
  spoiled: Points;
  dearestUnder: Points;
  dearestOver: Points;
}

/**
 * Where the points of a sheet went: by axis and side, as its sizes lost them, and in `other` what checks, missing and
 * held pieces lose and what a piece's limit gives or takes. All together they are exactly the points lost.
 */
export function lostByAxis(sheet: ScoreSheet): { axes: AxisLoss[]; other: Points } {
  const axes = AXES.map((axis) => axisLoss(axis, sheet));
  const told = axes.reduce((sum, { under, over, spoiled }) => sum + under + over + spoiled, 0);
  return { axes, other: sheet.lost - told };
}

function axisLoss(axis: Axis, sheet: ScoreSheet): AxisLoss {
  const sizes = sheet.pieces.flatMap((piece) => (piece.sizes ? [piece.sizes[axis]] : []));
  const onSide = (side: (size: SizeSheet) => boolean) => sizes.filter(side).map(({ lose }) => lose);
  const under = onSide(({ deviation }) => deviation !== null && deviation < 0);
  const over = onSide(({ deviation }) => deviation !== null && deviation > 0);
  const spoiled = onSide(({ band }) => band === 'spoiled');
  return {
    axis,
    under: sum(under),
    over: sum(over),
    spoiled: sum(spoiled),
    dearestUnder: Math.max(0, ...under),
    dearestOver: Math.max(0, ...over),
  };
}

function sum(points: readonly Points[]): Points {
  return points.reduce((all, each) => all + each, 0);
}
