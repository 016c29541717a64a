import type { Actor } from '@/lib/auth/actor';
import { formatLength } from '@/lib/length';
import { AXES, type Rubric } from '@/lib/scoring';
import type { Side } from '@/lib/sync/cells';
import type { ReadingEvent } from '@/lib/sync/protocol';
import { receiptOf } from '@/lib/sync/receipt';
import { outcomes, push } from './push-events';
import { eventOf } from './round-stage';
import { ticksOf } from './rubrics';

/** Sizes that are not on target, by "line/ordinal/axis", as typed in inches. */
export type Misses = Record<string, string>;

/** A reading of every size, on target unless told otherwise; at the bench the checks of the work too. */
export function readingsOf(
  author: Actor,
  attemptId: string,
  rubric: Rubric,
  misses: Misses = {},
  side: Side = 'bench',
): ReadingEvent[] {
  const sizes = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => index + 1).flatMap((ordinal) =>
      AXES.map((axis) => {
        const typed =
          misses[`${line.id}/${ordinal}/${axis}`] ??
          formatLength(line.target[axis], { unit: 'in', denominator: 64 });
        return eventOf(author, attemptId, {
          side,
          cell: { lineId: line.id, ordinal, what: axis },
          value: { kind: 'value', ticks: ticksOf(typed) },
          typed,
        });
      }),
    ),
  );
  const work = rubric.workChecks.map(({ id }) =>
    eventOf(author, attemptId, {
      cell: { lineId: '', ordinal: 0, what: id },
      value: { kind: 'level', level: 0 },
      typed: null,
      unit: null,
      instrument: null,
    }),
  );
  return side === 'bench' ? [...sizes, ...work] : sizes;
}

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
