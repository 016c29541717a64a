import 'server-only';
import { selectSitting } from '@/db/queries/sittings';
import { type MovePreview, previewMoveInput } from '@/lib/contracts/moves';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { makeMovePreview } from './make-move-preview';
import { targetVersion } from './target-version';

/** What moving a sitting to another version of its practical would do to every attempt. Changes nothing. */
export const previewMove = defineVerb({
  action: 'sitting.move',
  input: previewMoveInput,
  async run(context): Promise<MovePreview> {
    const { actor, input, tx, following, authorize, found, logView } = context;
    const sitting = found(await selectSitting(tx, actor.schoolId, input.sittingId));
    authorize(sectionSubject(sitting));
    const to = await targetVersion(tx, sitting, input.versionId, context);
    const preview = await makeMovePreview(tx, sitting, to, following);
    await logView(
      {
        subjectKind: 'sitting',
        subjectId: sitting.sittingId,
        details: { students: preview.students.length },
      },
      'sitting.read',
    );
    return preview;
  },
});
