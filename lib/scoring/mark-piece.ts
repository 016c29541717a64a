import type { Length } from '@/lib/length';
import { markChecks } from './mark-checks';
import { markSize, markValue } from './mark-size';
import type { Attempt, Axis, Line, Piece, Points } from './types';
import type { LineMarks, PieceMark, Worksheet } from './worksheet';

type Shift = Partial<Record<Axis, Length>>;

const NO_SHIFT: Shift = {};

/** The offset of a line, looked up as its own property: a line may be called `constructor`. */
function findShift(adjust: Attempt['adjust'], lineId: string): Shift {
  return adjust !== undefined && Object.hasOwn(adjust, lineId) ? (adjust[lineId] ?? NO_SHIFT) : NO_SHIFT;
}

function capLoss(line: Line, uncapped: Points, gross: boolean): Points {
  return gross ? line.worth : Math.min(uncapped, line.worth);
}

/** Is the first (lose, gross, uncapped) lexicographically less than the second, false before true? */
function isCheaper(lose: Points, gross: boolean, uncapped: Points, than: PieceMark): boolean {
  if (lose !== than.lose) return lose < than.lose;
  if (gross !== than.gross) return than.gross;
  return uncapped < than.uncapped;
}

/** Reads thickness and width the other way round and keeps that if it is cheaper. */
function tryExchanged(sheet: Worksheet, { line, prices }: LineMarks, shift: Shift, mark: PieceMark): void {
  const { sizes, spare, checks } = mark;
  markValue(sheet, prices.thickness, sizes.width.reading, shift.thickness ?? 0, spare.thickness);
  markValue(sheet, prices.width, sizes.thickness.reading, shift.width ?? 0, spare.width);
  const uncapped = spare.thickness.lose + spare.width.lose + sizes.length.lose + checks.lose;
  const gross = spare.thickness.gross || spare.width.gross || sizes.length.gross;
  const lose = capLoss(line, uncapped, gross);
  if (!isCheaper(lose, gross, uncapped, mark)) return;
  mark.spare = { thickness: sizes.thickness, width: sizes.width };
  mark.sizes = { thickness: spare.thickness, width: spare.width, length: sizes.length };
  mark.swapped = true;
  mark.gross = gross;
  mark.uncapped = uncapped;
  mark.lose = lose;
}

function markPresent(sheet: Worksheet, marks: LineMarks, shift: Shift, piece: Piece, mark: PieceMark): void {
  const { line, prices } = marks;
  const { thickness, width, length } = mark.sizes;
  markSize(sheet, prices.thickness, piece.sizes.thickness, shift.thickness ?? 0, thickness);
  markSize(sheet, prices.width, piece.sizes.width, shift.width ?? 0, width);
  markSize(sheet, prices.length, piece.sizes.length, shift.length ?? 0, length);
  mark.unread =
    mark.checks.unread +
    (thickness.kind === 'unread' ? 1 : 0) +
    (width.kind === 'unread' ? 1 : 0) +
    (length.kind === 'unread' ? 1 : 0);
  mark.gross = thickness.gross || width.gross || length.gross;
  mark.uncapped = thickness.lose + width.lose + length.lose + mark.checks.lose;
  mark.lose = capLoss(line, mark.uncapped, mark.gross);
  if (line.swap && thickness.kind === 'value' && width.kind === 'value') {
    tryExchanged(sheet, marks, shift, mark);
  }
}

/** Scores one place of a line alone, before `set`. */
export function markPiece(
  sheet: Worksheet,
  marks: LineMarks,
  mark: PieceMark,
  adjust: Attempt['adjust'],
): void {
  const { piece } = mark;
  mark.gross = false;
  mark.swapped = false;
  mark.unread = piece === null || piece.state === 'held' ? 1 : 0;
  mark.uncapped = piece?.state === 'missing' || piece?.state === 'held' ? marks.line.missing : 0;
  mark.lose = mark.uncapped;
  if (piece === null) return;
  markChecks(mark.checks, piece.checks, () => `piece ${piece.ordinal} of “${piece.lineId}”`);
  if (piece.state === 'present') markPresent(sheet, marks, findShift(adjust, piece.lineId), piece, mark);
}
