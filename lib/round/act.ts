import { parseLength } from '@/lib/length';
import { AXES } from '@/lib/scoring';
import { answerUnit, stepBack, takeInstrument } from './caliper';
import { nextSpot } from './cursor';
import { gaugeLine, gaugeRest, passChecks, setCheck } from './gauge';
import { otherUnit, pressKey } from './keypad';
import { ask, markFound, markHeld, markMissing, markSpoiled } from './piece-state';
import { findPiece } from './pieces';
import { readSize } from './read-size';
import { pieceStateAt, recordOf, valueAt } from './record';
import { moved, refused } from './record-events';
import { settle } from './settle';
import type { Action, Mint, Outcome, RoundState } from './types';
import { undo } from './undo';
import { finish, goNext, openStudent, setStanding, skip } from './walk';

/** The bench: what one press does. Pure; ids and the time come from the mint. */
export function act(state: RoundState, action: Action, mint: Mint): Outcome {
  switch (action.do) {
    case 'point':
      return point(state, action);
    case 'read':
      return readSize(state, mint, action.reading);
    case 'key':
      return typeKey(state, action.key);
    case 'keep':
      return keepTyped(state, mint, action.text ?? state.keypad.text);
    case 'instrument':
      return takeInstrument(state, mint, action.text, action.at);
    case 'answer-unit':
      return answerUnit(state, mint, action.yes);
    case 'caliper-unit':
      return moved(state, { caliper: { ...state.caliper, unit: action.unit, denied: [] } });
    case 'step-back':
      return stepBack(state);
    case 'line-ok':
      return gaugeLine(state, mint);
    case 'rest-ok':
      return gaugeRest(state, mint);
    case 'all-good':
      return passChecks(state, mint);
    case 'ask':
      return ask(state, action.about);
    case 'cancel':
      return moved(state, { asked: null, doubt: null });
    case 'missing':
      return markMissing(state, mint, action.scope);
    case 'held':
      return markHeld(state, mint, action.note);
    case 'spoiled':
      return markSpoiled(state, mint, action.scope);
    case 'found':
      return markFound(state, mint);
    case 'check':
      return setCheck(state, mint, action.checkId, action.level);
    case 'settle':
      return settle(state, mint, action.value);
    case 'undo':
      return undo(state, mint);
    case 'finish':
      return finish(state, mint);
    case 'next':
      return goNext(state);
    case 'skip':
      return skip(state);
    case 'open':
      return moved(openStudent(state, action.attemptId), { said: null });
    case 'standing':
      return setStanding(state, mint, action.standing);
    case 'order':
      return moved({ ...state, order: action.order }, { asked: null });
  }
}

/** A tap on a cell: the cursor goes there, or the choice that the cell calls for opens. */
function point(
  state: RoundState,
  { lineId, ordinal, what }: { lineId: string; ordinal: number; what: string },
): Outcome {
  if (!findPiece(state.plan.rubric, { lineId, ordinal })) return refused(state, 'There is no such piece.');
  const record = recordOf(state);
  const cell = { lineId, ordinal, what };
  const pieceState = pieceStateAt(record, { lineId, ordinal });
  const calm = { doubt: null, said: null, keypad: { ...state.keypad, text: '' } };
  if (pieceState === 'conflict') {
    return moved(state, { ...calm, asked: { about: 'conflict', cell: { lineId, ordinal, what: 'piece' } } });
  }
  if (pieceState !== 'present') return moved(state, { ...calm, asked: { about: 'found', lineId, ordinal } });
  if (what === 'checks') {
    const same =
      state.asked?.about === 'checks' && state.asked.lineId === lineId && state.asked.ordinal === ordinal;
    return moved(state, { ...calm, asked: same ? null : { about: 'checks', lineId, ordinal } });
  }
  if (valueAt(record, cell) === 'conflict')
    return moved(state, { ...calm, asked: { about: 'conflict', cell } });
  const axis = AXES.find((each) => each === what);
  if (axis) return moved(state, { ...calm, asked: null, spot: { lineId, ordinal, axis } });
  const first = nextSpot({ ...state }, null);
  const own = AXES.map((each) => ({ lineId, ordinal, axis: each }));
  const unread = own.find(({ axis: each }) => valueAt(record, { lineId, ordinal, what: each }) === null);
  return moved(state, { ...calm, asked: null, spot: unread ?? own[0] ?? first });
}

function typeKey(state: RoundState, key: string): Outcome {
  const { keypad } = state;
  if (key === 'unit')
    return moved(state, { keypad: { ...keypad, unit: otherUnit(keypad.unit) }, doubt: null });
  const text = pressKey(keypad.text, key);
  return text === null
    ? refused(state, 'That key does nothing here.')
    : moved(state, { keypad: { ...keypad, text }, said: null, doubt: null });
}

function keepTyped(state: RoundState, mint: Mint, text: string): Outcome {
  const { unit } = state.keypad;
  const parsed = parseLength(text, unit);
  if (!parsed.ok) return refused(state, parsed.reason);
  if (parsed.ticks <= 0) return refused(state, 'A piece has a size above zero.');
  return readSize(state, mint, {
    ticks: parsed.ticks,
    typed: text.trim(),
    unit: parsed.unit,
    instrument: 'keyed',
  });
}
