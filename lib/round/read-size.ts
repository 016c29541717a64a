import { TICKS_PER_INCH } from '@/lib/length';
import { nextSpot } from './cursor';
import { findPiece, isSameSpot } from './pieces';
import { priceSize } from './price-size';
import { pieceStateAt, recordOf, valueAt } from './record';
import { makeEvent, moved, recorded, refused, sourceOf } from './record-events';
import type { Mint, Outcome, Reading, RoundState, Spot } from './types';

/** Two presses of one gross reading are rarely the same to the last digit. */
const SAME_WITHIN = TICKS_PER_INCH / 32;

const NOTHING_TO_READ = 'Nothing is left to read. Tap a size to read it again.';

/** Keeps a reading where the cursor stands and moves on; one past the gross limit needs a second press. */
export function readSize(state: RoundState, mint: Mint, reading: Reading): Outcome {
  const { spot } = state;
  const place = spot && findPiece(state.plan.rubric, spot);
  if (!spot || !place) return refused(state, NOTHING_TO_READ);
  const barred = refuseSpot(state, spot);
  if (barred !== null) return refused(state, barred);
  const { line, label } = place;
  const price = priceSize(state.plan.rubric, line, spot.axis, reading.ticks);
  const deviation = reading.ticks - line.target[spot.axis];
  if (price.gross && !isConfirmed(state, spot, reading)) {
    const said = { kind: 'doubt' as const, label, axis: spot.axis, ticks: reading.ticks, deviation };
    return moved(
      state,
      { doubt: { attemptId: state.attemptId, spot, ticks: reading.ticks }, said },
      'refused',
    );
  }
  const cell = { lineId: spot.lineId, ordinal: spot.ordinal, what: spot.axis };
  const event = makeEvent(state, mint, cell, { kind: 'value', ticks: reading.ticks }, sourceOf(reading));
  const outcome = recorded(state, mint, [event], `${label}, ${spot.axis}`, {
    said: {
      kind: 'read',
      label,
      axis: spot.axis,
      ticks: reading.ticks,
      deviation,
      lose: price.lose,
    },
    sound: price.lose === 0 ? 'in' : 'off',
  });
  return advance(outcome, spot);
}

/** Why this person cannot record a size here as things stand. */
export function refuseSpot(state: RoundState, spot: Spot): string | null {
  const record = recordOf(state);
  if (pieceStateAt(record, spot) !== 'present')
    return 'This piece is not there to be measured. Tap it first.';
  const value = valueAt(record, { lineId: spot.lineId, ordinal: spot.ordinal, what: spot.axis });
  return value === 'conflict' && !state.plan.maySettle
    ? 'Two readings stand here: the teacher chooses between them.'
    : null;
}

function isConfirmed(state: RoundState, spot: Spot, reading: Reading): boolean {
  const { doubt } = state;
  return (
    doubt !== null &&
    doubt.attemptId === state.attemptId &&
    isSameSpot(doubt.spot, spot) &&
    Math.abs(doubt.ticks - reading.ticks) <= SAME_WITHIN
  );
}

/** The cursor to the next unread dimension; an entry half typed is dropped with the press it belonged to. */
export function advance(outcome: Outcome, from: Spot | null): Outcome {
  const { state } = outcome;
  return {
    ...outcome,
    state: { ...state, spot: nextSpot(state, from), keypad: { ...state.keypad, text: '' } },
  };
}
