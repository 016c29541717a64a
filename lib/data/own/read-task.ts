import 'server-only';
import type { Transaction } from '@/db/client';
import { selectOwnAttempt, selectOwnEvents, selectOwnResult } from '@/db/queries/own';
import type { Actor } from '@/lib/auth/actor';
import { ownSittingInput } from '@/lib/contracts/own';
import { scoreSheetSchema } from '@/lib/contracts/results';
import { explainScore, type ScoreExplanation } from '@/lib/practicals/explain-score';
import { type OwnEvent, type OwnRecord, ownRecordOf } from '@/lib/practicals/own-record';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Policies, Rubric } from '@/lib/scoring';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { loadPricing } from '../pricing/load-pricing';
import { sheetUnder } from '../pricing/price-work';
import { defineVerb } from '../verb';
import { stageOf, type TaskStage } from './list-tasks';
import { ownEventOf } from './own-event';
import { toldRubric } from './told-rubric';

/** What locked readings come to by what prices this attempt: the figure that the result will stand beside. */
export interface OwnPrediction {
  /** The lock that it is of. */
  receipt: string;
  rubric: Rubric;
  explanation: ScoreExplanation;
}

export interface OwnTaskView {
  sittingId: string;
  attemptId: string;
  attemptNumber: number;
  studentId: string;
  sectionName: string;
  period: string;
  dueOn: string | null;
  stage: TaskStage;
  versionNumber: number;
  task: Task;
  rubric: Rubric;
  policies: Policies;
  /** The student's own events; nothing of the bench. */
  events: OwnEvent[];
  /** Null until the readings are locked. */
  prediction: OwnPrediction | null;
}

/** What a student was asked to make, what error costs, and what they have recorded of it themselves. */
export const readTask = defineVerb({
  action: 'task.read',
  input: ownSittingInput,
  async run({ actor, input, tx, found, authorize }): Promise<OwnTaskView> {
    const row = found(await selectOwnAttempt(tx, actor.schoolId, actor.personId, input.sittingId));
    authorize({ schoolId: row.schoolId, studentId: row.studentId });
    const events = (await selectOwnEvents(tx, actor.schoolId, [row.attemptId])).map(ownEventOf);
    const record = ownRecordOf(events);
    const { sittingId, attemptId, attemptNumber, studentId, sectionName, period, dueOn, versionNumber } = row;
    return {
      sittingId,
      attemptId,
      attemptNumber,
      studentId,
      sectionName,
      period,
      dueOn,
      stage: stageOf(row, record.derived.lock !== null),
      versionNumber,
      task: taskSchema.parse(row.task),
      rubric: rubricSchema.parse(row.rubric),
      policies: rubricFormSchema.parse(row.form).policies,
      events,
      prediction:
        row.toldAttempt === attemptNumber
          ? await toldPrediction(tx, actor, sittingId, record)
          : await predictionOf(tx, actor.schoolId, attemptId, record),
    };
  },
});

async function predictionOf(
  tx: Transaction,
  schoolId: string,
  attemptId: string,
  { derived: { lock, attempt } }: OwnRecord,
): Promise<OwnPrediction | null> {
  if (!lock) return null;
  const pricing = (await loadPricing(tx, schoolId, [attemptId])).get(attemptId);
  if (!pricing) throw new Error(`attempt ${attemptId} has no price`);
  const { rubric } = pricing;
  return {
    receipt: lock.receipt,
    rubric,
    explanation: explainScore(rubric, sheetUnder(pricing, attempt), 0),
  };
}

/** Once a result is out the prediction is the one it was told beside, whatever the sitting was moved to since. */
async function toldPrediction(
  tx: Transaction,
  { schoolId, personId }: Actor,
  sittingId: string,
  { derived: { lock } }: OwnRecord,
): Promise<OwnPrediction | null> {
  const told = await selectOwnResult(tx, schoolId, personId, sittingId);
  const sheet = scoreSheetSchema.nullable().parse(told?.ownSheet ?? null);
  if (!lock || !told || !sheet) return null;
  const rubric = await toldRubric(tx, schoolId, told);
  return { receipt: lock.receipt, rubric, explanation: explainScore(rubric, sheet, 0) };
}
