import 'server-only';
import { lockPractical, updatePractical } from '@/db/queries/practicals';
import { archivePracticalInput } from '@/lib/contracts/practicals';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';

/** Puts a practical away, or brings it back; its versions and sittings stay as they are, an offer of it ends. */
export const archivePractical = defineVerb({
  action: 'practical.change',
  input: archivePracticalInput,
  async run({ actor, input, tx, found, authorize, log }): Promise<{ archived: boolean }> {
    const { practicalId, archived } = input;
    const row = found(await lockPractical(tx, actor.schoolId, practicalId));
    authorize(practicalSubject(row));
    if (archived === (row.archivedAt !== null)) return { archived };
    const values = archived ? { archivedAt: new Date(), offeredAt: null } : { archivedAt: null };
    await updatePractical(tx, actor.schoolId, practicalId, values);
    const details = archived ? { putAway: row.title } : { broughtBack: row.title };
    await log({ subjectKind: 'practical', subjectId: practicalId, details });
    return { archived };
  },
});
