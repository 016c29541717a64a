import 'server-only';
import { replaceStaffRoles, selectPerson } from '@/db/queries/people';
import { changeRolesInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { isOwnDepartment, NO_SUCH_DEPARTMENT, roleRows } from './staff-roles';

/** Changes which staff roles a person holds, from the next request on. Nobody takes the admin role from themselves. */
export const changeRoles = defineVerb({
  action: 'person.change',
  input: changeRolesInput,
  async run({ actor, input, tx, authorize, found, refuse, refuseFields, log }): Promise<null> {
    const { schoolId } = actor;
    const person = found(await selectPerson(tx, schoolId, input.personId));
    authorize(person);
    const { roles, departmentId } = input;
    if (person.leftAt || person.email === null) {
      refuse('conflict', 'Roles are for people with an email who have not left.');
    }
    if (person.personId === actor.personId && !roles.includes('admin')) {
      refuseFields({ roles: ['You cannot take the admin role from yourself; another admin can.'] });
    }
    if (!(await isOwnDepartment(tx, schoolId, departmentId))) refuseFields(NO_SUCH_DEPARTMENT);
    await replaceStaffRoles(tx, schoolId, person.personId, roleRows(roles, departmentId));
    await log({
      subjectKind: 'person',
      subjectId: person.personId,
      aboutPersonId: person.personId,
      details: { was: person.roles.map(({ role }) => role), now: roles },
    });
    return null;
  },
});
