import { type Attempt, AXES, type Rubric } from '@/lib/scoring';

/**
 * The same thresholds with everything that makes rescoring usable taken away: no ids, no objects, no states, no
 * refusals, every attempt already one row of numbers. What the arithmetic alone costs.
 */
export interface Flat {
  attempts: number;
  pieces: number;
  bands: number;
  grossEdge: number;
  /** By piece and axis. */
  targets: Float64Array;
  /** By piece, axis, side and band, margin included. */
  edges: Float64Array;
  loses: Float64Array;
  worths: Float64Array;
  /** By attempt, piece and axis. */
  readings: Float64Array;
  /** By attempt and piece: what the checks lose. */
  checkLoses: Float64Array;
}

/** For rubrics whose sides all have the same number of bands, and attempts that hold every piece in order. */
export function layOutBare(rubric: Rubric, attempts: readonly Attempt[]): Flat {
  const places = rubric.lines.flatMap((line) => Array.from({ length: line.quantity }, () => line));
  const sizes = places.flatMap((line) => AXES.map((axis) => line.sizes[axis]));
  const sides = sizes.flatMap((rule) => [
    { bands: rule.over, beyond: rule.beyondOver },
    { bands: rule.under, beyond: rule.beyondUnder },
  ]);
  const recorded = attempts.flatMap(({ pieces }) => pieces.map((piece, at) => ({ piece, line: places[at] })));
  return {
    attempts: attempts.length,
    pieces: places.length,
    bands: sides[0]?.bands.length ?? 0,
    grossEdge: (rubric.grossLimit ?? Number.POSITIVE_INFINITY) + rubric.margin,
    targets: Float64Array.from(places.flatMap(({ target }) => AXES.map((axis) => target[axis]))),
    edges: Float64Array.from(
      sides.flatMap(({ bands }) => [...bands.map(({ within }) => within + rubric.margin), Infinity]),
    ),
    loses: Float64Array.from(
      sides.flatMap(({ bands, beyond }) => [...bands.map(({ lose }) => lose), beyond]),
    ),
    worths: Float64Array.from(places.map(({ worth }) => worth)),
    readings: Float64Array.from(
      recorded.flatMap(({ piece }) =>
        AXES.map((axis) => {
          const reading = piece.sizes[axis];
          return reading?.kind === 'value' ? reading.ticks : Number.NaN;
        }),
      ),
    ),
    checkLoses: Float64Array.from(
      recorded.map(({ piece, line }) =>
        (line?.checks ?? []).reduce(
          (sum, { id, levels }) => sum + (levels[piece.checks[id] ?? 0]?.lose ?? 0),
          0,
        ),
      ),
    ),
  };
}

/** What each attempt loses, thickness and width taken whichever way round is cheaper. */
export function loseBare(flat: Flat): Float64Array {
  const { attempts, pieces, bands, grossEdge, targets, edges, loses, worths, readings, checkLoses } = flat;
  const lost = new Float64Array(attempts);
  let gross = false;

  function lose(size: number, reading: number): number {
    const deviation = reading - (targets[size] ?? 0);
    const distance = Math.abs(deviation);
    if (distance > grossEdge) gross = true;
    let step = (size * 2 + (deviation < 0 ? 1 : 0)) * (bands + 1);
    while (distance > (edges[step] ?? 0)) step += 1;
    return loses[step] ?? 0;
  }

  for (let attempt = 0; attempt < attempts; attempt += 1) {
    let sum = 0;
    for (let piece = 0; piece < pieces; piece += 1) {
      const size = piece * 3;
      const at = (attempt * pieces + piece) * 3;
      const worth = worths[piece] ?? 0;
      const first = readings[at] ?? 0;
      const second = readings[at + 1] ?? 0;
      gross = false;
      const rest = lose(size + 2, readings[at + 2] ?? 0) + (checkLoses[attempt * pieces + piece] ?? 0);
      const lengthGross = gross;
      const laid = lose(size, first) + lose(size + 1, second) + rest;
      const laidLose = gross ? worth : Math.min(laid, worth);
      gross = lengthGross;
      const turned = lose(size, second) + lose(size + 1, first) + rest;
      const turnedLose = gross ? worth : Math.min(turned, worth);
      sum += Math.min(laidLose, turnedLose);
    }
    lost[attempt] = sum;
  }
  return lost;
}
