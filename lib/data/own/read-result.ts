import 'server-only';
import { isCorrected, selectOwnResult } from '@/db/queries/own';
import { ownSittingInput } from '@/lib/contracts/own';
import { judgementSchema, scoreSheetSchema } from '@/lib/contracts/results';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Points, Policies, PredictionJudgement, Rubric, ScoreSheet } from '@/lib/scoring';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { defineVerb } from '../verb';
import { toldRubric } from './told-rubric';

export interface OwnResultView {
  sittingId: string;
  sectionName: string;
  period: string;
  attemptNumber: number;
  versionNumber: number;
  publishedAt: string;
  /** True when the publication before told this student something else: another status, score or total. */
  corrected: boolean;
  /** What that one told; null unless corrected. */
  before: { score: Points | null; total: Points } | null;
  status: 'scored' | 'absent' | 'excused' | 'zero' | 'not read';
  score: Points | null;
  total: Points;
  bonus: Points;
  /** The part of the score that an earlier version gave beyond this one. */
  held: { points: Points; versionNumber: number } | null;
  predicted: Points | null;
  measuredAt: string | null;
  task: Task;
  rubric: Rubric;
  policies: Policies;
  sheet: ScoreSheet | null;
  ownSheet: ScoreSheet | null;
  judgement: PredictionJudgement | null;
}

/** What the latest publication said of the student's own attempt; not found before there is one. */
export const readResult = defineVerb({
  action: 'result.read',
  input: ownSittingInput,
  async run({ actor, input, tx, found, authorize }): Promise<OwnResultView> {
    const row = found(await selectOwnResult(tx, actor.schoolId, actor.personId, input.sittingId));
    authorize({ schoolId: row.schoolId, studentId: row.studentId });
    const { heldPoints, heldVersionNumber, before } = row;
    const now = { status: row.status, score: row.scorePoints, total: row.totalPoints };
    const corrected = isCorrected({ ...now, before });
    return {
      sittingId: input.sittingId,
      sectionName: row.sectionName,
      period: row.period,
      attemptNumber: row.attemptNumber,
      versionNumber: row.versionNumber,
      publishedAt: row.publishedAt.toISOString(),
      corrected,
      before: corrected && before ? { score: before.score, total: before.total } : null,
      status: row.status,
      score: row.scorePoints,
      total: row.totalPoints,
      bonus: row.bonusPoints,
      held: heldVersionNumber === null ? null : { points: heldPoints, versionNumber: heldVersionNumber },
      predicted: row.predictedPoints,
      measuredAt: row.measuredAt?.toISOString() ?? null,
      task: taskSchema.parse(row.task),
      rubric: await toldRubric(tx, actor.schoolId, row),
      policies: rubricFormSchema.parse(row.form).policies,
      sheet: scoreSheetSchema.nullable().parse(row.sheet),
      ownSheet: scoreSheetSchema.nullable().parse(row.ownSheet),
      judgement: judgementSchema.nullable().parse(row.judgement),
    };
  },
});
