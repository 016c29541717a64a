import 'server-only';
import { selectPerson } from '@/db/queries/people';
import { personInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { type PersonView, viewPerson } from './person-view';

/** One person of the school, for its admin. Looking is logged. */
export const readPerson = defineVerb({
  action: 'person.list',
  input: personInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<PersonView> {
    const person = found(await selectPerson(tx, actor.schoolId, input.personId));
    authorize(person);
    await log({ subjectKind: 'person', subjectId: person.personId, aboutPersonId: person.personId });
    return viewPerson(person, actor.personId);
  },
});
