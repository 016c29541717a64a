import { type Length, MAX_LENGTH } from '@/lib/length';
import { findShift, isCheaper, markPiece } from './mark-piece';
import { type Attempt, AXES, type Axis, type Line, type Piece, type Points, type Rubric } from './types';
import { layOutWorksheet, type PieceMark, type Worksheet } from './worksheet';

/**
 * What is priced otherwise for one student: wider bands, sizes that are not held against them, checks that cost
 * another price. `lineId` or `axis` null: on every line, on every axis; a line excused on its three axes is excused as
 * a whole. `checks` are named by their label, as the same check goes by different ids in different practicals; `lose`
 * null: the check is not held against the student; otherwise a price for each level, in order.
 */
export interface Modification {
  format: 1;
  widen: { num: number; den: number };
  excused: { lineId: string | null; axis: Axis | null }[];
  checks: { label: string; lose: Points[] | null }[];
}

/** The most that `outOf` of a rubric can hold: 10 000 points. */
const MOST_TOTAL = 1_000_000;

/**
 * The rubric under a modification: every band and the gross limit wider by `widen` (whole ticks, half up, at most
 * 10 m), the named checks at their other prices. Reading margin, worths and what a missing piece loses stay.
 *
 * The total stays: where it is the sum of the worths and whole lines are excused, it is set to the sum of all lines'
 * worths (unless that is past the 10 000 points that a total can hold; then what is excused leaves the total too).
 *
 * Line ids and labels that the rubric does not know have no effect. Never fails on a parsed modification, passes
 * `rubricSchema` when `rubric` does, does not change its arguments.
 *
 * @example modifyRubric(defaultRubric, { format: 1, widen: { num: 2, den: 1 }, excused: [], checks: [] }) // 1/32 in free becomes 1/16
 */
export function modifyRubric(rubric: Rubric, modification: Modification): Rubric {
  const { widen } = modification;
  return {
    ...rubric,
    outOf: keptTotal(rubric, modification),
    grossLimit: rubric.grossLimit === null ? null : wider(rubric.grossLimit, widen),
    lines: rubric.lines.map((line) => modifyLine(line, modification)),
    workChecks: rubric.workChecks.map((check) => reprice(check, modification)),
  };
}

/**
 * The attempt as a modification counts it: pieces of an excused line are excused, sizes on an excused axis too,
 * whatever was or was not recorded of them; an excused line leaves nothing unread. Where thickness and width may be
 * read either way round and one of the two is excused, the reading that is cheaper on the other one stays, as `swap`
 * would have chosen. `rubric` is the one before `modifyRubric`.
 *
 * What the rubric does not know is left in, for `scoreAttempt` to refuse. Does not change its arguments.
 *
 * @example modifyAttempt(rubric, attempt, { ...none, excused: [{ lineId: 'base', axis: null }] }).pieces[0].state // 'excused'
 */
export function modifyAttempt(rubric: Rubric, attempt: Attempt, modification: Modification): Attempt {
  if (modification.excused.length === 0) return attempt;
  const axesOf = new Map(rubric.lines.map(({ id }) => [id, excusedAxes(id, modification)]));
  const worksheet = layOutWorksheet(modifyRubric(rubric, modification));
  const listed = new Set(attempt.pieces.map(placeOf));
  const pieces = attempt.pieces.map((piece) =>
    modifyPiece(worksheet, attempt, piece, axesOf.get(piece.lineId) ?? []),
  );
  const unlisted = rubric.lines
    .filter(({ id }) => isWhole(axesOf.get(id) ?? []))
    .flatMap((line) => placesOf(line).filter((place) => !listed.has(placeOf(place))));
  return { ...attempt, pieces: [...pieces, ...unlisted] };
}

/** The axes of a line that are not held against the student, in the order of the axes. */
export function excusedAxes(lineId: string, { excused }: Pick<Modification, 'excused'>): Axis[] {
  return AXES.filter((axis) =>
    excused.some(
      (each) =>
        (each.lineId === null || each.lineId === lineId) && (each.axis === null || each.axis === axis),
    ),
  );
}

