import 'server-only';
import { selectOwnAttempt, selectOwnEvents } from '@/db/queries/own';
import { ownSittingInput } from '@/lib/contracts/own';
import { type OwnEvent, ownRecordOf } from '@/lib/practicals/own-record';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Policies, Rubric } from '@/lib/scoring';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { defineVerb } from '../verb';
import { stageOf, type TaskStage } from './list-tasks';
import { ownEventOf } from './own-event';

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
}

/** What a student was asked to make, what error costs, and what they have recorded of it themselves. */
export const readTask = defineVerb({
  action: 'task.read',
  input: ownSittingInput,
  async run({ actor, input, tx, found, authorize }): Promise<OwnTaskView> {
    const row = found(await selectOwnAttempt(tx, actor.schoolId, actor.personId, input.sittingId));
    authorize({ schoolId: row.schoolId, studentId: row.studentId });
    const events = (await selectOwnEvents(tx, actor.schoolId, [row.attemptId])).map(ownEventOf);
    const { sittingId, attemptId, attemptNumber, studentId, sectionName, period, dueOn, versionNumber } = row;
    return {
      sittingId,
      attemptId,
      attemptNumber,
      studentId,
      sectionName,
      period,
      dueOn,
      stage: stageOf(row, ownRecordOf(events).derived.lock !== null),
      versionNumber,
      task: taskSchema.parse(row.task),
      rubric: rubricSchema.parse(row.rubric),
      policies: rubricFormSchema.parse(row.form).policies,
      events,
    };
  },
});
