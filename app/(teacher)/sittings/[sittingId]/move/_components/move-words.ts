import { pointsAsText } from '@/components/ui/points-text';
import type { MovedAttempt, MovePreview } from '@/lib/contracts/moves';
import type { Points } from '@/lib/scoring';
import { count, rosterName } from '../../../../_components/names';
import type { Mover } from './move-layout';

/** A change with its sign: +1.5, −3, 0. */
export function signedPoints(points: Points): string {
  return points > 0 ? `+${pointsAsText(points)}` : pointsAsText(points);
}

export function attemptName(attempt: MovedAttempt): string {
  const name = rosterName(attempt);
  return attempt.attemptNumber > 1 ? `${name}, attempt ${attempt.attemptNumber}` : name;
}

/** The reason of the verdict: how many move which way, and by how much on the whole. */
export function whoMoves({ gain, lose, same, meanChange, to }: MovePreview): {
  counts: string;
  mean: string;
} {
  if (gain + lose === 0) return { counts: 'Nobody’s score changes', mean: '' };
  const parts = [
    gain > 0 ? count(gain, 'gains', 'gain') : null,
    lose > 0 ? count(lose, 'drops', 'drop') : null,
    same > 0 ? count(same, 'stays', 'stay') : null,
  ].filter((part) => part !== null);
  const mean = meanChange === null ? '' : `mean ${signedPoints(meanChange)} of ${pointsAsText(to.total)}`;
  return { counts: parts.join(', '), mean };
}

/** What the move would come to for one attempt under the choice; null without two numbers. */
export function changeUnder({ after, held, change }: MovedAttempt, holdHarmless: boolean): Points | null {
  if (change === null || after === null) return null;
  return holdHarmless && held !== null ? held - (after - change) : change;
}

/** Attempts with two numbers, both on the new total's scale. */
export function moversOf(students: readonly MovedAttempt[]): Mover[] {
  return students.flatMap((attempt) =>
    attempt.change === null || attempt.after === null
      ? []
      : [
          {
            key: attempt.attemptId,
            name: attemptName(attempt),
            before: attempt.after - attempt.change,
            after: attempt.after,
          },
        ],
  );
}

/** Drops first, the largest on top; then gains, then who stays, then who has no number. */
export function dropsFirst(students: readonly MovedAttempt[]): MovedAttempt[] {
  const rank = ({ change }: MovedAttempt) => (change === null ? 3 : change < 0 ? 0 : change > 0 ? 1 : 2);
  return [...students].sort(
    (a, b) =>
      rank(a) - rank(b) ||
      Math.abs(b.change ?? 0) - Math.abs(a.change ?? 0) ||
      attemptName(a).localeCompare(attemptName(b), 'en'),
  );
}

interface ChoiceWords {
  asIs: string;
  held: string;
}

/** What each of the two choices means here, by how many students it concerns. */
export function choiceWords({ students, gain, lose, from }: MovePreview): ChoiceWords {
  if (lose === 0) {
    return {
      asIs: 'Nobody drops as things stand.',
      held: `It would concern nobody now; whoever is read later cannot fall below version ${from.number}.`,
    };
  }
  const dearest = Math.max(...students.map(({ change }) => -(change ?? 0)));
  const by = `${lose > 1 ? 'by up to' : 'by'} ${pointsAsText(dearest)}`;
  const others = gain > 0 ? ` ${count(gain, 'still gains', 'still gain')}.` : '';
  return {
    asIs: `${count(lose, 'student drops', 'students drop')}, ${by}.`,
    held: `${count(lose, 'student keeps', 'students keep')} what version ${from.number} gave.${others}`,
  };
}

/** How many students who were told a score would be told another. */
export function countTold(students: readonly MovedAttempt[], holdHarmless: boolean): number {
  return students.filter((attempt) => attempt.told && (changeUnder(attempt, holdHarmless) ?? 0) !== 0).length;
}

/** The picture in one sentence, for who cannot see it. */
export function pictureWords(preview: MovePreview): string {
  const { counts, mean } = whoMoves(preview);
  return `Who moves from version ${preview.from.number} to ${preview.to.number}: ${[counts, mean].filter(Boolean).join('; ')}. The table has each student.`;
}
