import 'server-only';
import { z } from 'zod';
import { selectDepartments } from '@/db/queries/departments';
import { countWaiting } from '@/db/queries/people';
import { countRoles, countSections, selectSchool } from '@/db/queries/school';
import { selectTermOn } from '@/db/queries/terms';
import { defineVerb } from '../verb';

export interface SchoolView {
  name: string;
  code: string;
  timeZone: string;
  unit: 'in' | 'mm';
  today: string;
  currentTerm: { name: string; startsOn: string; endsOn: string } | null;
  departmentCount: number;
  teacherCount: number;
  studentCount: number;
  sectionCount: number;
  /** Staff who were invited and have not chosen a password yet. */
  waitingCount: number;
}

/** The school at a glance, as far as its admin has to see to it. */
export const readSchool = defineVerb({
  action: 'school.read',
  input: z.object({}),
  async run({ actor, tx, authorize, found }): Promise<SchoolView> {
    const school = found(await selectSchool(tx, actor.schoolId));
    authorize({ schoolId: school.id });
    const { name, code, timeZone, unit, today } = school;
    const currentTerm = (await selectTermOn(tx, school.id, today)) ?? null;
    const roles = await countRoles(tx, school.id);
    return {
      name,
      code,
      timeZone,
      unit,
      today,
      currentTerm,
      departmentCount: (await selectDepartments(tx, school.id)).length,
      teacherCount: roles.get('teacher') ?? 0,
      studentCount: roles.get('student') ?? 0,
      sectionCount: await countSections(tx, school.id),
      waitingCount: await countWaiting(tx, school.id),
    };
  },
});
