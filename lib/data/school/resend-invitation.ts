import 'server-only';
import { selectPerson } from '@/db/queries/people';
import { personInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { isStaff } from './person-view';
import { sendInvitation } from './send-invitation';

/** Sends a new invitation to somebody who has not accepted one; the links sent before stop working. */
export const resendInvitation = defineVerb({
  action: 'person.invite',
  input: personInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<{ email: string }> {
    const person = found(await selectPerson(tx, actor.schoolId, input.personId));
    authorize(person);
    const { personId, givenName, email, roles } = person;
    if (person.leftAt || !isStaff(person.roles) || email === null) {
      return refuse('conflict', 'Only staff with an email, who have not left, can be invited.');
    }
    if (person.hasPassword) {
      refuse('conflict', `${givenName} has accepted already. “Forgotten password” helps if it is lost.`);
    }
    await sendInvitation(tx, actor, { personId, givenName, email, roles: roles.map(({ role }) => role) });
    await log({
      subjectKind: 'person',
      subjectId: personId,
      aboutPersonId: personId,
      details: { again: true },
    });
    return { email };
  },
});
