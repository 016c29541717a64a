import type { EventRow } from '@/db/queries/sheets';
import { cellValueSchema } from '../cells';
import type { CellEvent } from '../derive';

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
