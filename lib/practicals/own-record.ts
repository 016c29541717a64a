import { listPieces, listSpots } from '@/lib/round/pieces';
import { type BenchRecord, headsAt, pieceStateAt, valueAt } from '@/lib/round/record';
import type { BenchEvent, Mint, Spot } from '@/lib/round/types';
import { AXES, projectAttempt, type Rubric, type ScoreSheet, scoreAttempt } from '@/lib/scoring';
import type { Cell, CellValue } from '@/lib/sync/cells';
import { deriveAttempt, deriveCells } from '@/lib/sync/derive';

/** An event of a student's own side: made as the bench's are, and kept and sent the same way. */
export type OwnEvent = BenchEvent;

/** A student's own record of one attempt. */
export type OwnRecord = BenchRecord;

export const LOCK_CELL: Cell = { lineId: '', ordinal: 0, what: '@lock' };

export function ownRecordOf(events: readonly OwnEvent[]): OwnRecord {
  return { cells: deriveCells(events, 'own'), derived: deriveAttempt(events, 'own') };
}

/**
 * Whether a lock still waits for this size: its piece is not missing, and it holds no reading, no "spoiled" and no
 * "couldn't read", or two that differ.
 */
export function isOpen(record: OwnRecord, { lineId, ordinal, axis }: Spot): boolean {
  if (pieceStateAt(record, { lineId, ordinal }) === 'missing') return false;
  const value = valueAt(record, { lineId, ordinal, what: axis });
  return value === null || value === 'conflict';
}

export function listOpen(rubric: Rubric, record: OwnRecord): Spot[] {
  return listSpots(rubric, 'piece').filter((spot) => isOpen(record, spot));
}

/** The open size after a spot in cut-list order, going round to the first; null when none is left. */
export function nextOpen(rubric: Rubric, record: OwnRecord, after: Spot | null): Spot | null {
  const spots = listSpots(rubric, 'piece');
  const at = spots.findIndex(
    (spot) => spot.lineId === after?.lineId && spot.ordinal === after.ordinal && spot.axis === after.axis,
  );
  return [...spots.slice(at + 1), ...spots.slice(0, at + 1)].find((spot) => isOpen(record, spot)) ?? null;
}

/** How far a student has come with measuring: sizes in all, and those a lock no longer waits for. */
export function countOwnSizes(rubric: Rubric, record: OwnRecord): { of: number; done: number } {
  const of = listPieces(rubric).length * AXES.length;
  return { of, done: of - listOpen(rubric, record).length };
}

export interface OwnSource {
  typed: string | null;
  unit: 'in' | 'mm' | null;
  instrument: OwnEvent['instrument'];
}

const NO_SOURCE: OwnSource = { typed: null, unit: null, instrument: null };

/** One new event of the student's own, in place of everything that stands in its cell now. */
export function makeOwnEvent(
  record: OwnRecord,
  mint: Mint,
  { attemptId, personId }: { attemptId: string; personId: string },
  entry: { cell: Cell; value: CellValue; source?: OwnSource },
): OwnEvent {
  return {
    id: mint.id(),
    attemptId,
    side: 'own',
    cell: entry.cell,
    value: entry.value,
    ...(entry.source ?? NO_SOURCE),
    supersedes: headsAt(record, entry.cell).map(({ id }) => id),
    capturedAt: mint.now(),
    authorId: personId,
  };
}

/**
 * What the own readings would score: the engine's sheet, without bonus and lateness, and without readings of what the
 * rubric no longer asks for.
 */
export function predictedSheet(rubric: Rubric, record: OwnRecord): ScoreSheet {
  const { attempt } = projectAttempt(rubric, record.derived.attempt);
  return scoreAttempt(rubric, { ...attempt, bonus: 0, daysLate: 0 });
}
