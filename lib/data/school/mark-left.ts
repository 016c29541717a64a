import 'server-only';
import { deleteSessions, endLinks } from '@/db/queries/account';
import { endEnrollments, selectPerson, updateLeft } from '@/db/queries/people';
import { personInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

/** Marks a person as left: they can no longer sign in, are on no roster from today, and what they recorded stays. */
export const markLeft = defineVerb({
  action: 'person.change',
  input: personInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<null> {
    const { schoolId } = actor;
    const person = found(await selectPerson(tx, schoolId, input.personId));
    authorize(person);
    if (person.personId === actor.personId)
      refuse('conflict', 'You cannot mark yourself as left; another admin can.');
    if (person.leftAt) return null;
    await updateLeft(tx, schoolId, person.personId, new Date());
    await endEnrollments(tx, schoolId, person.personId);
    await deleteSessions(tx, schoolId, person.personId);
    await endLinks(tx, schoolId, person.personId);
    await log({
      subjectKind: 'person',
      subjectId: person.personId,
      aboutPersonId: person.personId,
      details: { left: true },
    });
    return null;
  },
});
