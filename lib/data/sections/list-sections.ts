import 'server-only';
import { z } from 'zod';
import { countSittings, type SectionScope, selectSections } from '@/db/queries/sections';
import type { Actor } from '@/lib/auth/actor';
import { defineVerb } from '../verb';
import { asSectionView, type SectionView } from './section-view';

export interface SectionListView extends SectionView {
  /** By the school's own clock. */
  termWhen: 'past' | 'now' | 'coming';
  sittings: number;
  openSittings: number;
}

/** The sections that a person works with: a teacher's own, a head's department, an admin's whole school. */
export const listSections = defineVerb({
  action: 'section.list',
  input: z.strictObject({}),
  async run({ actor, tx, authorize }): Promise<SectionListView[]> {
    authorize({ schoolId: actor.schoolId });
    const rows = await selectSections(tx, actor.schoolId, scopeOf(actor));
    const counts = new Map((await countSittings(tx, actor.schoolId)).map((row) => [row.sectionId, row]));
    return rows.map((row) => ({
      ...asSectionView(row),
      termWhen: row.termEndsOn < row.today ? 'past' : row.termStartsOn > row.today ? 'coming' : 'now',
      sittings: counts.get(row.sectionId)?.given ?? 0,
      openSittings: counts.get(row.sectionId)?.open ?? 0,
    }));
  },
});

function scopeOf({ role, personId, departmentId }: Actor): SectionScope {
  if (role === 'admin') return {};
  // A head without a department leads none, and then sees none.
  if (role === 'head') return { departmentId: departmentId ?? personId };
  return { teacherId: personId };
}
