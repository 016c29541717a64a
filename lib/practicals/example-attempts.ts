import { type Length, TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import {
  type Attempt,
  AXES,
  type Axis,
  type Check,
  type Line,
  type Piece,
  projectAttempt,
  type Reading,
  type Rubric,
  scoreAttempt,
} from '@/lib/scoring';
import type { Phrase } from './compare-types';

/** An invented attempt that shows what a rubric gives. */
export interface ExampleAttempt {
  id: 'perfect' | 'typical' | 'poor' | 'one' | 'line' | 'fence' | 'step' | 'missing' | 'gross';
  label: Phrase;
  attempt: Attempt;
}

/** The size that the examples of single errors are about. */
export interface ExampleSize {
  lineId: string;
  axis: Axis;
}

type Deviate = (line: Line, ordinal: number, axis: Axis) => Length;

/**
 * Attempts that show what a rubric gives: a perfect one; a typical one, with every third size one step off, by turns
 * under and over; a poor one, with every second size at the end of its last band, by turns, and the dearest fault of
 * the first check on every second piece. Then usual errors: one size short and the same size of the whole line shorter
 * still; every width out by a fence; every size one step over; one piece missing; one so far off that it is not
 * that part. Deviations are edges of the rubric's own bands, so that each example changes when the bands do. Sizes are
 * counted through the cut list. Pure; without a gross limit, or for one that leaves no length, that one is left out.
 */
export function exampleAttempts(rubric: Rubric, about?: ExampleSize): ExampleAttempt[] {
  const line = rubric.lines.find(({ id }) => id === about?.lineId) ?? rubric.lines[0];
  const last = rubric.lines.at(-1);
  if (!line || !last) return [];
  const axis = about?.axis ?? 'length';
  const [near, far] = pricedEdges(rubric, line, axis, 'under');
  const overWidth = pricedEdges(rubric, line, 'width', 'over')[0];
  const isOf = (each: Line) => each.id === line.id;
  const one: Deviate = (each, ordinal, on) => (isOf(each) && ordinal === 1 && on === axis ? -near : 0);
  const all: Deviate = (each, _, on) => (isOf(each) && on === axis ? -far : 0);
  return [
    { id: 'perfect', label: ['perfect: every size in its free band'], attempt: targetAttempt(rubric) },
    {
      id: 'typical',
      label: ['typical: every third size a step off'],
      attempt: attemptOf(rubric, byTurns(rubric, 3, 0)),
    },
    {
      id: 'poor',
      label: ['poor: every second size far off, and a check failed'],
      attempt: poorAttempt(rubric),
    },
    {
      id: 'one',
      label: shortBy(nameOne(line), axis, near),
      attempt: attemptOf(rubric, one),
    },
    ...(line.quantity > 1
      ? [
          {
            id: 'line' as const,
            label: shortBy(nameAll(line), axis, far),
            attempt: attemptOf(rubric, all),
          },
        ]
      : []),
    {
      id: 'fence',
      label: ['rip fence out: all widths ', { ticks: overWidth }, ' over'],
      attempt: attemptOf(rubric, (_, __, on) => (on === 'width' ? overWidth : 0)),
    },
    {
      id: 'step',
      label: ['every size one step over'],
      attempt: attemptOf(rubric, (each, _, on) => pricedEdges(rubric, each, on, 'over')[0]),
    },
    {
      id: 'missing',
      label: [`${nameOne(last)} missing`],
      attempt: withPiece(targetAttempt(rubric), last.id, (piece) => ({
        ...piece,
        state: 'missing',
        sizes: {},
        checks: {},
      })),
    },
    ...grossExample(rubric, last),
  ];
}

/** "end", or "one end" of several. */
function nameOne({ label, quantity }: Line): string {
  return quantity > 1 ? `one ${label}` : label;
}

function nameAll({ label, quantity }: Line): string {
  return quantity === 2 ? `both of ${label}` : `all ${quantity} of ${label}`;
}

function shortBy(what: string, axis: Axis, ticks: Length): Phrase {
  return axis === 'length' ? [`${what} `, { ticks }, ' short'] : [`${what}, ${axis} `, { ticks }, ' under'];
}

/** The far edges of the first band that costs, and of the last; past a lone free band, as much again. */
function pricedEdges(
  { unit }: Rubric,
  line: Line,
  axis: Axis,
  side: 'over' | 'under',
): [near: Length, far: Length] {
  const bands = line.sizes[axis][side];
  const free = bands.filter(({ lose }) => lose === 0).at(-1)?.within ?? 0;
  const priced = bands.filter(({ lose }) => lose > 0);
  const near = priced[0]?.within ?? Math.max(free * 2, FINE[unit]);
  return [near, priced.at(-1)?.within ?? near];
}

/** Every n-th size of the cut list off by its first (0) or last (1) priced edge, by turns under and over. */
function byTurns(rubric: Rubric, every: number, edge: 0 | 1): Deviate {
  const before = new Map<string, number>();
  rubric.lines.reduce((pieces, line) => {
    before.set(line.id, pieces);
    return pieces + line.quantity;
  }, 0);
  return (line, ordinal, axis) => {
    const count = ((before.get(line.id) ?? 0) + ordinal - 1) * AXES.length + AXES.indexOf(axis) + 1;
    if (count % every !== 0) return 0;
    const side = (count / every) % 2 === 1 ? 'under' : 'over';
    const off = pricedEdges(rubric, line, axis, side)[edge];
    return side === 'under' ? -off : off;
  };
}

function poorAttempt(rubric: Rubric): Attempt {
  const attempt = attemptOf(rubric, byTurns(rubric, 2, 1));
  attempt.pieces.forEach((piece, index) => {
    const check = rubric.lines.find(({ id }) => id === piece.lineId)?.checks[0];
    if (check && index % 2 === 0) piece.checks[check.id] = dearestLevel(check);
  });
  return attempt;
}

/** The level of a check that loses most. */
export function dearestLevel({ levels }: Check): number {
  const most = Math.max(...levels.map(({ lose }) => lose));
  return levels.findIndex(({ lose }) => lose === most);
}

/** Every piece there and every size on its target, every check passed. */
export function targetAttempt(rubric: Rubric): Attempt {
  return attemptOf(rubric, () => 0);
}

function attemptOf(rubric: Rubric, deviate: Deviate): Attempt {
  const pieces = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => pieceOf(line, index + 1, deviate)),
  );
  const work = Object.fromEntries(rubric.workChecks.map(({ id }) => [id, 0]));
  return { pieces, work, bonus: 0, daysLate: 0 };
}

