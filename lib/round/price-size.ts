import type { Length } from '@/lib/length';
import { type Axis, type Line, type Points, type Rubric, scoreAttempt } from '@/lib/scoring';

export interface SizePrice {
  lose: Points;
  band: number | 'beyond';
  /** So far off that it is not that part. */
  gross: boolean;
}

const alone = new WeakMap<Line, { of: Rubric; rubric: Rubric }>();

/** The rubric of one piece of the line by itself, so that the engine itself prices a single size. */
function rubricOfOne(rubric: Rubric, line: Line): Rubric {
  const known = alone.get(line);
  if (known?.of === rubric) return known.rubric;
  const made = { ...rubric, lines: [{ ...line, quantity: 1 }], workChecks: [] };
  alone.set(line, { of: rubric, rubric: made });
  return made;
}

/** What a reading on one axis would lose by itself. */
export function priceSize(rubric: Rubric, line: Line, axis: Axis, ticks: Length): SizePrice {
  const sheet = scoreAttempt(rubricOfOne(rubric, line), {
    pieces: [
      {
        lineId: line.id,
        ordinal: 1,
        state: 'present',
        sizes: { [axis]: { kind: 'value', ticks } },
        checks: {},
      },
    ],
    work: {},
    bonus: 0,
    daysLate: 0,
  });
  const piece = sheet.pieces[0];
  const size = piece?.sizes?.[axis];
  if (!piece || !size || (typeof size.band !== 'number' && size.band !== 'beyond')) {
    throw new Error('the engine gave no price for a reading');
  }
  return { lose: size.lose, band: size.band, gross: piece.gross };
}
