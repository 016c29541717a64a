import 'server-only';
import { selectAccommodation, selectReason } from '@/db/queries/accommodation-lists';
import { readReasonInput } from '@/lib/contracts/accommodations';
import { defineVerb } from '../verb';
import { accommodationSubject } from './accommodation-view';

export interface ReasonView {
  reason: string;
  writtenBy: string;
  writtenAt: string;
}

/** Why a rubric is modified for a student. Every single look is logged, about the student. */
export const readReason = defineVerb({
  action: 'accommodation.reason',
  input: readReasonInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<ReasonView> {
    const { accommodationId } = input;
    const row = found(await selectAccommodation(tx, actor.schoolId, accommodationId));
    authorize(accommodationSubject(row));
    const { reason, writtenBy, writtenAt } = found(await selectReason(tx, actor.schoolId, accommodationId));
    await log({
      subjectKind: 'accommodation',
      subjectId: accommodationId,
      aboutPersonId: row.studentId,
    });
    return { reason, writtenBy, writtenAt: writtenAt.toISOString() };
  },
});
