import 'server-only';
import { z } from 'zod';
import { selectRounds } from '@/db/queries/rounds';
import { selectPublications } from '@/db/queries/sittings';
import { defineVerb } from '../verb';

export interface SittingListView {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  versionNumber: number;
  dueOn: string | null;
  published: boolean;
  publishedAt: string | null;
  students: number;
  finished: number;
  begun: number;
  absent: number;
  conflicts: number;
}

/** The sittings of a teacher's sections, those still open first. */
export const listSittings = defineVerb({
  action: 'sitting.list',
  input: z.strictObject({}),
  async run({ actor, tx }): Promise<SittingListView[]> {
    const duty = actor.role === 'aide' ? 'aide' : 'teacher';
    const rows = await selectRounds(tx, actor.schoolId, actor.personId, duty);
    const ids = rows.map(({ sittingId }) => sittingId);
    const publications = ids.length > 0 ? await selectPublications(tx, actor.schoolId, ids) : [];
    return rows
      .map(({ state, openedAt: _, ...row }) => ({
        ...row,
        published: state === 'published',
        publishedAt:
          publications.find(({ sittingId }) => sittingId === row.sittingId)?.publishedAt.toISOString() ??
          null,
      }))
      .sort((a, b) => Number(a.published) - Number(b.published));
  },
});
