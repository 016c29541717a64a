import 'server-only';
import { selectSchool, updateSchool } from '@/db/queries/school';
import { changeSchoolInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

/** Changes the school's name, time zone and unit; its code stays, for it stands on students' slips. */
export const changeSchool = defineVerb({
  action: 'school.change',
  input: changeSchoolInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<null> {
    const school = found(await selectSchool(tx, actor.schoolId));
    authorize({ schoolId: school.id });
    await updateSchool(tx, school.id, input);
    const { name, timeZone, unit } = school;
    await log({
      subjectKind: 'school',
      subjectId: school.id,
      details: { was: { name, timeZone, unit }, now: input },
    });
    return null;
  },
});
