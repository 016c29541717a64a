import type { EventRow } from '@/db/queries/sheets';
import { cellValueSchema } from '../cells';
import type { CellEvent } from '../derive';
import { INSTRUMENTS, type ReadingEvent } from '../protocol';
import { fingerprint } from './fingerprint';

/** A stored row as the derivation takes it. */
export function asCellEvent(row: EventRow): CellEvent {
  return {
    id: row.id,
    side: row.side,
    cell: { lineId: row.lineId, ordinal: row.ordinal, what: row.what },
    value: cellValueSchema.parse(row.value),
    supersedes: row.supersedes,
    capturedAt: row.capturedAt.toISOString(),
    authorId: row.authorId,
  };
}

/** A stored row as the device sent it. */
export function asReadingEvent(row: EventRow): ReadingEvent {
  const { id, side, cell, value, capturedAt, authorId } = asCellEvent(row);
  return {
    id,
    attemptId: row.attemptId,
    side,
    cell: { ...cell, what: cell.what },
    value,
    typed: row.typed,
    unit: row.unit,
    instrument: INSTRUMENTS.find((name) => name === row.instrument) ?? null,
    supersedes: row.supersedes,
    sequence: row.sequence,
    capturedAt,
    authorId,
  };
}

export function storedFingerprint(row: EventRow): string {
  return fingerprint(row.sittingId, row.deviceId, asReadingEvent(row));
}
