import 'server-only';
import { selectStandingMoves, undoMoveRow } from '@/db/queries/moves';
import { lockAttempts } from '@/db/queries/rounds';
import { lockSitting, selectSitting } from '@/db/queries/sittings';
import { type MovedView, undoMoveInput } from '@/lib/contracts/moves';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { attemptIdsOf, latestPublication } from './moved-sitting';

/**
 * Takes the latest move of a sitting back, as long as nothing was published after it: the sitting returns to the
 * version it came from and everything is priced by that again. The move stays on record, with who undid it.
 */
export const undoMove = defineVerb({
  action: 'sitting.move',
  input: undoMoveInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<MovedView> {
    const { schoolId, personId } = actor;
    const { sittingId, moveId } = input;
    await lockSitting(tx, schoolId, sittingId);
    const sitting = found(await selectSitting(tx, schoolId, sittingId));
    authorize(sectionSubject(sitting));
    const latest = (await selectStandingMoves(tx, schoolId, [sittingId])).at(-1);
    if (latest?.moveId !== moveId) {
      return refuse('conflict', 'This is not the latest move that stands: only that one can be taken back.');
    }
    if ((await latestPublication(tx, sitting)) > latest.afterPublication) {
      refuse('conflict', 'Results were published after this move. Move the sitting again instead.');
    }
    const attemptIds = await attemptIdsOf(tx, sitting);
    await lockAttempts(tx, schoolId, sittingId, attemptIds);
    await undoMoveRow(tx, schoolId, latest, personId);
    await rebuildSheets(tx, schoolId, attemptIds);
    const { versionNumber } = found(await selectSitting(tx, schoolId, sittingId));
    await log({
      subjectKind: 'sitting',
      subjectId: sittingId,
      details: {
        undone: moveId,
        from: sitting.versionNumber,
        to: versionNumber,
        attempts: attemptIds.length,
      },
    });
    return { sittingId, sectionId: sitting.sectionId, versionNumber, attempts: attemptIds.length };
  },
});
