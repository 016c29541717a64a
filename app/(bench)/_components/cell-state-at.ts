import type { CellReading, CellState } from '@/components/rule/cell-state';
import type { PiecePlace } from '@/lib/round/pieces';
import { type BenchRecord, headsAt, valueAt } from '@/lib/round/record';
import type { BenchEvent } from '@/lib/round/types';
import type { Axis, ScoreSheet } from '@/lib/scoring';

const OTHER: Record<Axis, Axis> = { thickness: 'width', width: 'thickness', length: 'length' };

/** What a size's cell shows: the reading as it was taken there, and what it loses as the engine scored it. */
export function cellStateAt(
  record: BenchRecord,
  sheet: ScoreSheet,
  { line, ordinal }: PiecePlace,
  axis: Axis,
): CellState {
  const cell = { lineId: line.id, ordinal, what: axis };
  const value = valueAt(record, cell);
  if (value === null) return { kind: 'unread' };
  if (value === 'conflict') {
    const [first, second] = headsAt(record, cell);
    return {
      kind: 'conflict',
      readings: [shownReading(first, line.target[axis]), shownReading(second, line.target[axis])],
    };
  }
  const piece = sheet.pieces.find((each) => each.lineId === line.id && each.ordinal === ordinal);
  const scoredOn = piece?.swapped ? OTHER[axis] : axis;
  const size = piece?.sizes?.[scoredOn];
  switch (value.kind) {
    case 'value':
      return {
        kind: 'value',
        deviation: size?.deviation ?? value.ticks - line.target[axis],
        lose: size?.lose ?? 0,
      };
    case 'spoiled':
      return { kind: 'spoiled', lose: size?.lose ?? 0 };
    case 'gauged':
    case 'excused':
      return { kind: value.kind };
    default:
      return { kind: 'unread' };
  }
}

function shownReading(event: BenchEvent | undefined, target: number): CellReading {
  if (event?.value.kind === 'value') return event.value.ticks - target;
  return event?.value.kind === 'spoiled' ? 'spoiled' : 'gauged';
}
