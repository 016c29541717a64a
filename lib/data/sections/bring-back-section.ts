import 'server-only';
import { insertAttemptsInOpenSittings, selectEnrollment, updateLeftOn } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { bringBackInput } from '@/lib/contracts/sections';
import { defineVerb } from '../verb';
import { sectionSubject } from './section-view';

/** Takes back that a student left: they are in the section again, as if they had never gone. */
export const bringBackToSection = defineVerb({
  action: 'roster.change',
  input: bringBackInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<{ studentId: string }> {
    const { sectionId, studentId } = input;
    const section = found(await selectSection(tx, actor.schoolId, sectionId));
    authorize(sectionSubject(section));
    const enrolled = found(await selectEnrollment(tx, actor.schoolId, sectionId, studentId));
    if (enrolled.leftOn === null) refuse('conflict', 'This student is in the section already.');
    await updateLeftOn(tx, actor.schoolId, sectionId, { studentId, leftOn: null });
    await insertAttemptsInOpenSittings(tx, actor.schoolId, sectionId);
    await log({
      subjectKind: 'section',
      subjectId: sectionId,
      aboutPersonId: studentId,
      details: { back: true, before: enrolled.leftOn },
    });
    return { studentId };
  },
});
