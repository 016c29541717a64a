import 'server-only';
import { insertDepartment, isDepartmentNameTaken } from '@/db/queries/departments';
import { addDepartmentInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

export const DEPARTMENT_NAME_TAKEN = 'There is a department of this name already.';

export const addDepartment = defineVerb({
  action: 'school.change',
  input: addDepartmentInput,
  async run({ actor, input, tx, authorize, refuseFields, log }): Promise<{ departmentId: string }> {
    authorize({ schoolId: actor.schoolId });
    if (await isDepartmentNameTaken(tx, actor.schoolId, input.name, null)) {
      refuseFields({ name: [DEPARTMENT_NAME_TAKEN] });
    }
    const departmentId = await insertDepartment(tx, actor.schoolId, input.name);
    await log({ subjectKind: 'department', subjectId: departmentId, details: { added: input.name } });
    return { departmentId };
  },
});
