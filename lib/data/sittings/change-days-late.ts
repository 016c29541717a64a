import 'server-only';
import { selectSitting } from '@/db/queries/sittings';
import { changeDaysLateInput } from '@/lib/contracts/sittings';
import { defineVerb } from '../verb';
import { recordAtDesk } from './record-at-desk';
import { sittingSubject } from './sitting-subject';

/** How many days late the pieces came in; what that costs is the rubric's matter. */
export const changeDaysLate = defineVerb({
  action: 'sitting.change',
  input: changeDaysLateInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<{ changed: boolean }> {
    const { sittingId, attemptId, days } = input;
    const sitting = found(await selectSitting(tx, actor.schoolId, sittingId));
    authorize(sittingSubject(sitting));
    const { changed, studentId } = found(
      await recordAtDesk(tx, actor, sitting, {
        attemptId,
        what: '@days-late',
        value: { kind: 'days-late', days },
        untouched: { kind: 'days-late', days: 0 },
      }),
    );
    if (changed) {
      await log({
        subjectKind: 'attempt',
        subjectId: attemptId,
        aboutPersonId: studentId,
        details: { daysLate: days, sittingId },
      });
    }
    return { changed };
  },
});
