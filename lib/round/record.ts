import { projectAttempt, type Rubric, type ScoreSheet, scoreAttempt } from '@/lib/scoring';
import { type Cell, type CellValue, cellKey } from '@/lib/sync/cells';
import { type CellState, type DerivedAttempt, deriveAttempt, deriveCells } from '@/lib/sync/derive';
import type { BenchEvent, RoundState } from './types';

/** One attempt as the bench has it. */
export interface BenchRecord {
  cells: ReadonlyMap<string, CellState<BenchEvent>>;
  derived: DerivedAttempt;
}

const records = new WeakMap<readonly BenchEvent[], BenchRecord>();
const NOTHING: readonly BenchEvent[] = [];

/** Derived once for each list of events; lists are never changed, only replaced. */
export function recordOf(state: RoundState, attemptId = state.attemptId): BenchRecord {
  const events = state.events.get(attemptId) ?? NOTHING;
  const known = records.get(events);
  if (known) return known;
  const record = { cells: deriveCells(events, 'bench'), derived: deriveAttempt(events, 'bench') };
  records.set(events, record);
  return record;
}

const sheets = new WeakMap<BenchRecord, ScoreSheet>();

/** What the record costs so far, by the sitting's rubric; what that does not ask for costs nothing. */
export function sheetOf(rubric: Rubric, record: BenchRecord): ScoreSheet {
  const known =
    sheets.get(record) ?? scoreAttempt(rubric, projectAttempt(rubric, record.derived.attempt).attempt);
  sheets.set(record, known);
  return known;
}

export type CellReading = CellValue | 'conflict' | null;

/** What stands in a cell: null when it is not read, `conflict` while its readings differ. */
export function valueAt(record: BenchRecord, cell: Cell): CellReading {
  const state = record.cells.get(cellKey(cell));
  if (!state) return null;
  if (state.value === null) return 'conflict';
  return state.value.kind === 'cleared' ? null : state.value;
}

export function headsAt(record: BenchRecord, cell: Cell): readonly BenchEvent[] {
  return record.cells.get(cellKey(cell))?.heads ?? [];
}

export type PieceState = 'present' | 'missing' | 'held' | 'excused' | 'conflict';

/** A piece is in conflict when its own cell is, or when it was called missing here and measured there. */
export function pieceStateAt(record: BenchRecord, at: { lineId: string; ordinal: number }): PieceState {
  const { lineId, ordinal } = at;
  const torn = record.derived.conflicts.some(
    (cell) => cell.lineId === lineId && cell.ordinal === ordinal && cell.what === 'piece',
  );
  if (torn) return 'conflict';
  const value = valueAt(record, { lineId, ordinal, what: 'piece' });
  return value !== null && value !== 'conflict' && value.kind === 'state' ? value.state : 'present';
}
