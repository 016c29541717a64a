import 'server-only';
import { z } from 'zod';
import { selectDepartments } from '@/db/queries/departments';
import { defineVerb } from '../verb';

export interface DepartmentView {
  departmentId: string;
  name: string;
  sectionCount: number;
  heads: string[];
}

export const listDepartments = defineVerb({
  action: 'school.read',
  input: z.object({}),
  async run({ actor, tx, authorize }): Promise<DepartmentView[]> {
    authorize({ schoolId: actor.schoolId });
    return selectDepartments(tx, actor.schoolId);
  },
});
