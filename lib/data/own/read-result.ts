import 'server-only';
import { selectOwnResult } from '@/db/queries/own';
import { ownSittingInput } from '@/lib/contracts/own';
import { judgementSchema, scoreSheetSchema } from '@/lib/contracts/results';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Points, Policies, PredictionJudgement, Rubric, ScoreSheet } from '@/lib/scoring';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { defineVerb } from '../verb';

export interface OwnResultView {
  sittingId: string;
  sectionName: string;
  period: string;
  attemptNumber: number;
  versionNumber: number;
  publishedAt: string;
  /** True when an earlier publication said something else. */
  corrected: boolean;
  status: 'scored' | 'absent' | 'excused' | 'zero' | 'not read';
  score: Points | null;
  total: Points;
  bonus: Points;
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
    return {
      sittingId: input.sittingId,
      sectionName: row.sectionName,
      period: row.period,
      attemptNumber: row.attemptNumber,
      versionNumber: row.versionNumber,
      publishedAt: row.publishedAt.toISOString(),
      corrected: row.publicationNumber > 1,
      status: row.status,
      score: row.scorePoints,
      total: row.totalPoints,
      bonus: row.bonusPoints,
      predicted: row.predictedPoints,
      measuredAt: row.measuredAt?.toISOString() ?? null,
      task: taskSchema.parse(row.task),
      rubric: rubricSchema.parse(row.rubric),
      policies: rubricFormSchema.parse(row.form).policies,
      sheet: scoreSheetSchema.nullable().parse(row.sheet),
      ownSheet: scoreSheetSchema.nullable().parse(row.ownSheet),
      judgement: judgementSchema.nullable().parse(row.judgement),
    };
  },
});
