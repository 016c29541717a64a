import { pointsAsText } from '@/components/ui/points-text';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from '@/lib/practicals/both-scales';
import type { Points, Rubric } from '@/lib/scoring';

interface PointsInBothProps {
  points: Points;
  rubric: Rubric;
  /** As a sentence of its own: "1 of 45 is 2.22 of 100". */
  sentence?: boolean;
}

/** Points on both scales, "1 of 45 (2.22 of 100)", or on the one there is. */
export function PointsInBoth({ points, rubric, sentence = false }: PointsInBothProps) {
  const own = `${pointsAsText(points)} of ${pointsAsText(possiblePoints(rubric))}`;
  if (isOneScale(rubric)) return own;
  const ofTotal = `${pointsAsText(pointsOfTotal(rubric, points))} of ${pointsAsText(totalPoints(rubric))}`;
  return sentence ? `${own} is ${ofTotal}` : `${own} (${ofTotal})`;
}
