import 'server-only';
import { insertMove } from '@/db/queries/moves';
import { lockAttempts } from '@/db/queries/rounds';
import { lockSitting, selectSitting } from '@/db/queries/sittings';
import { type MovedView, moveSittingInput } from '@/lib/contracts/moves';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { makeMovePreview } from './make-move-preview';
import { attemptIdsOf, latestPublication } from './moved-sitting';
import { targetVersion } from './target-version';

/**
 * Moves a sitting to another version of its practical, as the teacher saw it in the preview: nothing is measured
 * again, everything is priced anew, in one transaction with the log entry. Results that are out stay as they were
 * told until the next publication.
 */
export const moveSitting = defineVerb({
  action: 'sitting.move',
  input: moveSittingInput,
  async run(context): Promise<MovedView> {
    const { actor, input, tx, following, authorize, found, refuse, log } = context;
    const { schoolId, personId } = actor;
    const { sittingId, versionId, holdHarmless } = input;
    await lockSitting(tx, schoolId, sittingId);
    const sitting = found(await selectSitting(tx, schoolId, sittingId));
    authorize(sectionSubject(sitting));
    const to = await targetVersion(tx, sitting, versionId, context);
    // A reading that is being kept meanwhile is waited for, so that none is priced by the version before.
    const attemptIds = await attemptIdsOf(tx, sitting);
    await lockAttempts(tx, schoolId, sittingId, attemptIds);
    const preview = await makeMovePreview(tx, sitting, to, following);
    if (preview.seen !== input.seen) {
      refuse('stale', 'Something has changed since you looked: look at who gains and who loses again.');
    }
    const moveId = await insertMove(tx, {
      schoolId,
      sittingId,
      practicalId: sitting.practicalId,
      fromVersionId: sitting.rubricVersionId,
      toVersionId: versionId,
      holdHarmless,
      afterPublication: await latestPublication(tx, sitting),
      movedBy: personId,
    });
    await rebuildSheets(tx, schoolId, attemptIds);
    const { from, gain, same, lose, meanChange } = preview;
    await log({
      subjectKind: 'sitting',
      subjectId: sittingId,
      details: {
        ...{ moveId, from: from.number, to: to.number, holdHarmless },
        ...{ gain, same, lose, meanChange, attempts: attemptIds.length },
      },
    });
    return { sittingId, sectionId: sitting.sectionId, versionNumber: to.number, attempts: attemptIds.length };
  },
});
