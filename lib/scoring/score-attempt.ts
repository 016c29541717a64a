import { markAttempt } from './mark-attempt';
import type { Attempt, Rubric, ScoreSheet } from './types';
import { layOutWorksheet } from './worksheet';
import { listUnread, writeChecks, writePiece } from './write-sheet';

/**
 * Scores one attempt by one rubric, and shows where every point went: each size with its deviation and band,
 * each check with its level, what is still unread, and the totals.
 *
 * Lengths are whole ticks and points whole hundredths; both are computed exactly, and the score is rounded once,
 * half up, to the rubric's `roundTo`. `provisional` is the result as it stands, null when there is nothing to
 * score; `score` is the same once nothing is unread. Both arguments are already parsed (`rubricSchema`,
 * `attemptSchema`) and are not changed.
 *
 * @throws ScoringError when the attempt holds a line, piece, check or level that the rubric does not have, or a
 * piece twice.
 * @example scoreAttempt(rubric, attempt).score // 9500: 95 points
 */
export function scoreAttempt(rubric: Rubric, attempt: Attempt): ScoreSheet {
  const sheet = layOutWorksheet(rubric);
  const { complete, possible, lost, raw, total, provisional } = markAttempt(sheet, attempt);
  const pieces = sheet.lines.flatMap((priced) =>
    priced.marks.map((mark, at) => writePiece(sheet, priced, mark, at + 1, attempt.adjust)),
  );
  const work = writeChecks(sheet.workChecks, attempt.work);
  return {
    complete,
    unread: listUnread(pieces, work),
    possible,
    lost,
    raw,
    total,
    provisional,
    score: complete ? provisional : null,
    pieces,
    work,
  };
}
