import { changesInPrices } from './changes-in-prices';
import { changesInTask } from './changes-in-task';
import type { Compared, Phrase } from './compare-types';

export type Written = Omit<Compared, 'label'>;

/**
 * What a draft or another version changes of a version, a sentence each: the task's words and pieces first,
 * then prices, checks, the total and the policies. Empty only when the two read alike and compile alike, but for how a
 * share is written (2/4 is 1/2). Lines and checks are the same ones by their ids. Pure; never fails.
 *
 * @example changesSince({ ...version1, number: 1 }, version2) // [['Kerf: now ', { ticks: 23_812_500 }, ', was ', { ticks: 31_750_000 }, '.']]
 */
export function changesSince(
  before: Written & { number: number },
  now: Written & { number?: number; called?: string },
): Phrase[] {
  return [...changesInTask(before.task, now.task), ...changesInPrices(before, now)];
}
