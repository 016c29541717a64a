import type { MovedAttempt, MovePreview } from '@/lib/contracts/moves';
import type { Points } from '@/lib/scoring';
import { divideDown, divideHalfUp, divideUp } from '@/lib/scoring/whole-division';

export interface Result {
  score: Points | null;
  total: Points;
}

/** After minus before on the scale of the total after, in hundredths, half up; null without two numbers. */
export function changeBetween(before: Result, after: Result): Points | null {
  if (before.score === null || after.score === null) return null;
  if (before.total === after.total || before.total === 0) return after.score - before.score;
  const whole = after.score * before.total - before.score * after.total;
  return floorDivide(2 * whole + before.total, 2 * before.total);
}

function floorDivide(dividend: number, divisor: number): number {
  return dividend >= 0 ? divideDown(dividend, divisor) : 0 - divideUp(-dividend, divisor);
}

type Sums = Pick<MovePreview, 'gain' | 'same' | 'lose' | 'meanChange'>;

/** How many gain and lose, and by how much in the mean, half up. */
export function sumUpChanges(students: readonly Pick<MovedAttempt, 'change'>[]): Sums {
  const changes = students.flatMap(({ change }) => (change === null ? [] : [change]));
  const sum = changes.reduce((all, change) => all + change, 0);
  const count = changes.length;
  return {
    gain: changes.filter((change) => change > 0).length,
    same: changes.filter((change) => change === 0).length,
    lose: changes.filter((change) => change < 0).length,
    meanChange: count === 0 ? null : meanOf(sum, count),
  };
}

function meanOf(sum: number, count: number): Points {
  return sum >= 0 ? divideHalfUp(sum, count) : floorDivide(2 * sum + count, 2 * count);
}
