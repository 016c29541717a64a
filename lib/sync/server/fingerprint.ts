import { valueKey } from '../cells';
import type { ReadingEvent } from '../protocol';

/** One text for all that an event says: equal for a repeated push, different for another reading under its id. */
export function fingerprint(sittingId: string, deviceId: string, event: ReadingEvent): string {
  const { attemptId, side, cell, value, typed, unit, instrument, supersedes, sequence } = event;
  return JSON.stringify([
    sittingId,
    deviceId,
    attemptId,
    side,
    cell.lineId,
    cell.ordinal,
    cell.what,
    valueKey(value),
    typed,
    unit,
    instrument,
    supersedes,
    sequence,
    new Date(event.capturedAt).toISOString(),
    event.authorId,
  ]);
}
