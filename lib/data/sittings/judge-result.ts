import type { z } from 'zod';
import type { judgementSchema } from '@/lib/contracts/results';
import type { Attempt, Points, ScoreSheet } from '@/lib/scoring';
import { holdPoints, pricerOf, sheetUnder } from '../pricing/price-work';
import type { Pricing } from '../pricing/pricing';

/** An attempt as it is recorded when results are about to go out. */
export interface RecordedAttempt {
  standing: 'expected' | 'absent' | 'excused' | 'zero';
  /** The bench's record; null while nothing was recorded. */
  recorded: Attempt | null;
  conflicts: number;
  measuredAt: Date | null;
  /** The student's own side, its sheet by the same pricing; null while nothing was recorded. */
  own: { attempt: Attempt; sheet: ScoreSheet; locked: boolean; late: boolean } | null;
}

export interface JudgedResult {
  status: 'scored' | 'absent' | 'excused' | 'zero' | 'not read';
  /** Why the result cannot go out without a decision. */
  open: 'conflict' | 'unread' | 'unread sizes' | null;
  scorePoints: Points | null;
  totalPoints: Points;
  bonusPoints: Points;
  /** The part of the score that an earlier version gave beyond this one, and that version. */
  heldPoints: Points;
  heldVersionId: string | null;
  accommodationId: string | null;
  predictedPoints: Points | null;
  measuredAt: Date | null;
  sheet: ScoreSheet | null;
  ownSheet: ScoreSheet | null;
  judgement: z.infer<typeof judgementSchema> | null;
}

const NOTHING: Attempt = { pieces: [], work: {}, bonus: 0, daysLate: 0 };

/**
 * What an attempt's result is under its pricing: its status, and for a complete one the score with the bonus of a
 * locked prediction and what earlier versions hold, each of them with the bonus it would have given. A late
 * prediction earns a bonus only where `countLate`. Absent, excused and not read have no number; a zero is the
 * number 0. Pure.
 */
export function judgeResult(pricing: Pricing, attempt: RecordedAttempt, countLate: boolean): JudgedResult {
  const { standing, recorded, own } = attempt;
  const counts = own?.locked && (!own.late || countLate);
  const priceBy = pricerOf({ bench: recorded ?? NOTHING, own: own && counts ? own.attempt : null });
  const priced = priceBy(pricing);
  const base = {
    open: attempt.conflicts > 0 ? ('conflict' as const) : null,
    totalPoints: priced.total,
    bonusPoints: 0,
    heldPoints: 0,
    heldVersionId: null,
    accommodationId: pricing.accommodationId,
    predictedPoints: own?.locked ? own.sheet.provisional : null,
    measuredAt: recorded ? attempt.measuredAt : null,
    sheet: null,
    ownSheet: own?.sheet ?? null,
    judgement: null,
  };
  if (standing === 'zero') return { ...base, status: 'zero', scorePoints: 0 };
  if (standing !== 'expected') return { ...base, status: standing, scorePoints: null };
  if (!recorded || base.open !== null || priced.score === null) {
    return { ...base, status: 'not read', open: base.open ?? openOf(recorded), scorePoints: null };
  }
  const { judgement } = priced;
  const bonus = judgement?.bonus ?? 0;
  const held = holdPoints(pricing, priced, priceBy);
  return {
    ...base,
    status: 'scored',
    scorePoints: priced.score + held.points,
    bonusPoints: bonus,
    heldPoints: held.points,
    heldVersionId: held.version?.versionId ?? null,
    sheet: sheetUnder(pricing, { ...recorded, bonus }),
    judgement,
  };
}

function openOf(recorded: Attempt | null): 'unread' | 'unread sizes' {
  const begun = recorded !== null && (recorded.pieces.length > 0 || Object.keys(recorded.work).length > 0);
  return begun ? 'unread sizes' : 'unread';
}
