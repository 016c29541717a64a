import 'server-only';
import { isTermNameTaken, selectTerm, updateTerm } from '@/db/queries/terms';
import { changeTermInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { TERM_NAME_TAKEN } from './add-term';

export const changeTerm = defineVerb({
  action: 'term.change',
  input: changeTermInput,
  async run({ actor, input, tx, authorize, found, refuseFields, log }): Promise<null> {
    const term = found(await selectTerm(tx, actor.schoolId, input.termId));
    authorize(term);
    const { termName: name, startsOn, endsOn } = input;
    if (await isTermNameTaken(tx, actor.schoolId, name, term.termId)) {
      refuseFields({ termName: [TERM_NAME_TAKEN] });
    }
    await updateTerm(tx, actor.schoolId, term.termId, { name, startsOn, endsOn });
    await log({
      subjectKind: 'term',
      subjectId: term.termId,
      details: { was: term.name, now: name, startsOn, endsOn },
    });
    return null;
  },
});
