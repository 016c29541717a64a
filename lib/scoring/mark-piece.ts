import type { Length } from '@/lib/length';
import { markChecks } from './mark-checks';
import { isSizeGross, loseSize } from './price-size';
import type { Attempt, Axis, Line, Piece, Points, Reading } from './types';
import type { PieceMark, PricedLine, Worksheet } from './worksheet';

export type Shift = Partial<Record<Axis, Length>>;

const NO_SHIFT: Shift = {};

/** The offset of a line, looked up as its own property: a line may be called `constructor`. */
export function findShift(adjust: Attempt['adjust'], lineId: string): Shift {
  return adjust !== undefined && Object.hasOwn(adjust, lineId) ? (adjust[lineId] ?? NO_SHIFT) : NO_SHIFT;
}

function capLoss(line: Line, uncapped: Points, gross: boolean): Points {
  return gross ? line.worth : Math.min(uncapped, line.worth);
}

/** Is (lose, gross, uncapped) lexicographically less than what the mark holds, false before true? */
export function isCheaper(lose: Points, gross: boolean, uncapped: Points, mark: PieceMark): boolean {
  if (lose !== mark.lose) return lose < mark.lose;
  if (gross !== mark.gross) return mark.gross;
  return uncapped < mark.uncapped;
}

type Recorded = Reading | undefined;

function losePair(
  sheet: Worksheet,
  { prices }: PricedLine,
  shift: Shift,
  thickness: Recorded,
  width: Recorded,
): Points {
  return (
    loseSize(sheet, prices.thickness, thickness, shift.thickness ?? 0) +
    loseSize(sheet, prices.width, width, shift.width ?? 0)
  );
}

function isPairGross(
  sheet: Worksheet,
  { prices }: PricedLine,
  shift: Shift,
  thickness: Recorded,
  width: Recorded,
): boolean {
  return (
    isSizeGross(sheet, prices.thickness, thickness, shift.thickness ?? 0) ||
    isSizeGross(sheet, prices.width, width, shift.width ?? 0)
  );
}

/** Goes on from what the checks came to, which `mark` already holds. */
function markPresent(
  sheet: Worksheet,
  priced: PricedLine,
  piece: Piece,
  shift: Shift,
  mark: PieceMark,
): void {
  const { line, prices } = priced;
  const { thickness, width, length } = piece.sizes;
  const lengthGross = isSizeGross(sheet, prices.length, length, shift.length ?? 0);
  const rest = mark.uncapped + loseSize(sheet, prices.length, length, shift.length ?? 0);
  mark.unread += Number(thickness === undefined) + Number(width === undefined) + Number(length === undefined);
  mark.uncapped = rest + losePair(sheet, priced, shift, thickness, width);
  mark.gross = lengthGross || isPairGross(sheet, priced, shift, thickness, width);
  mark.lose = capLoss(line, mark.uncapped, mark.gross);

  if (!line.swap || thickness?.kind !== 'value' || width?.kind !== 'value') return;
  const uncapped = rest + losePair(sheet, priced, shift, width, thickness);
  const gross = lengthGross || isPairGross(sheet, priced, shift, width, thickness);
  const lose = capLoss(line, uncapped, gross);
  if (!isCheaper(lose, gross, uncapped, mark)) return;
  mark.swapped = true;
  mark.uncapped = uncapped;
  mark.gross = gross;
  mark.lose = lose;
}

/** Marks one listed piece alone, before `set`. What a piece that is not present carries is only validated. */
export function markPiece(
  sheet: Worksheet,
  priced: PricedLine,
  piece: Piece,
  shift: Shift,
  mark: PieceMark,
): void {
  mark.gross = false;
  mark.swapped = false;
  markChecks(priced.checks, piece.checks, piece, mark);
  if (piece.state === 'present') {
    markPresent(sheet, priced, piece, shift, mark);
    return;
  }
  mark.uncapped = piece.state === 'excused' ? 0 : priced.line.missing;
  mark.lose = mark.uncapped;
  mark.unread = piece.state === 'held' ? 1 : 0;
}

export function markUnlisted(mark: PieceMark): void {
  mark.gross = false;
  mark.swapped = false;
  mark.uncapped = 0;
  mark.lose = 0;
  mark.unread = 1;
}
