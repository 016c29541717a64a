import 'server-only';
import { selectChangedResults, selectOwnAttempts, selectOwnEvents } from '@/db/queries/own';
import { noInput } from '@/lib/contracts/own';
import { countOwnSizes, type OwnEvent, ownRecordOf } from '@/lib/practicals/own-record';
import { rubricSchema } from '@/lib/scoring/schemas';
import { defineVerb } from '../verb';
import { ownEventOf } from './own-event';

/** To do: cut and measure. Locked: the bench is next. Published: there is a result. Closed: published without one. */
export type TaskStage = 'to do' | 'locked' | 'published' | 'closed';

export interface OwnTaskRow {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  dueOn: string | null;
  attemptNumber: number;
  stage: TaskStage;
  /** A further attempt is open beside the result of the one before. */
  redo: boolean;
  /** The latest publication told this student another result than the one before it. */
  scoreChanged: boolean;
  /** Own sizes that a lock no longer waits for, of all. */
  sizes: { of: number; done: number };
}

/** The practicals given to the student, the newest first. */
export const listTasks = defineVerb({
  action: 'task.read',
  input: noInput,
  async run({ actor, tx }): Promise<OwnTaskRow[]> {
    const rows = await selectOwnAttempts(tx, actor.schoolId, actor.personId);
    const attemptIds = rows.map(({ attemptId }) => attemptId);
    const stored = attemptIds.length > 0 ? await selectOwnEvents(tx, actor.schoolId, attemptIds) : [];
    const events = stored.map(ownEventOf);
    const changed = new Set(await selectChangedResults(tx, actor.schoolId, actor.personId));
    return rows.map((row) => ({
      ...taskRow(
        row,
        events.filter(({ attemptId }) => attemptId === row.attemptId),
      ),
      scoreChanged: changed.has(row.sittingId),
    }));
  },
});

type AttemptRow = Awaited<ReturnType<typeof selectOwnAttempts>>[number];

function taskRow(row: AttemptRow, events: readonly OwnEvent[]): Omit<OwnTaskRow, 'scoreChanged'> {
  const { sittingId, title, sectionName, period, dueOn, attemptNumber } = row;
  const record = ownRecordOf(events);
  return {
    sittingId,
    title,
    sectionName,
    period,
    dueOn,
    attemptNumber,
    stage: stageOf(row, record.derived.lock !== null),
    redo: row.toldAttempt !== null && row.toldAttempt < attemptNumber,
    sizes: countOwnSizes(rubricSchema.parse(row.rubric), record),
  };
}

export function stageOf(
  row: { state: 'open' | 'published'; toldAttempt: number | null },
  locked: boolean,
): TaskStage {
  if (row.state === 'published') return row.toldAttempt !== null ? 'published' : 'closed';
  return locked ? 'locked' : 'to do';
}