function pieceOf(line: Line, ordinal: number, deviate: Deviate): Piece {
  const reading = (axis: Axis): Reading => {
    const ticks = line.target[axis] + deviate(line, ordinal, axis);
    return { kind: 'value', ticks: Math.max(1, ticks) };
  };
  const [thickness, width, length] = AXES.map(reading);
  return {
    lineId: line.id,
    ordinal,
    state: 'present',
    sizes: { thickness, width, length },
    checks: Object.fromEntries(line.checks.map(({ id }) => [id, 0])),
  };
}

function withPiece(attempt: Attempt, lineId: string, change: (piece: Piece) => Piece): Attempt {
  const pieces = attempt.pieces.map((piece) =>
    piece.lineId === lineId && piece.ordinal === 1 ? change(piece) : piece,
  );
  return { ...attempt, pieces };
}

const FINE = { in: TICKS_PER_INCH / 32, mm: TICKS_PER_MM / 2 };
const COARSE = { in: TICKS_PER_INCH / 8, mm: 2 * TICKS_PER_MM };

function grossExample(rubric: Rubric, line: Line): ExampleAttempt[] {
  if (rubric.grossLimit === null) return [];
  const coarse = COARSE[rubric.unit];
  const off = Math.ceil((rubric.grossLimit + rubric.margin + 1) / coarse) * coarse;
  if (line.target.length <= off) return [];
  const deviate: Deviate = (each, ordinal, on) =>
    each.id === line.id && ordinal === 1 && on === 'length' ? -off : 0;
  return [
    {
      id: 'gross',
      label: [`${nameOne(line)} `, { ticks: off }, ' short: not that part'],
      attempt: attemptOf(rubric, deviate),
    },
  ];
}

/** The score of an example under a rubric, or null where that rubric does not know all of its pieces. */
export function scoreExample(rubric: Rubric, { attempt }: ExampleAttempt): number | null {
  const projected = projectAttempt(rubric, attempt);
  if (projected.dropped.some(({ what }) => what === 'piece')) return null;
  return scoreAttempt(rubric, projected.attempt).score;
}
