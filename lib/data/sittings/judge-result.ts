import type { z } from 'zod';
import type { judgementSchema } from '@/lib/contracts/results';
import {
  type Attempt,
  judgePrediction,
  type Points,
  type Rubric,
  type ScoreSheet,
  scoreAttempt,
} from '@/lib/scoring';
import type { PredictionPolicy } from '@/lib/scoring/rubric-form';

/** An attempt as it is recorded when results are about to go out. */
export interface RecordedAttempt {
  standing: 'expected' | 'absent' | 'excused' | 'zero';
  /** The bench's record; null while nothing was recorded. */
  recorded: Attempt | null;
  conflicts: number;
  measuredAt: Date | null;
  /** The student's own side; null while nothing was recorded. */
  own: { attempt: Attempt; sheet: ScoreSheet; locked: boolean; late: boolean } | null;
}

export interface JudgedResult {
  status: 'scored' | 'absent' | 'excused' | 'zero' | 'not read';
  /** Why the result cannot go out without a decision. */
  open: 'conflict' | 'unread' | 'unread sizes' | null;
  scorePoints: Points | null;
  totalPoints: Points;
  bonusPoints: Points;
  predictedPoints: Points | null;
  measuredAt: Date | null;
  sheet: ScoreSheet | null;
  ownSheet: ScoreSheet | null;
  judgement: z.infer<typeof judgementSchema> | null;
}

const NOTHING: Attempt = { pieces: [], work: {}, bonus: 0, daysLate: 0 };

/**
 * What an attempt's result is under its rubric: its status, and for a complete one the score with the bonus of a
 * locked prediction. A late prediction earns a bonus only where `countLate`. Absent, excused and not read have no
 * number; a zero is the number 0. Pure.
 */
export function judgeResult(
  rubric: Rubric,
  policy: PredictionPolicy,
  attempt: RecordedAttempt,
  countLate: boolean,
): JudgedResult {
  const { standing, recorded, own } = attempt;
  const bare = scoreAttempt(rubric, { ...(recorded ?? NOTHING), bonus: 0 });
  const base = {
    open: attempt.conflicts > 0 ? ('conflict' as const) : null,
    totalPoints: bare.total,
    bonusPoints: 0,
    predictedPoints: own?.locked ? own.sheet.provisional : null,
    measuredAt: recorded ? attempt.measuredAt : null,
    sheet: null,
    ownSheet: own?.sheet ?? null,
    judgement: null,
  };
  if (standing === 'zero') return { ...base, status: 'zero', scorePoints: 0 };
  if (standing !== 'expected') return { ...base, status: standing, scorePoints: null };
  if (!recorded || base.open !== null || bare.score === null) {
    return { ...base, status: 'not read', open: base.open ?? openOf(recorded), scorePoints: null };
  }
  const counts = own?.locked && (!own.late || countLate);
  const judgement = own && counts ? judgePrediction(rubric, own.attempt, recorded, policy) : null;
  const bonus = judgement?.bonus ?? 0;
  const sheet = scoreAttempt(rubric, { ...recorded, bonus });
  return { ...base, status: 'scored', scorePoints: sheet.score, bonusPoints: bonus, sheet, judgement };
}

function openOf(recorded: Attempt | null): 'unread' | 'unread sizes' {
  const begun = recorded !== null && (recorded.pieces.length > 0 || Object.keys(recorded.work).length > 0);
  return begun ? 'unread sizes' : 'unread';
}
