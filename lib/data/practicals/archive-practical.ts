import 'server-only';
import { lockPractical, updatePractical } from '@/db/queries/practicals';
import { archivePracticalInput } from '@/lib/contracts/practicals';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';

/** Puts a practical away, or brings it back; its versions and sittings stay as they are. */
export const archivePractical = defineVerb({
  action: 'practical.change',
  input: archivePracticalInput,
  async run({ actor, input, tx, found, authorize, log }): Promise<{ archived: boolean }> {
    const { practicalId, archived } = input;
    const row = found(await lockPractical(tx, actor.schoolId, practicalId));
    authorize(practicalSubject(row));
    if (archived === (row.archivedAt !== null)) return { archived };
    await updatePractical(tx, actor.schoolId, practicalId, { archivedAt: archived ? new Date() : null });
    const details = archived ? { putAway: row.title } : { broughtBack: row.title };
    await log({ subjectKind: 'practical', subjectId: practicalId, details });
    return { archived };
  },
});
