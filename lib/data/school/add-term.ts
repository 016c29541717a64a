import 'server-only';
import { insertTerm, isTermNameTaken } from '@/db/queries/terms';
import { addTermInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

export const TERM_NAME_TAKEN = 'There is a term of this name already.';

export const addTerm = defineVerb({
  action: 'term.add',
  input: addTermInput,
  async run({ actor, input, tx, authorize, refuseFields, log }): Promise<{ termId: string }> {
    authorize({ schoolId: actor.schoolId });
    const { termName: name, startsOn, endsOn } = input;
    if (await isTermNameTaken(tx, actor.schoolId, name, null)) refuseFields({ termName: [TERM_NAME_TAKEN] });
    const termId = await insertTerm(tx, { schoolId: actor.schoolId, name, startsOn, endsOn });
    await log({ subjectKind: 'term', subjectId: termId, details: { added: name, startsOn, endsOn } });
    return { termId };
  },
});
