import type { Actor } from '@/lib/auth/actor';
import { formatLength } from '@/lib/length';
import { AXES, type Rubric } from '@/lib/scoring';
import type { Side } from '@/lib/sync/cells';
import type { ReadingEvent } from '@/lib/sync/protocol';
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
