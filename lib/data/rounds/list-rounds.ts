import 'server-only';
import { z } from 'zod';
import { selectRounds } from '@/db/queries/round-list';
import { defineVerb } from '../verb';

export interface RoundRow {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  published: boolean;
  dueOn: string | null;
  versionNumber: number;
  students: number;
  finished: number;
  begun: number;
  absent: number;
  conflicts: number;
}

/** The rounds that the person can walk today, by period. */
export const listRounds = defineVerb({
  action: 'sitting.list',
  input: z.strictObject({}),
  async run({ actor, tx }): Promise<RoundRow[]> {
    const duty = actor.role === 'aide' ? 'aide' : 'teacher';
    const rows = await selectRounds(tx, actor.schoolId, actor.personId, duty);
    return rows.map(({ state, openedAt: _, ...row }) => ({ ...row, published: state === 'published' }));
  },
});
