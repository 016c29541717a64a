import { findPiece } from './pieces';
import { withEvents } from './record-events';
import { studentStatus } from './students';
import type { BenchEvent, Press, RoundPlan, RoundState, Spot } from './types';
import { openStudent } from './walk';

/** Where the device left the round. */
export interface Place {
  attemptId: string;
  spot: Spot | null;
  order: 'piece' | 'line';
  skipped: readonly string[];
}

/** A round as it opens: where this device left it, or with the first student who has something to be done. */
export function startRound(
  plan: RoundPlan,
  events: readonly BenchEvent[],
  left: Place | null = null,
  presses: readonly Press[] = [],
): RoundState {
  const empty: RoundState = {
    plan,
    events: new Map(),
    attemptId: plan.students[0]?.attemptId ?? '',
    spot: null,
    order: left?.order ?? 'piece',
    presses,
    asked: null,
    skipped: left?.skipped ?? [],
    elsewhere: [],
    keypad: { text: '', unit: plan.rubric.unit },
    caliper: { unit: plan.rubric.unit, denied: [], last: null, closed: false, zero: null },
    doubt: null,
    said: null,
  };
  const state = withEvents(empty, events);
  if (left && plan.students.some(({ attemptId }) => attemptId === left.attemptId)) {
    const opened = openStudent(state, left.attemptId);
    // The piece it stood at may be none that this version asks for.
    const stays = left.spot === null || findPiece(plan.rubric, left.spot) !== undefined;
    return { ...opened, spot: stays ? left.spot : opened.spot, skipped: left.skipped };
  }
  const first = plan.students.find((student) => {
    const { standing, finished, unread } = studentStatus(state, student);
    return standing === 'expected' && !finished && (plan.mayFinish || unread > 0);
  });
  return openStudent(state, first?.attemptId ?? state.attemptId);
}

export function placeOf({ attemptId, spot, order, skipped }: RoundState): Place {
  return { attemptId, spot, order, skipped };
}
