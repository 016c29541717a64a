import { nextSpot } from './cursor';
import { makeEvent, moved, recorded } from './record-events';
import { fullName, nextStudent, studentStatus } from './students';
import type { Mint, Outcome, RoundState, Student } from './types';

/** Takes a student up: the cursor stands on the first unread dimension. */
export function openStudent(state: RoundState, attemptId: string): RoundState {
  const there: RoundState = {
    ...state,
    attemptId,
    asked: null,
    doubt: null,
    keypad: { ...state.keypad, text: '' },
    caliper: { ...state.caliper, closed: false },
    skipped: state.skipped.filter((id) => id !== attemptId),
  };
  return { ...there, spot: nextSpot(there, null) };
}

/** On to the next present student; when nobody is left, the end of the round says who is missing from it. */
function goOn(state: RoundState): RoundState {
  const next = nextStudent(state);
  return next ? openStudent(state, next.attemptId) : { ...state, asked: { about: 'round-end' } };
}

export function inHand(state: RoundState): Student | undefined {
  return state.plan.students.find(({ attemptId }) => attemptId === state.attemptId);
}

/** Sizes still unread, or readings still torn, are said first; a second press finishes all the same. */
export function finish(state: RoundState, mint: Mint): Outcome {
  const student = inHand(state);
  if (!student) return moved(state, {});
  if (!state.plan.mayFinish) return goNext(state);
  const { unread, conflicts, standing } = studentStatus(state, student);
  if (standing !== 'expected') return goNext(state);
  if ((unread > 0 || conflicts > 0) && state.asked?.about !== 'finish') {
    return moved(state, { asked: { about: 'finish', unread, conflicts } }, 'refused');
  }
  const cell = { lineId: '', ordinal: 0, what: '@finish' };
  const name = fullName(student);
  const outcome = recorded(
    state,
    mint,
    [makeEvent(state, mint, cell, { kind: 'finish', done: true })],
    `${name}, finish`,
    { said: { kind: 'did', text: `${name} finished.` }, sound: 'in' },
  );
  return { ...outcome, state: goOn(outcome.state) };
}

/** On without finishing: what an aide does after a student. */
export function goNext(state: RoundState): Outcome {
  return moved(goOn(state), {});
}

export function skip(state: RoundState): Outcome {
  const next = goOn(state);
  return moved(next, { skipped: [...next.skipped.filter((id) => id !== state.attemptId), state.attemptId] });
}

export function setStanding(state: RoundState, mint: Mint, standing: 'absent' | 'expected'): Outcome {
  const student = inHand(state);
  if (!student) return moved(state, {});
  const name = fullName(student);
  const cell = { lineId: '', ordinal: 0, what: '@standing' };
  const text = standing === 'absent' ? `${name} absent.` : `${name} is here.`;
  const outcome = recorded(
    state,
    mint,
    [makeEvent(state, mint, cell, { kind: 'standing', standing })],
    `${name}, ${standing === 'absent' ? 'absent' : 'here'}`,
    { said: { kind: 'did', text } },
  );
  return standing === 'absent' ? { ...outcome, state: goOn(outcome.state) } : outcome;
}
