import 'server-only';
import type { OwnEventRow } from '@/db/queries/own';
import type { OwnEvent } from '@/lib/practicals/own-record';
import { cellValueSchema } from '@/lib/sync/cells';
import { INSTRUMENTS } from '@/lib/sync/protocol';

/** A stored row of the own side as the student's device handles it. */
export function ownEventOf(row: OwnEventRow): OwnEvent {
  const { id, attemptId, side, lineId, ordinal, what, typed, unit, supersedes, authorId } = row;
  return {
    id,
    attemptId,
    side,
    cell: { lineId, ordinal, what },
    value: cellValueSchema.parse(row.value),
    typed,
    unit,
    instrument: INSTRUMENTS.find((name) => name === row.instrument) ?? null,
    supersedes,
    capturedAt: row.capturedAt.toISOString(),
    authorId,
  };
}
