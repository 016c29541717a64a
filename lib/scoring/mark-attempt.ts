import { type CheckTally, markChecks } from './mark-checks';
import { findShift, markPiece, markUnlisted } from './mark-piece';
import { ScoringError } from './scoring-error';
import { type Settled, settleScore } from './settle-score';
import type { Attempt, Piece, Points } from './types';
import type { PieceMark, PricedLine, Worksheet } from './worksheet';

export interface MarkedTotals extends Settled {
  possible: Points;
  lost: Points;
  complete: boolean;
}

function findMark({ line, marks }: PricedLine, { lineId, ordinal }: Piece): PieceMark {
  const mark = marks[ordinal - 1];
  if (mark === undefined) {
    const range = `“${lineId}” has pieces 1 to ${line.quantity}`;
    throw new ScoringError('ordinal-out-of-range', `There is no piece ${ordinal}: ${range}.`);
  }
  if (mark.piece !== null) {
    throw new ScoringError('repeated-piece', `Piece ${ordinal} of “${lineId}” is recorded twice.`);
  }
  return mark;
}

function refuseForeignOffsets({ lineOf }: Worksheet, adjust: Attempt['adjust']): void {
  const foreign = Object.keys(adjust ?? {}).find((lineId) => !lineOf.has(lineId));
  if (foreign === undefined) return;
  throw new ScoringError(
    'unknown-line',
    `An offset is given for “${foreign}”, which the rubric does not have.`,
  );
}

function markListed(sheet: Worksheet, { pieces, adjust }: Attempt): void {
  for (const piece of pieces) {
    const priced = sheet.lineOf.get(piece.lineId);
    if (priced === undefined) {
      throw new ScoringError('unknown-line', `The rubric has no line “${piece.lineId}”.`);
    }
    const mark = findMark(priced, piece);
    mark.piece = piece;
    markPiece(sheet, priced, piece, findShift(adjust, piece.lineId), mark);
  }
}

/** Gives every present piece of the line the loss of the worst of them. */
function shareWorst({ marks }: PricedLine): void {
  const present = marks.filter(({ piece }) => piece?.state === 'present');
  const worst = Math.max(0, ...present.map(({ lose }) => lose));
  for (const mark of present) mark.lose = worst;
}

/** Writes an attempt onto the worksheet, over the one before it, and gives its totals. */
export function markAttempt(sheet: Worksheet, attempt: Attempt): MarkedTotals {
  for (const { marks } of sheet.lines) for (const mark of marks) mark.piece = null;
  const work: CheckTally = { uncapped: 0, unread: 0 };
  markChecks(sheet.workChecks, attempt.work, null, work);
  refuseForeignOffsets(sheet, attempt.adjust);
  markListed(sheet, attempt);
  let unread = work.unread;
  let lost = work.uncapped;
  let worth = 0;
  let counted = 0;
  for (const priced of sheet.lines) {
    if (priced.line.set === 'worst') shareWorst(priced);
    for (const mark of priced.marks) {
      if (mark.piece === null) markUnlisted(mark);
      lost += mark.lose;
      unread += mark.unread;
      if (mark.piece?.state === 'excused') continue;
      counted += 1;
      worth += priced.line.worth;
    }
  }
  const possible = sheet.rubric.basis === 'start' ? (sheet.rubric.start ?? 0) : worth;
  const { raw, total, provisional } = settleScore(sheet.rubric, { possible, lost, counted }, attempt);
  return { possible, lost, raw, total, provisional, complete: unread === 0 };
}
