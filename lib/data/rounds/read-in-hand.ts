import 'server-only';
import { selectRound } from '@/db/queries/rounds';
import { type InHandView, readInHandInput } from '@/lib/contracts/rounds';
import { defineVerb } from '../verb';
import { inHandView } from './in-hand-view';
import { roundSubject } from './round-subject';

/** Whose pieces the other devices of a round have on their benches. */
export const readInHand = defineVerb({
  action: 'round.read',
  input: readInHandInput,
  async run({ actor, input, tx, found, authorize }): Promise<InHandView> {
    const round = found(await selectRound(tx, actor.schoolId, input.sittingId));
    authorize((await roundSubject(tx, round)).subject);
    return inHandView(tx, actor.schoolId, round.sittingId, input.deviceId);
  },
});