/** Labels are the same whatever their case and the space around them. */
export function isSameLabel(one: string, other: string): boolean {
  return one.trim().toLowerCase() === other.trim().toLowerCase();
}

const isWhole = (axes: readonly Axis[]) => axes.length === AXES.length;
const placeOf = ({ lineId, ordinal }: Pick<Piece, 'lineId' | 'ordinal'>) => `${lineId} ${ordinal}`;

function placesOf({ id: lineId, quantity }: Line): Piece[] {
  return Array.from({ length: quantity }, (_, at) => ({
    ...{ lineId, ordinal: at + 1, state: 'excused' as const },
    ...{ sizes: {}, checks: {} },
  }));
}

function modifyPiece(sheet: Worksheet, attempt: Attempt, piece: Piece, axes: readonly Axis[]): Piece {
  if (axes.length === 0) return piece;
  if (isWhole(axes)) return { ...piece, state: 'excused' };
  const straight = excuse(piece, axes);
  const { thickness, width } = piece.sizes;
  const priced = sheet.lineOf.get(piece.lineId);
  const oneOfThePair = axes.includes('thickness') !== axes.includes('width');
  if (!oneOfThePair || !priced?.line.swap || piece.state !== 'present') return straight;
  if (thickness?.kind !== 'value' || width?.kind !== 'value') return straight;
  const sizes = { ...piece.sizes, thickness: width, width: thickness };
  const exchanged = excuse({ ...piece, sizes }, axes);
  const markOf = (each: Piece): PieceMark => {
    const mark = { piece: each, unread: 0, gross: false, swapped: false, uncapped: 0, lose: 0 };
    markPiece(sheet, priced, each, findShift(attempt.adjust, piece.lineId), mark);
    return mark;
  };
  const { lose, gross, uncapped } = markOf(exchanged);
  return isCheaper(lose, gross, uncapped, markOf(straight)) ? exchanged : straight;
}

function excuse(piece: Piece, axes: readonly Axis[]): Piece {
  const excused = axes.map((axis) => [axis, { kind: 'excused' as const }]);
  return { ...piece, sizes: { ...piece.sizes, ...Object.fromEntries(excused) } };
}

function keptTotal({ basis, outOf, lines }: Rubric, modification: Modification): Points | null {
  if (outOf !== null || basis === 'start') return outOf;
  if (!lines.some(({ id }) => isWhole(excusedAxes(id, modification)))) return null;
  const sum = lines.reduce((before, { worth, quantity }) => before + worth * quantity, 0);
  return sum > MOST_TOTAL ? null : sum;
}

function modifyLine(line: Line, modification: Modification): Line {
  const { widen } = modification;
  const size = (axis: Axis) => ({
    ...line.sizes[axis],
    over: widerSide(line.sizes[axis].over, widen),
    under: widerSide(line.sizes[axis].under, widen),
  });
  return {
    ...line,
    sizes: { thickness: size('thickness'), width: size('width'), length: size('length') },
    checks: line.checks.map((check) => reprice(check, modification)),
  };
}

/** No band reaches past 10 m: of those that would, the first, which is the cheapest, takes the place of them all. */
function widerSide(bands: Line['sizes']['length']['over'], widen: Modification['widen']) {
  const all = bands.map(({ within, lose }) => ({ within: wider(within, widen), lose }));
  return all.filter((_, index) => index === 0 || (all[index - 1]?.within ?? 0) < MAX_LENGTH);
}

/** Half up; exact: twice 10 m times the largest numerator stays below 2^53. */
function wider(length: Length, { num, den }: Modification['widen']): Length {
  return Math.min(MAX_LENGTH, Math.floor((2 * length * num + den) / (2 * den)));
}

function reprice(check: Line['checks'][number], { checks }: Modification): Line['checks'][number] {
  const other = checks.find(({ label }) => isSameLabel(label, check.label));
  if (!other) return check;
  const { lose } = other;
  return {
    ...check,
    assume: lose === null ? (check.assume ?? 0) : check.assume,
    levels: check.levels.map((level, index) => ({ ...level, lose: lose ? (lose[index] ?? level.lose) : 0 })),
  };
}
