import type { Length } from '@/lib/length';
import { AXES, type Axis, type PieceSheet, type Rubric, type ScoreSheet, scoreAttempt } from '@/lib/scoring';
import { targetAttempt } from './example-attempts';
import { explainScore, type LossRow, type ScoreExplanation } from './explain-score';

/** One piece as it would be read: how far off each size is, and at which level each check stands. */
export interface TriedPiece {
  deviations: Record<Axis, Length>;
  checks: Record<string, number>;
}

export interface TriedResult {
  piece: PieceSheet;
  sheet: ScoreSheet;
  explanation: ScoreExplanation;
  /** What this piece loses in both scales: the sum of its rows. */
  lost: { points: number; ofTotal: number };
  /** What other pieces of the line lose with it, where all are priced as the worst of them. */
  others: { points: number; ofTotal: number };
}

export const ON_TARGET: TriedPiece = { deviations: { thickness: 0, width: 0, length: 0 }, checks: {} };

/**
 * What the first piece of a line would lose if it read so, every other piece being on target and every check passed:
 * the engine's own score sheet with its explanation, whose rows add up. A reading is never less than 1 tick; checks that
 * the line does not have are left out. Null for a line that the rubric does not have. Pure.
 */
export function tryPiece(rubric: Rubric, lineId: string, tried: TriedPiece): TriedResult | null {
  const line = rubric.lines.find(({ id }) => id === lineId);
  if (!line) return null;
  const attempt = targetAttempt(rubric);
  const piece = attempt.pieces.find((each) => each.lineId === lineId && each.ordinal === 1);
  if (!piece) return null;
  for (const axis of AXES) {
    const ticks = Math.max(1, line.target[axis] + tried.deviations[axis]);
    piece.sizes[axis] = { kind: 'value', ticks };
  }
  for (const { id, levels } of line.checks) {
    const level = Object.hasOwn(tried.checks, id) ? (tried.checks[id] ?? 0) : 0;
    piece.checks[id] = Math.min(level, levels.length - 1);
  }
  const sheet = scoreAttempt(rubric, attempt);
  const scored = sheet.pieces.find((each) => each.lineId === lineId && each.ordinal === 1);
  if (!scored) return null;
  const explanation = explainScore(rubric, sheet, 0);
  const isThis = (row: LossRow) => row.lineId === lineId && row.ordinal === 1;
  return {
    piece: scored,
    sheet,
    explanation,
    lost: sumOf(explanation.rows.filter(isThis)),
    others: sumOf(explanation.rows.filter((row) => !isThis(row))),
  };
}

function sumOf(rows: readonly LossRow[]): { points: number; ofTotal: number } {
  return {
    points: rows.reduce((sum, { points }) => sum + points, 0),
    ofTotal: rows.reduce((sum, { ofTotal }) => sum + ofTotal, 0),
  };
}
