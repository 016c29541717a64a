import 'server-only';
import { lockSitting, selectSitting, updateSitting } from '@/db/queries/sittings';
import { changeDueInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';

/** The day the pieces are due, or none. */
export const changeDue = defineVerb({
  action: 'sitting.change',
  input: changeDueInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<{ dueOn: string | null }> {
    const { sittingId, dueOn } = input;
    await lockSitting(tx, actor.schoolId, sittingId);
    const sitting = found(await selectSitting(tx, actor.schoolId, sittingId));
    authorize(sectionSubject(sitting));
    await updateSitting(tx, actor.schoolId, sittingId, { dueOn });
    await log({ subjectKind: 'sitting', subjectId: sittingId, details: { dueOn, before: sitting.dueOn } });
    return { dueOn };
  },
});
