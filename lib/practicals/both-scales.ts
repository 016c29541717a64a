import type { Points, Rubric } from '@/lib/scoring';

/** What the pieces are worth together, or the starting score. */
export function possiblePoints(rubric: Rubric): Points {
  if (rubric.basis === 'start') return rubric.start ?? 0;
  return rubric.lines.reduce((sum, line) => sum + line.worth * line.quantity, 0);
}

/** What the result is out of when no piece is excused. */
export function totalPoints(rubric: Rubric): Points {
  return rubric.outOf ?? possiblePoints(rubric);
}

/** Whether points and the result are on one scale, so that telling both would repeat the number. */
export function isOneScale(rubric: Rubric): boolean {
  return possiblePoints(rubric) === totalPoints(rubric);
}

/**
 * Points of the pieces' worth on the scale of the result, in hundredths, half up.
 *
 * @example pointsOfTotal(rubricOf45OutOf100, 100) // 222: "1 of 45 is 2.22 of 100"
 */
export function pointsOfTotal(rubric: Rubric, points: Points): Points {
  const possible = possiblePoints(rubric);
  return possible === 0 ? 0 : Math.floor((2 * points * totalPoints(rubric) + possible) / (2 * possible));
}
