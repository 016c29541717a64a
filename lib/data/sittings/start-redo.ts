import 'server-only';
import { insertAttempt, selectAttempts } from '@/db/queries/attempts';
import { lockSitting, selectSitting } from '@/db/queries/sittings';
import { startRedoInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';

const MOST_ATTEMPTS = 20;

/** Gives a student the next attempt; the one before must be read to the end, or be a zero. */
export const startRedo = defineVerb({
  action: 'sitting.change',
  input: startRedoInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<{ attemptNumber: number }> {
    const { sittingId, studentId } = input;
    await lockSitting(tx, actor.schoolId, sittingId);
    const sitting = found(await selectSitting(tx, actor.schoolId, sittingId));
    authorize(sectionSubject(sitting));
    const all = await selectAttempts(tx, actor.schoolId, [sittingId]);
    const last = found(all.filter((attempt) => attempt.studentId === studentId).at(-1));
    if (!last.here) refuse('conflict', 'This student is no longer in the section.');
    if (last.standing !== 'zero' && !(last.standing === 'expected' && last.complete)) {
      refuse('conflict', `Attempt ${last.number} is not read to the end yet. Finish it first.`);
    }
    if (last.number >= MOST_ATTEMPTS) refuse('conflict', `There are ${MOST_ATTEMPTS} attempts already.`);
    const attemptNumber = last.number + 1;
    const attemptId = await insertAttempt(tx, {
      schoolId: actor.schoolId,
      sittingId,
      studentId,
      number: attemptNumber,
    });
    await log({
      subjectKind: 'attempt',
      subjectId: attemptId,
      aboutPersonId: studentId,
      details: { attemptNumber, sittingId },
    });
    return { attemptNumber };
  },
});
