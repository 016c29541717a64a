import { deviationInWords, lengthInWords } from '@/components/ui/length-in-words';
import { pointsAsText } from '@/components/ui/points-text';
import type { Length, Unit } from '@/lib/length';
import type { Points } from '@/lib/scoring';

/** What a size's cell can hold. `lose` is left out where the viewer must not see points. */
export type CellState =
  | { kind: 'unread' }
  | { kind: 'gauged' }
  | { kind: 'value'; deviation: Length; lose?: Points }
  | { kind: 'spoiled'; lose?: Points }
  | { kind: 'held' }
  | { kind: 'missing' }
  | { kind: 'excused' }
  | { kind: 'conflict'; readings: readonly [CellReading, CellReading] };

export type CellReading = Length | 'gauged' | 'spoiled';

function readingInWords(reading: CellReading, unit: Unit): string {
  return typeof reading === 'number' ? deviationInWords(reading, unit) : reading;
}

function losing(lose: Points | undefined): string {
  return lose === undefined ? '' : `, loses ${pointsAsText(lose)}`;
}

/** What a cell shows, in words. */
export function cellInWords(state: CellState, target: Length, unit: Unit): string {
  switch (state.kind) {
    case 'unread':
      return `not read, target ${lengthInWords(target, unit)}`;
    case 'value':
      return `${deviationInWords(state.deviation, unit)}${losing(state.lose)}`;
    case 'spoiled':
      return `spoiled${losing(state.lose)}`;
    case 'conflict': {
      const [first, second] = state.readings;
      return `two readings: ${readingInWords(first, unit)}, and ${readingInWords(second, unit)}`;
    }
    default:
      return state.kind;
  }
}
