import type { AttemptRow } from '@/db/queries/attempts';
import type { ResultRow } from '@/db/queries/publications';
import type { GradebookCell } from '@/lib/contracts/gradebook';
import { scoreSheetSchema } from '@/lib/contracts/results';
import type { ScoreSheet } from '@/lib/scoring';
import type { RedoPolicy } from '@/lib/scoring/rubric-form';
import { sheetUnder } from '../pricing/price-work';
import type { Pricing } from '../pricing/pricing';
import { storedAttempt } from '../pricing/stored-attempt';
import { sameJson } from '../sittings/same-json';
import { countedScore } from './counted-score';
import { countPieces, lossBySide } from './loss-by-side';

export interface CellAttempt {
  row: AttemptRow;
  /** What the latest publication told; undefined before it. */
  result: ResultRow | undefined;
}

/** What one student has in one sitting: the published attempt that counts, or how far the bench has come. */
export function cellOf(
  attempts: readonly CellAttempt[],
  policy: RedoPolicy,
  { pricingOf, notArrived }: { pricingOf(attemptId: string): Pricing; notArrived: number },
): GradebookCell | null {
  const published = attempts.filter(({ result }) => result !== undefined);
  const shown = published.at(-1) ?? attempts.at(-1);
  if (!shown) return null;
  const { row, result } = shown;
  const sheet = sheetOf(shown);
  const base = {
    attemptId: row.attemptId,
    attemptNumber: row.number,
    lost: lossBySide(sheet),
    missing: countPieces(sheet, 'missing'),
    held: countPieces(sheet, 'held'),
    daysLate: row.daysLate,
    notArrived,
  };
  if (!result) return { ...base, published: false, changed: false, ...recordingOf(row) };
  const counted = countedScore(
    policy,
    published.flatMap((each) =>
      each.result ? [{ score: each.result.scorePoints, total: each.result.totalPoints }] : [],
    ),
  );
  return {
    ...base,
    published: true,
    status: result.status === 'not read' && counted ? 'scored' : result.status,
    score: counted?.score ?? null,
    total: counted?.total ?? result.totalPoints,
    changed: attempts.some((attempt) => isChanged(attempt, pricingOf(attempt.row.attemptId))),
  };
}

function sheetOf({ row, result }: CellAttempt): ScoreSheet | null {
  return scoreSheetSchema.nullable().parse(result ? result.sheet : row.sheet);
}

export function recordingOf(row: AttemptRow): Pick<GradebookCell, 'status' | 'score' | 'total'> {
  const total = row.totalPoints ?? 0;
  if (row.standing === 'zero') return { status: 'zero', score: 0, total };
  if (row.standing !== 'expected') return { status: row.standing, score: null, total };
  if ((row.conflicts ?? 0) > 0) return { status: 'conflict', score: null, total };
  if (row.measuredAt === null) return { status: 'not read', score: null, total };
  if (row.complete) return { status: 'scored', score: row.scorePoints, total };
  return { status: 'reading', score: row.provisionalPoints, total };
}

/** Whether what is recorded now would be told otherwise than it was, the bonus apart. */
export function isChanged({ row, result }: CellAttempt, pricing: Pricing): boolean {
  const now = statusNow(row);
  if (!result) return row.recorded !== null || row.standing !== 'expected';
  if (now !== result.status) return true;
  if (now !== 'scored') return false;
  // What was held is held no longer once a move was made as it is, or taken back.
  if (result.heldPoints > 0 && !pricing.held.some(({ versionId }) => versionId === result.heldVersionId)) {
    return true;
  }
  // A bonus would add to both sides of what is held; without one, what is held now was not told.
  if (result.heldPoints === 0 && result.bonusPoints === 0 && (row.heldPoints ?? 0) > 0) return true;
  const told = scoreSheetSchema.parse(result.sheet);
  const recorded = storedAttempt(row.recorded);
  const sheet = sheetUnder(pricing, { ...recorded, bonus: result.bonusPoints });
  return sameJson(told) !== sameJson(sheet);
}

function statusNow(row: AttemptRow): ResultRow['status'] {
  if (row.standing !== 'expected') return row.standing;
  return row.complete ? 'scored' : 'not read';
}
