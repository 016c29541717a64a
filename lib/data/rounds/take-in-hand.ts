import 'server-only';
import { deleteInHand, upsertInHand } from '@/db/queries/in-hand';
import { hasAttempt, selectRound } from '@/db/queries/rounds';
import { type InHandView, takeInHandInput } from '@/lib/contracts/rounds';
import { defineVerb } from '../verb';
import { inHandView } from './in-hand-view';
import { roundSubject } from './round-subject';

/** Says whose pieces this device has on its bench now; null puts them down. It is a courtesy, no record, and unlogged. */
export const takeInHand = defineVerb({
  action: 'round.record',
  input: takeInHandInput,
  async run({ actor, input, tx, found, authorize, refuse }): Promise<InHandView> {
    const { schoolId, personId } = actor;
    const { sittingId, deviceId, attemptId } = input;
    const round = found(await selectRound(tx, schoolId, sittingId));
    authorize((await roundSubject(tx, round)).subject);
    if (attemptId === null) await deleteInHand(tx, schoolId, sittingId, deviceId);
    else {
      if (!(await hasAttempt(tx, schoolId, sittingId, attemptId))) {
        refuse('not_found', 'This student’s work is not in this round.');
      }
      await upsertInHand(tx, { schoolId, sittingId, deviceId, personId, attemptId });
    }
    return inHandView(tx, schoolId, sittingId, deviceId);
  },
});
