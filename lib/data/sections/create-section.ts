import 'server-only';
import type { z } from 'zod';
import { insertSection, selectTeachingDepartments } from '@/db/queries/sections';
import { insertTerm, isTermNameTaken, selectTerm } from '@/db/queries/terms';
import { createSectionInput, NEW_TERM } from '@/lib/contracts/sections';
import { type Context, defineVerb } from '../verb';

type Create = Context<z.output<typeof createSectionInput>>;

/** A section of the person's own, with its term: one of the school's, or a new one. */
export const createSection = defineVerb({
  action: 'section.create',
  input: createSectionInput,
  async run(context): Promise<{ sectionId: string }> {
    const { actor, input, tx, authorize, refuseFields, log } = context;
    const { schoolId } = actor;
    authorize({ schoolId });
    const { name, period, departmentId } = input;
    const own = await selectTeachingDepartments(tx, schoolId, actor.personId);
    if (!own.some((department) => department.departmentId === departmentId)) {
      refuseFields({ departmentId: ['Choose a department that you teach in.'] });
    }
    const termId = await findTerm(context);
    const sectionId = await insertSection(
      tx,
      { schoolId, departmentId, termId, name, period },
      actor.personId,
    );
    await log({ subjectKind: 'section', subjectId: sectionId, details: { name, period, termId } });
    return { sectionId };
  },
});

async function findTerm({ actor, input, tx, refuseFields }: Create): Promise<string> {
  const { schoolId } = actor;
  const { termId, termName, startsOn, endsOn } = input;
  if (termId !== NEW_TERM) {
    const term = await selectTerm(tx, schoolId, termId);
    return term?.termId ?? refuseFields({ termId: ['Choose a term of your school.'] });
  }
  if (!termName || !startsOn || !endsOn) return refuseFields({ termName: ['Type a name for the term.'] });
  if (await isTermNameTaken(tx, schoolId, termName, null)) {
    refuseFields({ termName: ['There is a term of this name already. Choose it from the list.'] });
  }
  return insertTerm(tx, { schoolId, name: termName, startsOn, endsOn });
}
