import { AXES } from '@/lib/scoring';
import type { CellValue } from '@/lib/sync/cells';
import { isUnread, nextSpot } from './cursor';
import { findPiece, type PiecePlace } from './pieces';
import { advance, refuseSpot } from './read-size';
import { pieceStateAt, recordOf, valueAt } from './record';
import { makeEvent, moved, recorded, refused } from './record-events';
import type { BenchEvent, Mint, Outcome, RoundState } from './types';

/** The words beside a piece that is set aside. */
export const HELD_NOTES = ['other name on it', 'no name on it', 'in dispute'] as const;

const NO_PIECE = 'Tap a piece first.';

/** Opens the choice that a second tap answers; the same key again closes it. */
export function ask(state: RoundState, about: 'missing' | 'held' | 'spoiled' | 'work'): Outcome {
  if (state.asked?.about === about) return moved(state, { asked: null });
  if (about === 'work') return moved(state, { asked: { about } });
  const { spot } = state;
  if (!spot) return refused(state, NO_PIECE);
  return moved(state, { asked: { about, lineId: spot.lineId, ordinal: spot.ordinal }, doubt: null });
}

function askedPiece(
  state: RoundState,
  about: 'missing' | 'held' | 'spoiled' | 'found',
): PiecePlace | undefined {
  return state.asked?.about === about ? findPiece(state.plan.rubric, state.asked) : undefined;
}

/** Pieces of the line of which nothing is recorded: what "all the rest are missing" means. */
export function untouchedOfLine(state: RoundState, place: PiecePlace): number[] {
  const record = recordOf(state);
  return Array.from({ length: place.line.quantity }, (_, index) => index + 1).filter((ordinal) =>
    AXES.every((axis) => isUnread(record, { lineId: place.line.id, ordinal, axis })),
  );
}

/** A piece that is missing keeps no sizes: they are taken back with it, so that measured elsewhere stands out. */
function missingEvents(state: RoundState, mint: Mint, lineId: string, ordinal: number): BenchEvent[] {
  const record = recordOf(state);
  const cleared = AXES.flatMap((axis) => {
    const cell = { lineId, ordinal, what: axis };
    const value = valueAt(record, cell);
    if (value === null || (value === 'conflict' && !state.plan.maySettle)) return [];
    return [makeEvent(state, mint, cell, { kind: 'cleared' })];
  });
  const missing: CellValue = { kind: 'state', state: 'missing' };
  return [...cleared, makeEvent(state, mint, { lineId, ordinal, what: 'piece' }, missing)];
}

export function markMissing(state: RoundState, mint: Mint, scope: 'piece' | 'line'): Outcome {
  const place = askedPiece(state, 'missing');
  if (!place) return refused(state, NO_PIECE);
  const ordinals = scope === 'piece' ? [place.ordinal] : untouchedOfLine(state, place);
  const made = ordinals.flatMap((ordinal) => missingEvents(state, mint, place.line.id, ordinal));
  if (made.length === 0) return refused(state, 'Every piece of this line has something recorded.');
  const label = scope === 'piece' ? place.label : place.line.label;
  const text = ordinals.length > 1 ? `${ordinals.length} of ${label} missing.` : `${label} missing.`;
  return leave(
    recorded(state, mint, made, `${label}, missing`, { said: { kind: 'did', text }, sound: 'off' }),
  );
}

export function markHeld(state: RoundState, mint: Mint, note: string): Outcome {
  const place = askedPiece(state, 'held');
  if (!place) return refused(state, NO_PIECE);
  const { line, ordinal, label } = place;
  const cell = { lineId: line.id, ordinal, what: 'piece' };
  const made = [makeEvent(state, mint, cell, { kind: 'state', state: 'held', note })];
  return leave(
    recorded(state, mint, made, `${label}, held`, {
      said: { kind: 'did', text: `${label} held: ${note}.` },
      sound: 'off',
    }),
  );
}

/** It is here after all: the piece can be measured, and what was measured of it counts again. */
export function markFound(state: RoundState, mint: Mint): Outcome {
  const place = askedPiece(state, 'found');
  if (!place) return refused(state, NO_PIECE);
  const { line, ordinal, label } = place;
  const cell = { lineId: line.id, ordinal, what: 'piece' };
  const outcome = recorded(
    state,
    mint,
    [makeEvent(state, mint, cell, { kind: 'state', state: 'present' })],
    `${label}, here`,
    { said: { kind: 'did', text: `${label} is here.` }, sound: 'in' },
  );
  const first = AXES.map((axis) => ({ lineId: line.id, ordinal, axis })).find((spot) =>
    isUnread(recordOf(outcome.state), spot),
  );
  return { ...outcome, state: { ...outcome.state, spot: first ?? nextSpot(outcome.state, state.spot) } };
}

export function markSpoiled(state: RoundState, mint: Mint, scope: 'size' | 'piece'): Outcome {
  const place = askedPiece(state, 'spoiled');
  const { spot } = state;
  if (!place || !spot) return refused(state, NO_PIECE);
  const { line, ordinal, label } = place;
  const record = recordOf(state);
  const axes =
    scope === 'size'
      ? [spot.axis]
      : AXES.filter((axis) => isUnread(record, { lineId: line.id, ordinal, axis }));
  const barred = refuseSpot(state, { lineId: line.id, ordinal, axis: spot.axis });
  if (barred !== null) return refused(state, barred);
  if (axes.length === 0) return refused(state, 'Every size of this piece is read.');
  const made = axes.map((axis) =>
    makeEvent(state, mint, { lineId: line.id, ordinal, what: axis }, { kind: 'spoiled' }),
  );
  const what = scope === 'size' ? `${label}, ${spot.axis}` : label;
  return advance(
    recorded(state, mint, made, `${what}, spoiled`, {
      said: { kind: 'did', text: `${what} spoiled.` },
      sound: 'off',
    }),
    spot,
  );
}

/** The cursor leaves a piece that is no longer there to be measured. */
function leave(outcome: Outcome): Outcome {
  const { spot } = outcome.state;
  const stays = spot !== null && pieceStateAt(recordOf(outcome.state), spot) === 'present';
  return stays ? outcome : advance(outcome, spot);
}
