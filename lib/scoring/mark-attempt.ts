import { markChecks } from './mark-checks';
import { markPiece } from './mark-piece';
import { ScoringError } from './scoring-error';
import { type Settled, settleScore } from './settle-score';
import type { Attempt, Piece, Points } from './types';
import type { LineMarks, PieceMark, Worksheet } from './worksheet';

export interface MarkedTotals extends Settled {
  possible: Points;
  lost: Points;
  complete: boolean;
}

function findMark(sheet: Worksheet, { lineId, ordinal }: Piece): PieceMark {
  const marks = sheet.lineOf.get(lineId);
  if (marks === undefined) throw new ScoringError('unknown-line', `The rubric has no line “${lineId}”.`);
  const mark = marks.pieces[ordinal - 1];
  if (mark === undefined) {
    const range = `“${lineId}” has pieces 1 to ${marks.line.quantity}`;
    throw new ScoringError('ordinal-out-of-range', `There is no piece ${ordinal}: ${range}.`);
  }
  if (mark.piece !== null) {
    throw new ScoringError('repeated-piece', `Piece ${ordinal} of “${lineId}” is recorded twice.`);
  }
  return mark;
}

function placePieces(sheet: Worksheet, attempt: Attempt): void {
  for (const { pieces } of sheet.lines) for (const mark of pieces) mark.piece = null;
  for (const piece of attempt.pieces) findMark(sheet, piece).piece = piece;
  for (const lineId of Object.keys(attempt.adjust ?? {})) {
    if (sheet.lineOf.has(lineId)) continue;
    throw new ScoringError(
      'unknown-line',
      `An offset is given for “${lineId}”, which the rubric does not have.`,
    );
  }
}

/** Gives every present piece of the line the loss of the worst of them. */
function shareWorst({ pieces }: LineMarks): void {
  const present = pieces.filter(({ piece }) => piece?.state === 'present');
  const worst = Math.max(0, ...present.map(({ lose }) => lose));
  for (const mark of present) mark.lose = worst;
}

/** Writes an attempt onto the worksheet, over the one before it, and gives its totals. */
export function markAttempt(sheet: Worksheet, attempt: Attempt): MarkedTotals {
  placePieces(sheet, attempt);
  markChecks(sheet.work, attempt.work, () => 'work');
  let unread = sheet.work.unread;
  let lost = sheet.work.lose;
  let worth = 0;
  let counted = 0;
  for (const marks of sheet.lines) {
    for (const mark of marks.pieces) markPiece(sheet, marks, mark, attempt.adjust);
    if (marks.line.set === 'worst') shareWorst(marks);
    for (const mark of marks.pieces) {
      lost += mark.lose;
      unread += mark.unread;
      if (mark.piece?.state === 'excused') continue;
      counted += 1;
      worth += marks.line.worth;
    }
  }
  const possible = sheet.rubric.basis === 'start' ? (sheet.rubric.start ?? 0) : worth;
  const settled = settleScore(sheet.rubric, { possible, lost, counted }, attempt);
  return { ...settled, possible, lost, complete: unread === 0 };
}
