import 'server-only';
import { selectOwnSittings } from '@/db/queries/own';
import { noInput } from '@/lib/contracts/own';
import { defineVerb } from '../verb';

export interface OwnTaskRow {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  dueOn: string | null;
  attemptNumber: number;
  /** What the student can do next: cut and measure, wait for the bench, or look at the result. */
  stage: 'to do' | 'locked' | 'published';
}

/** The practicals given to the student, the newest first. */
export const listTasks = defineVerb({
  action: 'task.read',
  input: noInput,
  async run({ actor, tx }): Promise<OwnTaskRow[]> {
    const rows = await selectOwnSittings(tx, actor.schoolId, actor.personId);
    return rows.map((row) => ({
      sittingId: row.sittingId,
      title: row.title,
      sectionName: row.sectionName,
      period: row.period,
      dueOn: row.dueOn,
      attemptNumber: row.attemptNumber,
      stage: row.state === 'published' ? 'published' : row.lockedAt ? 'locked' : 'to do',
    }));
  },
});
