import { pointsAsText } from '@/components/ui/points-text';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from '@/lib/practicals/both-scales';
import type { Points, Rubric } from '@/lib/scoring';

/** "1 of 45 is 2.22 of 100": points on both scales, or on the one there is. */
export function PointsInBoth({ points, rubric }: { points: Points; rubric: Rubric }) {
  const own = `${pointsAsText(points)} of ${pointsAsText(possiblePoints(rubric))}`;
  if (isOneScale(rubric)) return own;
  return `${own} is ${pointsAsText(pointsOfTotal(rubric, points))} of ${pointsAsText(totalPoints(rubric))}`;
}
