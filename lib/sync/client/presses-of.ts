import { findPiece } from '@/lib/round/pieces';
import type { BenchEvent, Press, Spot } from '@/lib/round/types';
import { AXES, type Rubric } from '@/lib/scoring';
import type { StoredPress } from './round-store';

/** Stored presses as undo takes them back: each with a name and the cell it was made at. */
export function pressesOf(rubric: Rubric, stored: readonly StoredPress[]): Press[] {
  return stored.map(({ id, attemptId, events }) => ({
    id,
    attemptId,
    spot: spotOf(events[0]),
    eventIds: events.map((event) => event.id),
    label: labelOf(rubric, events),
  }));
}

function spotOf(event: BenchEvent | undefined): Spot | null {
  const axis = AXES.find((each) => each === event?.cell.what);
  return event && axis ? { lineId: event.cell.lineId, ordinal: event.cell.ordinal, axis } : null;
}

function labelOf(rubric: Rubric, [event, ...more]: readonly BenchEvent[]): string {
  if (!event) return 'nothing';
  if (event.cell.what === '@finish') return 'finish';
  if (event.cell.what === '@standing') return 'absent or here';
  const place = findPiece(rubric, event.cell);
  if (more.length > 0) return event.value.kind === 'gauged' ? `${more.length + 1} sizes gauged` : 'several';
  return place ? `${place.label}, ${event.cell.what}` : event.cell.what;
}
