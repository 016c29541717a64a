import 'server-only';
import { insertPerson, replaceStaffRoles, selectPersonByEmail } from '@/db/queries/people';
import { invitePersonInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { sendInvitation } from './send-invitation';
import { isOwnDepartment, NO_SUCH_DEPARTMENT, roleRows } from './staff-roles';

/** Adds a member of staff and sends the invitation; person, roles, link, mail and log stand or fall together. */
export const invitePerson = defineVerb({
  action: 'person.invite',
  input: invitePersonInput,
  async run({ actor, input, tx, authorize, refuseFields, log }): Promise<{ personId: string }> {
    const { schoolId } = actor;
    authorize({ schoolId });
    const { givenName, familyName, email, roles, departmentId } = input;
    const known = await selectPersonByEmail(tx, schoolId, email);
    if (known) {
      const name = `${known.givenName} ${known.familyName}`.trim();
      const how = known.leftAt ? 'Bring that person back instead.' : 'Change that person’s roles instead.';
      refuseFields({ email: [`${name} has this email already. ${how}`] });
    }
    if (!(await isOwnDepartment(tx, schoolId, departmentId))) refuseFields(NO_SUCH_DEPARTMENT);
    const personId = await insertPerson(tx, { schoolId, givenName, familyName, email });
    if (!personId) return refuseFields({ email: ['This email cannot be used here. Use another of theirs.'] });
    await replaceStaffRoles(tx, schoolId, personId, roleRows(roles, departmentId));
    await sendInvitation(tx, actor, { personId, givenName, email, roles });
    await log({ subjectKind: 'person', subjectId: personId, aboutPersonId: personId, details: { roles } });
    return { personId };
  },
});
