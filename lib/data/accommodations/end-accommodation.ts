import 'server-only';
import { endStanding, lockConcerned, selectAccommodation } from '@/db/queries/accommodation-lists';
import { endAccommodationInput } from '@/lib/contracts/accommodations';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { defineVerb } from '../verb';
import { accommodationSubject } from './accommodation-view';

/** From now on the student is priced like everybody else again; results that are out stay as they are. */
export const endAccommodation = defineVerb({
  action: 'accommodation.change',
  input: endAccommodationInput,
  async run({ actor, input, tx, authorize, found, refuse, log }) {
    const { schoolId, personId } = actor;
    const { accommodationId } = input;
    const row = found(await selectAccommodation(tx, schoolId, accommodationId));
    authorize(accommodationSubject(row));
    if (!(await endStanding(tx, schoolId, accommodationId, personId))) {
      refuse('conflict', 'This modified rubric has ended already.');
    }
    await rebuildSheets(tx, schoolId, await lockConcerned(tx, schoolId, row));
    await log({
      subjectKind: 'accommodation',
      subjectId: accommodationId,
      aboutPersonId: row.studentId,
      details: { modifiedRubric: 'ended' },
    });
    return { accommodationId };
  },
});
