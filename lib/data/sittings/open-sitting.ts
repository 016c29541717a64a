import 'server-only';
import { insertMissingAttempts } from '@/db/queries/rounds';
import { selectSection } from '@/db/queries/sections';
import { insertSitting, selectGivenPracticals, selectVersionsToGive } from '@/db/queries/sittings';
import { openSittingInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';

/** Gives a published version to a section, with a first attempt for everyone in it today. */
export const openSitting = defineVerb({
  action: 'sitting.open',
  input: openSittingInput,
  async run({ actor, input, tx, authorize, found, refuseFields, log }): Promise<{ sittingId: string }> {
    const { schoolId, personId } = actor;
    const { sectionId, versionId, dueOn } = input;
    const section = found(await selectSection(tx, schoolId, sectionId));
    authorize(sectionSubject(section));
    const { departmentId } = section;
    const versions = await selectVersionsToGive(tx, schoolId, { departmentId, personId });
    const version =
      versions.find((row) => row.versionId === versionId) ??
      refuseFields({
        versionId: ['Choose one of your practicals, one that a colleague offers, or the department’s.'],
      });
    const given = await selectGivenPracticals(tx, schoolId, [sectionId]);
    if (given.some(({ practicalId }) => practicalId === version.practicalId)) {
      refuseFields({ versionId: [`This section has “${version.title}” already.`] });
    }
    const sittingId = await insertSitting(tx, {
      schoolId,
      sectionId,
      practicalId: version.practicalId,
      rubricVersionId: versionId,
      dueOn,
      openedBy: personId,
    });
    await insertMissingAttempts(tx, schoolId, sittingId, sectionId);
    await log({ subjectKind: 'sitting', subjectId: sittingId, details: { sectionId, versionId, dueOn } });
    return { sittingId };
  },
});
