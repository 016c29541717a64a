import 'server-only';
import { selectPerson, updateLeft } from '@/db/queries/people';
import { personInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

/** Undoes a departure: the person signs in with the password or passphrase they had; a teacher puts them on a roster again. */
export const bringBack = defineVerb({
  action: 'person.change',
  input: personInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<null> {
    const person = found(await selectPerson(tx, actor.schoolId, input.personId));
    authorize(person);
    if (!person.leftAt) return null;
    await updateLeft(tx, actor.schoolId, person.personId, null);
    await log({
      subjectKind: 'person',
      subjectId: person.personId,
      aboutPersonId: person.personId,
      details: { left: false },
    });
    return null;
  },
});
