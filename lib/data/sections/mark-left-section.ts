import 'server-only';
import { selectEnrollment, updateLeftOn } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { moveStudentInput } from '@/lib/contracts/sections';
import { defineVerb } from '../verb';
import { sectionSubject } from './section-view';

/** A student is no longer in the section from this day on; what they made and earned there stays. */
export const markLeftSection = defineVerb({
  action: 'roster.change',
  input: moveStudentInput,
  async run({ actor, input, tx, authorize, found, refuseFields, log }): Promise<{ leftOn: string }> {
    const { sectionId, studentId, leftOn } = input;
    const section = found(await selectSection(tx, actor.schoolId, sectionId));
    authorize(sectionSubject(section));
    const enrolled = found(await selectEnrollment(tx, actor.schoolId, sectionId, studentId));
    if (leftOn < enrolled.joinedOn) {
      refuseFields({ leftOn: [`This is before the day they joined, ${enrolled.joinedOn}.`] });
    }
    await updateLeftOn(tx, actor.schoolId, sectionId, { studentId, leftOn });
    await log({
      subjectKind: 'section',
      subjectId: sectionId,
      aboutPersonId: studentId,
      details: { leftOn, before: enrolled.leftOn },
    });
    return { leftOn };
  },
});
