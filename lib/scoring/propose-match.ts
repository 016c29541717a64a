import type { Length } from '@/lib/length';
import { assignLeast } from './assign-least';
import { markPiece } from './mark-piece';
import { findDeviation } from './price-size';
import { AXES, type Axis, type Piece, type Points, type Rubric } from './types';
import { layOutWorksheet, type PricedLine, type Worksheet } from './worksheet';

/** A piece as it lies there, without a place; `id` is whatever tells it from the others. */
export interface LaidPiece {
  id: string;
  sizes: Record<Axis, Length>;
}

export interface PlacedPiece {
  id: string;
  lineId: string;
  ordinal: number;
  /** What the piece loses there by itself, checks as assumed. */
  lose: Points;
}

export interface ProposedMatch {
  /** In the order in which the pieces were laid. */
  placed: PlacedPiece[];
  unplaced: string[];
  /** In cut-list order. */
  unfilled: { lineId: string; ordinal: number }[];
}

/** What a piece would come to in a line: its loss alone, and how far it is off in all; null where it is gross. */
interface Fit {
  lose: Points;
  off: Length;
}

/**
 * Proposes which unlabelled piece belongs to which place of the cut list. A place takes one piece at most, and none that
 * would be gross there. Of all assignments: the most pieces placed; then the least total loss, each piece priced alone
 * with its checks as assumed and thickness and width exchanged where the line allows it; then the least total absolute
 * deviation as scored; then the laid order, the first piece taking the first place, being unplaced the last resort.
 * Exact, for several hundred pieces; ticks and hundredths. The rubric and the sizes are already parsed and not changed.
 *
 * @example proposeMatch(rubric, [{ id: 'p1', sizes: rubric.lines[0].target }]).placed // [{ id: 'p1', lineId: 'shelf', ordinal: 1, lose: 0 }]
 */
export function proposeMatch(rubric: Rubric, pieces: readonly LaidPiece[]): ProposedMatch {
  const sheet = layOutWorksheet(rubric);
  const fits = pieces.map(({ sizes }) => sheet.lines.map((priced) => fitPiece(sheet, priced, sizes)));
  return fillPlaces(pieces, fits, sheet.lines, assignLines(fits, sheet.lines));
}

/**
 * The line of each piece. After the lines stands a column for all that have no place: being there costs more than all
 * losses together. The places of one line are alike, so the line says enough.
 */
function assignLines(fits: readonly (Fit | null)[][], lines: readonly PricedLine[]): number[] {
  const dearest = Math.max(0, ...lines.map(({ line }) => line.worth));
  const unplaced = { major: dearest * fits.length + 1, minor: 0 };
  const capacities = [...lines.map(({ line }) => line.quantity), fits.length];
  return assignLeast(fits.length, capacities, (row, column) => {
    if (column === lines.length) return unplaced;
    const fit = fits[row]?.[column];
    return fit ? { major: fit.lose, minor: fit.off } : null;
  });
}

function fitPiece(sheet: Worksheet, priced: PricedLine, sizes: LaidPiece['sizes']): Fit | null {
  const piece = asPresent(priced, sizes);
  const mark = { piece, unread: 0, gross: false, swapped: false, uncapped: 0, lose: 0 };
  markPiece(sheet, priced, piece, {}, mark);
  if (mark.gross) return null;
  const { thickness, width, length } = sizes;
  const laid = mark.swapped ? { thickness: width, width: thickness, length } : sizes;
  const off = AXES.reduce(
    (sum, axis) => sum + Math.abs(findDeviation(sheet, priced.prices[axis], laid[axis], 0)),
    0,
  );
  return { lose: mark.lose, off };
}

function asPresent({ line }: PricedLine, { thickness, width, length }: LaidPiece['sizes']): Piece {
  return {
    lineId: line.id,
    ordinal: 1,
    state: 'present',
    sizes: {
      thickness: { kind: 'value', ticks: thickness },
      width: { kind: 'value', ticks: width },
      length: { kind: 'value', ticks: length },
    },
    checks: {},
  };
}

/** Of the pieces of a line, the one laid first takes the first place. */
function fillPlaces(
  pieces: readonly LaidPiece[],
  fits: readonly (Fit | null)[][],
  lines: readonly PricedLine[],
  lineOf: readonly number[],
): ProposedMatch {
  const match: ProposedMatch = { placed: [], unplaced: [], unfilled: [] };
  const taken = lines.map(() => 0);
  pieces.forEach(({ id }, row) => {
    const at = lineOf[row] ?? lines.length;
    const [priced, fit] = [lines[at], fits[row]?.[at]];
    if (!priced || !fit) {
      match.unplaced.push(id);
      return;
    }
    const ordinal = (taken[at] ?? 0) + 1;
    taken[at] = ordinal;
    match.placed.push({ id, lineId: priced.line.id, ordinal, lose: fit.lose });
  });
  lines.forEach(({ line }, at) => {
    for (let ordinal = (taken[at] ?? 0) + 1; ordinal <= line.quantity; ordinal++)
      match.unfilled.push({ lineId: line.id, ordinal });
  });
  return match;
}
