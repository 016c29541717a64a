import { type Attempt, type Points, projectAttempt, type Rubric, scoreAttempt } from '@/lib/scoring';
import { type Modification, modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { matchLines, renameExcused, renameLines } from './match-lines';

/** What a section recorded of a cut list, and the rubric it is priced by now. */
export interface RecordedGroup {
  rubric: Rubric;
  work: { attempt: Attempt; modification: Modification | null }[];
}

/** Hundredths of a point where every total is the same, else hundredths of a percent of each total. */
export type EffectScale = { kind: 'points'; total: Points } | { kind: 'share' };

/** What another rubric makes of a group. Means are of tenths, half up; `change` is the difference of the two. */
export interface GroupEffect {
  meanNow: number;
  meanThen: number;
  change: number;
  /** Of each student, in order of size, so that nobody is told by the place. */
  changes: number[];
}

/** How many students a group has with a score under both; `effect` is null where they are too few to be told. */
export interface GroupOutcome {
  students: number;
  effect: GroupEffect | null;
}

/** Fewer than this are told by their number alone: from so few, one could be told. */
export const LEAST_TOLD = 10;

interface ScoreOfTotal {
  points: Points;
  total: Points;
}

/**
 * What each group's recorded attempts would score under another rubric of the same cut list, beside what they score
 * under their own. Students with a modified rubric have it under both; the bonus of a prediction and what was held are
 * in neither. What the other rubric does not ask for is left out, and a check that nobody recorded costs nothing.
 * A group of fewer than `LEAST_TOLD` students gives its number alone. Attempts must fit their own rubric.
 *
 * @example rubricEffect(rubric, [{ rubric, work }]).groups[0] // { students: 24, effect: { meanNow: 8640, meanThen: 8640, change: 0, … } }
 */
export function rubricEffect(
  other: Rubric,
  groups: readonly RecordedGroup[],
): { scale: EffectScale; groups: GroupOutcome[] } {
  const scored = groups.map(({ rubric, work }) => {
    const names = matchLines(rubric, other);
    return work.flatMap(({ attempt, modification }) => {
      const now = score(rubric, attempt, modification);
      const renamed = modification && renameExcused(modification, names);
      const then = score(other, renameLines(attempt, names), renamed);
      return now && then ? [{ now, then }] : [];
    });
  });
  const told = scored.filter((pairs) => pairs.length >= LEAST_TOLD);
  const scale = scaleOf(told.flatMap((pairs) => pairs.flatMap(({ now, then }) => [now.total, then.total])));
  return {
    scale,
    groups: scored.map((pairs) => ({
      students: pairs.length,
      effect: pairs.length < LEAST_TOLD ? null : groupEffect(pairs, scale),
    })),
  };
}

function score(rubric: Rubric, recorded: Attempt, modification: Modification | null): ScoreOfTotal | null {
  const { attempt } = projectAttempt(rubric, recorded);
  const sheet = modification
    ? scoreAttempt(modifyRubric(rubric, modification), modifyAttempt(rubric, attempt, modification))
    : scoreAttempt(rubric, attempt);
  return sheet.provisional === null ? null : { points: sheet.provisional, total: sheet.total };
}

function scaleOf(totals: readonly Points[]): EffectScale {
  const [total] = totals;
  const same = total !== undefined && totals.every((each) => each === total);
  return same ? { kind: 'points', total } : { kind: 'share' };
}

function groupEffect(
  pairs: readonly { now: ScoreOfTotal; then: ScoreOfTotal }[],
  scale: EffectScale,
): GroupEffect {
  const value = ({ points, total }: ScoreOfTotal) =>
    scale.kind === 'points' ? points : halfUp(points * 10_000, total);
  const now = pairs.map((pair) => value(pair.now));
  const then = pairs.map((pair) => value(pair.then));
  const [meanNow, meanThen] = [meanOf(now), meanOf(then)];
  const changes = then.map((each, index) => each - (now[index] ?? 0)).sort((a, b) => a - b);
  return { meanNow, meanThen, change: meanThen - meanNow, changes };
}

const TENTH = 10;

function meanOf(values: readonly number[]): number {
  const sum = values.reduce((all, value) => all + value, 0);
  return TENTH * halfUp(sum, TENTH * values.length);
}

function halfUp(dividend: number, divisor: number): number {
  return Math.floor((2 * dividend + divisor) / (2 * divisor));
}
