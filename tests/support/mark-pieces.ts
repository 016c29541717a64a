import type { Actor } from '@/lib/auth/actor';
import type { Rubric } from '@/lib/scoring';
import { receiptOf } from '@/lib/sync/receipt';
import { outcomes, push } from './push-events';
import { type Misses, readingsOf } from './readings';
import { eventOf } from './round-stage';

export { readingsOf } from './readings';

/** Records everything of an attempt at the bench. */
export async function markPieces(
  author: Actor,
  sittingId: string,
  attemptId: string,
  rubric: Rubric,
  misses: Misses = {},
): Promise<void> {
  const answers = await outcomes(push(author, sittingId, readingsOf(author, attemptId, rubric, misses)));
  if (answers.some((answer) => answer !== 'kept')) throw new Error(answers.join('\n'));
}

/** Records the student's own readings and locks them. */
export async function lockPrediction(
  student: Actor,
  sittingId: string,
  attemptId: string,
  rubric: Rubric,
  misses: Misses = {},
): Promise<void> {
  const own = readingsOf(student, attemptId, rubric, misses, 'own');
  const lock = eventOf(student, attemptId, {
    side: 'own',
    cell: { lineId: '', ordinal: 0, what: '@lock' },
    value: { kind: 'lock', locked: true, receipt: await receiptOf(attemptId, own) },
    typed: null,
    unit: null,
    instrument: null,
  });
  const answers = await outcomes(push(student, sittingId, [...own, lock], { deviceId: student.personId }));
  if (answers.some((answer) => answer !== 'kept')) throw new Error(answers.join('\n'));
}
