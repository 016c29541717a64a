import 'server-only';
import { z } from 'zod';
import { selectSchool } from '@/db/queries/school';
import { selectTeachingDepartments } from '@/db/queries/sections';
import { selectTerms } from '@/db/queries/terms';
import { proposeTerm } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

export interface SectionChoicesView {
  departments: { departmentId: string; name: string }[];
  terms: { termId: string; name: string }[];
  /** The term that today lies in; null when the school has none. */
  currentTermId: string | null;
  /** What a first term could be called. */
  proposedTerm: { name: string; startsOn: string; endsOn: string };
}

/** What there is to choose from when a section is made. */
export const readSectionChoices = defineVerb({
  action: 'section.create',
  input: z.strictObject({}),
  async run({ actor, tx, authorize, found }): Promise<SectionChoicesView> {
    authorize({ schoolId: actor.schoolId });
    const { today } = found(await selectSchool(tx, actor.schoolId));
    const terms = await selectTerms(tx, actor.schoolId);
    const current = terms.find(({ startsOn, endsOn }) => startsOn <= today && today <= endsOn);
    return {
      departments: await selectTeachingDepartments(tx, actor.schoolId, actor.personId),
      terms: terms.map(({ termId, name }) => ({ termId, name })),
      currentTermId: current?.termId ?? null,
      proposedTerm: proposeTerm(today),
    };
  },
});
