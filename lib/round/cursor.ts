import type { Rubric } from '@/lib/scoring';
import { isSameSpot, listSpots } from './pieces';
import { type BenchRecord, pieceStateAt, recordOf, valueAt } from './record';
import type { RoundState, Spot } from './types';

/** Whether the cursor should stop here: nothing is recorded, and the piece is there to be measured. */
export function isUnread(record: BenchRecord, { lineId, ordinal, axis }: Spot): boolean {
  return (
    pieceStateAt(record, { lineId, ordinal }) === 'present' &&
    valueAt(record, { lineId, ordinal, what: axis }) === null
  );
}

export function listUnread(rubric: Rubric, record: BenchRecord, order: 'piece' | 'line' = 'piece'): Spot[] {
  return listSpots(rubric, order).filter((spot) => isUnread(record, spot));
}

/** The next unread dimension after a spot, going round to the first; null when everything is read. */
export function nextSpot(state: RoundState, after: Spot | null): Spot | null {
  const record = recordOf(state);
  const spots = listSpots(state.plan.rubric, state.order);
  const start = spots.findIndex((spot) => isSameSpot(spot, after)) + 1;
  const round = [...spots.slice(start), ...spots.slice(0, start)];
  return round.find((spot) => isUnread(record, spot)) ?? null;
}

/** The dimension before a spot in the order of walking, read or not; from the end when there is no cursor. */
export function spotBefore(state: RoundState, spot: Spot | null): Spot | null {
  const record = recordOf(state);
  const spots = listSpots(state.plan.rubric, state.order).filter(
    (each) => pieceStateAt(record, each) === 'present' || isSameSpot(each, spot),
  );
  const index = spot ? spots.findIndex((each) => isSameSpot(each, spot)) : spots.length;
  return spots[index - 1] ?? spot;
}
