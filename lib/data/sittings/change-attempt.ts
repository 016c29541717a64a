import 'server-only';
import { selectSitting } from '@/db/queries/sittings';
import { changeAttemptInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { recordAtDesk } from './record-at-desk';

/**
 * What a teacher decides about an attempt at the desk: whether the student is expected, absent, excused or gets a zero,
 * and how many days late the pieces came. Kept as events, as if recorded at the bench; what is said already is not
 * said again.
 */
export const changeAttempt = defineVerb({
  action: 'sitting.change',
  input: changeAttemptInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<{ changed: boolean }> {
    const { sittingId, attemptId, standing, days } = input;
    const sitting = found(await selectSitting(tx, actor.schoolId, sittingId));
    authorize(sectionSubject(sitting));
    const noted = found(
      await recordAtDesk(tx, actor, sitting, attemptId, [
        ...(standing === undefined
          ? []
          : [
              {
                what: '@standing' as const,
                value: { kind: 'standing' as const, standing },
                untouched: { kind: 'standing' as const, standing: 'expected' as const },
              },
            ]),
        ...(days === undefined
          ? []
          : [
              {
                what: '@days-late' as const,
                value: { kind: 'days-late' as const, days },
                untouched: { kind: 'days-late' as const, days: 0 },
              },
            ]),
      ]),
    );
    if (noted.changed) {
      await log({
        subjectKind: 'attempt',
        subjectId: attemptId,
        aboutPersonId: noted.studentId,
        details: { standing: standing ?? null, daysLate: days ?? null, sittingId },
      });
    }
    return { changed: noted.changed };
  },
});
