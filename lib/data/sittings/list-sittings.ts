import 'server-only';
import { z } from 'zod';
import { selectProgress } from '@/db/queries/attempts';
import { selectPublications } from '@/db/queries/publications';
import { selectSittingsOfTeacher } from '@/db/queries/sittings';
import { defineVerb } from '../verb';

export interface SittingListView {
  sittingId: string;
  sectionId: string;
  title: string;
  sectionName: string;
  period: string;
  versionNumber: number;
  dueOn: string | null;
  published: boolean;
  publishedAt: string | null;
  timeZone: string;
  /** In the section today, each with the latest attempt. */
  students: number;
  /** Read to the end, or decided to be a zero. */
  read: number;
  begun: number;
  /** Absent or excused. */
  away: number;
  conflicts: number;
}

const NONE = { students: 0, read: 0, begun: 0, away: 0, conflicts: 0 };

/** The sittings of a teacher's sections, those still open first, by period. */
export const listSittings = defineVerb({
  action: 'sitting.list',
  input: z.strictObject({}),
  async run({ actor, tx }): Promise<SittingListView[]> {
    const { schoolId, personId } = actor;
    const rows = await selectSittingsOfTeacher(tx, schoolId, personId);
    const ids = rows.map(({ sittingId }) => sittingId);
    const publications = ids.length > 0 ? await selectPublications(tx, schoolId, ids) : [];
    const progress = new Map(
      (await selectProgress(tx, schoolId, ids)).map(({ sittingId, ...counts }) => [sittingId, counts]),
    );
    return rows.map(({ state, ...row }) => ({
      ...row,
      published: state === 'published',
      publishedAt:
        publications.find(({ sittingId }) => sittingId === row.sittingId)?.publishedAt.toISOString() ?? null,
      ...(progress.get(row.sittingId) ?? NONE),
    }));
  },
});
