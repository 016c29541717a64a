import 'server-only';
import { isDepartmentNameTaken, selectDepartment, updateDepartment } from '@/db/queries/departments';
import { renameDepartmentInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { DEPARTMENT_NAME_TAKEN } from './add-department';

export const renameDepartment = defineVerb({
  action: 'school.change',
  input: renameDepartmentInput,
  async run({ actor, input, tx, authorize, found, refuseFields, log }): Promise<null> {
    const department = found(await selectDepartment(tx, actor.schoolId, input.departmentId));
    authorize(department);
    if (await isDepartmentNameTaken(tx, actor.schoolId, input.name, department.departmentId)) {
      refuseFields({ name: [DEPARTMENT_NAME_TAKEN] });
    }
    await updateDepartment(tx, actor.schoolId, department.departmentId, input.name);
    await log({
      subjectKind: 'department',
      subjectId: department.departmentId,
      details: { was: department.name, now: input.name },
    });
    return null;
  },
});
