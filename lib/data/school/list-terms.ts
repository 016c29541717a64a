import 'server-only';
import { z } from 'zod';
import { selectSchool } from '@/db/queries/school';
import { selectTerms } from '@/db/queries/terms';
import { defineVerb } from '../verb';

export interface TermView {
  termId: string;
  name: string;
  startsOn: string;
  endsOn: string;
  sectionCount: number;
  when: 'past' | 'now' | 'coming';
}

/** The school's terms, the latest first, each told from today in the school's own time zone. */
export const listTerms = defineVerb({
  action: 'term.list',
  input: z.object({}),
  async run({ actor, tx, authorize, found }): Promise<TermView[]> {
    const { id, today } = found(await selectSchool(tx, actor.schoolId));
    authorize({ schoolId: id });
    const terms = await selectTerms(tx, id);
    return terms.map((term) => ({ ...term, when: whenIs(term, today) }));
  },
});

function whenIs({ startsOn, endsOn }: { startsOn: string; endsOn: string }, today: string): TermView['when'] {
  if (endsOn < today) return 'past';
  return startsOn > today ? 'coming' : 'now';
}
