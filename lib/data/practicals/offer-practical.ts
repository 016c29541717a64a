import 'server-only';
import { lockPractical, selectLatestVersion, updatePractical } from '@/db/queries/practicals';
import { offerPracticalInput } from '@/lib/contracts/practicals';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';

/** Offers what is published of a practical to the department, or withdraws it; copies that were taken stay. */
export const offerPractical = defineVerb({
  action: 'practical.change',
  input: offerPracticalInput,
  async run({ actor, input, tx, found, authorize, refuse, log }): Promise<{ offered: boolean }> {
    const { practicalId, offered } = input;
    const row = found(await lockPractical(tx, actor.schoolId, practicalId));
    authorize(practicalSubject(row));
    if (offered === (row.offeredAt !== null)) return { offered };
    if (offered && row.archivedAt) {
      refuse('conflict', 'This practical is put away. Bring it back first, then offer it.');
    }
    if (offered && !(await selectLatestVersion(tx, actor.schoolId, practicalId))) {
      refuse('conflict', 'Nothing is published of this practical yet. Publish version 1, then offer it.');
    }
    await updatePractical(tx, actor.schoolId, practicalId, { offeredAt: offered ? new Date() : null });
    const details = offered ? { offered: row.title } : { withdrawn: row.title };
    await log({ subjectKind: 'practical', subjectId: practicalId, details });
    return { offered };
  },
});
