import { findPiece } from '@/lib/round/pieces';
import type { BenchEvent, Press, Spot } from '@/lib/round/types';
import { AXES, type Rubric } from '@/lib/scoring';
import { hasCell } from '../cells';
import type { StoredPress } from './round-store';

/**
 * Stored presses as undo takes them back: each with a name and the cell it was made at. What was recorded of cells that
 * the rubric does not have is left out, as it is of the round.
 */
export function pressesOf(rubric: Rubric, stored: readonly StoredPress[]): Press[] {
  return stored.flatMap(({ id, attemptId, events }) => {
    const known = events.filter(({ cell }) => hasCell(rubric, cell));
    if (known.length === 0) return [];
    return [
      {
        id,
        attemptId,
        spot: spotOf(known[0]),
        eventIds: known.map((event) => event.id),
        label: labelOf(rubric, known),
      },
    ];
  });
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
