import 'server-only';
import { selectSitting } from '@/db/queries/sittings';
import { changeStandingInput } from '@/lib/contracts/sittings';
import { defineVerb } from '../verb';
import { recordAtDesk } from './record-at-desk';
import { sittingSubject } from './sitting-subject';

/** Whether a student is expected, absent, excused, or gets a zero; kept as an event, as if recorded at the bench. */
export const changeStanding = defineVerb({
  action: 'sitting.change',
  input: changeStandingInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<{ changed: boolean }> {
    const { sittingId, attemptId, standing } = input;
    const sitting = found(await selectSitting(tx, actor.schoolId, sittingId));
    authorize(sittingSubject(sitting));
    const { changed, studentId } = found(
      await recordAtDesk(tx, actor, sitting, {
        attemptId,
        what: '@standing',
        value: { kind: 'standing', standing },
        untouched: { kind: 'standing', standing: 'expected' },
      }),
    );
    if (changed) {
      await log({
        subjectKind: 'attempt',
        subjectId: attemptId,
        aboutPersonId: studentId,
        details: { standing, sittingId },
      });
    }
    return { changed };
  },
});
