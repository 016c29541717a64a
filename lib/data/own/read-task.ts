import 'server-only';
import { selectOwnAttempt, selectOwnEvents } from '@/db/queries/own';
import { ownSittingInput } from '@/lib/contracts/own';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { type CellValue, cellValueSchema, type Side } from '@/lib/sync/cells';
import type { CellEvent } from '@/lib/sync/derive';
import { defineVerb } from '../verb';

export interface OwnEvent extends CellEvent {
  typed: string | null;
  unit: 'in' | 'mm' | null;
  value: CellValue;
  side: Side;
}

export interface OwnTaskView {
  sittingId: string;
  attemptId: string;
  attemptNumber: number;
  studentId: string;
  sectionName: string;
  period: string;
  dueOn: string | null;
  published: boolean;
  versionNumber: number;
  task: Task;
  rubric: Rubric;
  policies: RubricForm['policies'];
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
    const events = await selectOwnEvents(tx, actor.schoolId, row.attemptId);
    return {
      sittingId: row.sittingId,
      attemptId: row.attemptId,
      attemptNumber: row.attemptNumber,
      studentId: row.studentId,
      sectionName: row.sectionName,
      period: row.period,
      dueOn: row.dueOn,
      published: row.state === 'published',
      versionNumber: row.versionNumber,
      task: taskSchema.parse(row.task),
      rubric: rubricSchema.parse(row.rubric),
      policies: rubricFormSchema.parse(row.form).policies,
      events: events.map(ownEvent),
    };
  },
});

type EventRow = Awaited<ReturnType<typeof selectOwnEvents>>[number];

function ownEvent(row: EventRow): OwnEvent {
  return {
    id: row.id,
    side: row.side,
    cell: { lineId: row.lineId, ordinal: row.ordinal, what: row.what },
    value: cellValueSchema.parse(row.value),
    typed: row.typed,
    unit: row.unit,
    supersedes: row.supersedes,
    capturedAt: row.capturedAt.toISOString(),
    authorId: row.authorId,
  };
}
