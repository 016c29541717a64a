import 'server-only';
import { lockPractical, updateDraft, updatePractical } from '@/db/queries/practicals';
import { saveDraftInput } from '@/lib/contracts/practicals';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';

export const STALE_DRAFT =
  'This practical was changed in another place since you opened it. Nothing you typed is lost: choose which one to keep.';

/** Keeps a draft as typed, good or bad, unless another one was kept since it was read. */
export const saveDraft = defineVerb({
  action: 'practical.change',
  input: saveDraftInput,
  async run({ actor, input, tx, found, authorize, refuse, refuseFields, log }) {
    const { practicalId, revision, content } = input;
    const row = found(await lockPractical(tx, actor.schoolId, practicalId));
    authorize(practicalSubject(row));
    if (content.unit !== row.unit) refuseFields({ unit: ['A practical keeps the unit it was made in.'] });
    const saved = await updateDraft(tx, actor.schoolId, practicalId, revision, {
      content,
      savedBy: actor.personId,
    });
    if (!saved) return refuse('stale', STALE_DRAFT);
    const title = content.title.trim().slice(0, 120);
    if (title && title !== row.title) await updatePractical(tx, actor.schoolId, practicalId, { title });
    await log({
      subjectKind: 'practical',
      subjectId: practicalId,
      details: { keptDraft: saved.revision },
    });
    return { revision: saved.revision, savedAt: saved.savedAt.toISOString() };
  },
});
