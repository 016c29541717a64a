import 'server-only';
import { lockPractical, selectDraft, updateDraft, updatePractical } from '@/db/queries/practicals';
import { putBackDraftInput } from '@/lib/contracts/practicals';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';
import { STALE_DRAFT } from './save-draft';
import { storedReplaced } from './stored';
import type { TakenDraft } from './take-newer-version';

/** Puts the draft back that a newer version of the original was taken over, as the next revision. */
export const putBackDraft = defineVerb({
  action: 'practical.change',
  input: putBackDraftInput,
  async run({ actor, input, tx, found, authorize, refuse, log }): Promise<TakenDraft> {
    const { schoolId, personId } = actor;
    const row = found(await lockPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const draft = found(await selectDraft(tx, schoolId, row.id));
    if (draft.revision !== input.revision) refuse('stale', STALE_DRAFT);
    const { content, sourceVersionId, takenNumber } =
      storedReplaced(draft.replaced) ?? refuse('conflict', 'There is no earlier draft to put back.');
    const kept = { content, savedBy: personId, replaced: null };
    const saved = found(await updateDraft(tx, schoolId, row.id, input.revision, kept));
    const title = content.title.trim().slice(0, 120) || row.title;
    await updatePractical(tx, schoolId, row.id, { title, copiedFromVersionId: sourceVersionId });
    await log({
      subjectKind: 'practical',
      subjectId: row.id,
      details: { putBack: title, insteadOfVersion: takenNumber, fromVersion: sourceVersionId },
    });
    return { content, revision: saved.revision, savedAt: saved.savedAt.toISOString() };
  },
});
