import { type Attempt, AXES, type Piece, type Reading } from '@/lib/scoring';
import { type Cell, type CellValue, cellKey, type Side, valueKey } from './cells';

/** As much of an event as the state of its cell depends on. */
export interface CellEvent {
  id: string;
  side: Side;
  cell: Cell;
  value: CellValue;
  supersedes: readonly string[];
  capturedAt: string;
  authorId: string;
}

/** The present state of a cell: one value, or two and more that a person must choose between. */
export interface CellState<Event extends CellEvent = CellEvent> {
  cell: Cell;
  heads: Event[];
  /** The value all heads agree on; null while they differ. */
  value: CellValue | null;
}

export type Standing = 'expected' | 'absent' | 'excused' | 'zero';

export interface DerivedAttempt {
  attempt: Attempt;
  standing: Standing;
  finished: boolean;
  lock: { receipt: string; at: string } | null;
  /** The receipt that the bench took at pick-up. */
  receiptTaken: string | null;
  conflicts: Cell[];
  /** Own sizes the student marked as "couldn't read". */
  unreadable: Cell[];
  /** When the last size, piece or check of this side was recorded, by the device's clock. */
  measuredAt: string | null;
}

/**
 * Which events of each cell stand: those that no other event of the same cell supersedes. Heads that hold equal
 * values merge by themselves. Order of arrival and clocks do not matter; a repeated event counts once.
 */
export function deriveCells<Event extends CellEvent>(
  events: readonly Event[],
  side: Side,
): Map<string, CellState<Event>> {
  const byCell = new Map<string, Map<string, Event>>();
  for (const event of events) {
    if (event.side !== side) continue;
    const key = cellKey(event.cell);
    const known = byCell.get(key) ?? new Map<string, Event>();
    known.set(event.id, event);
    byCell.set(key, known);
  }
  return new Map([...byCell].map(([key, known]) => [key, cellState([...known.values()])]));
}

function cellState<Event extends CellEvent>(events: Event[]): CellState<Event> {
  const superseded = new Set(events.flatMap((event) => event.supersedes));
  const heads = events.filter((event) => !superseded.has(event.id));
  const [first, ...others] = heads.length > 0 ? heads : events;
  if (!first) throw new Error('a cell without events has no state');
  const agreed = others.every((other) => valueKey(other.value) === valueKey(first.value));
  return { cell: first.cell, heads: [first, ...others], value: agreed ? first.value : null };
}

/**
 * One side's record of an attempt as the engine takes it. A cell in conflict counts as not read. At the bench a piece
 * that one person called missing while another measured it is in conflict too: marking it missing clears its sizes.
 */
export function deriveAttempt(events: readonly CellEvent[], side: Side): DerivedAttempt {
  const cells = deriveCells(events, side);
  const derived: DerivedAttempt = {
    attempt: { pieces: [], work: {}, bonus: 0, daysLate: 0 },
    standing: 'expected',
    finished: false,
    lock: null,
    receiptTaken: null,
    conflicts: [],
    unreadable: [],
    measuredAt: null,
  };
  const pieces = new Map<string, Piece>();
  for (const state of cells.values()) {
    if (state.cell.what === '@zero') continue;
    if (state.value === null) derived.conflicts.push(state.cell);
    else if (state.cell.lineId === '') applyToAttempt(derived, state, state.value);
    else applyToPiece(derived, pieces, state.cell, state.value);
    if (!state.cell.what.startsWith('@')) noteTime(derived, state);
  }
  derived.attempt.pieces = [...pieces.values()].filter(isRecorded);
  if (side === 'bench')
    derived.conflicts.push(...derived.attempt.pieces.filter(isContradicted).map(pieceCell));
  return derived;
}

function noteTime(derived: DerivedAttempt, state: CellState): void {
  for (const { capturedAt } of state.heads) {
    if (derived.measuredAt === null || capturedAt > derived.measuredAt) derived.measuredAt = capturedAt;
  }
}

function applyToAttempt(derived: DerivedAttempt, state: CellState, value: CellValue): void {
  if (value.kind === 'standing') derived.standing = value.standing;
  else if (value.kind === 'finish') derived.finished = value.done;
  else if (value.kind === 'days-late') derived.attempt.daysLate = value.days;
  else if (value.kind === 'receipt') derived.receiptTaken = value.receipt;
  else if (value.kind === 'level') derived.attempt.work[state.cell.what] = value.level;
  else if (value.kind === 'lock' && value.locked) {
    derived.lock = { receipt: value.receipt, at: state.heads[0]?.capturedAt ?? '' };
  }
}

function applyToPiece(
  derived: DerivedAttempt,
  pieces: Map<string, Piece>,
  cell: Cell,
  value: CellValue,
): void {
  const key = `${cell.lineId}/${cell.ordinal}`;
  const piece: Piece = pieces.get(key) ?? {
    lineId: cell.lineId,
    ordinal: cell.ordinal,
    state: 'present',
    sizes: {},
    checks: {},
  };
  pieces.set(key, piece);
  if (value.kind === 'state') piece.state = value.state;
  else if (value.kind === 'level') piece.checks[cell.what] = value.level;
  else if (value.kind === 'unreadable') derived.unreadable.push(cell);
  else {
    const axis = AXES.find((name) => name === cell.what);
    const reading = asReading(value);
    if (axis && reading) piece.sizes[axis] = reading;
  }
}

function asReading(value: CellValue): Reading | null {
  switch (value.kind) {
    case 'value':
      return { kind: 'value', ticks: value.ticks };
    case 'gauged':
    case 'spoiled':
    case 'excused':
      return { kind: value.kind };
    default:
      return null;
  }
}

/** A piece of which everything was taken back is not read, as if it had never been touched. */
function isRecorded(piece: Piece): boolean {
  return (
    piece.state !== 'present' || Object.keys(piece.sizes).length > 0 || Object.keys(piece.checks).length > 0
  );
}

function isContradicted(piece: Piece): boolean {
  return piece.state === 'missing' && Object.keys(piece.sizes).length > 0;
}

function pieceCell({ lineId, ordinal }: Piece): Cell {
  return { lineId, ordinal, what: 'piece' };
}
