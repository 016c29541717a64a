import 'server-only';
import { lockPractical, updateDraft, updatePractical } from '@/db/queries/practicals';
import { takeBackVersionInput } from '@/lib/contracts/versions';
import { draftOf } from '@/lib/practicals/draft-of';
import { defineVerb } from '../verb';
import { loadVersions } from './load-versions';
import { practicalSubject } from './practical-subject';
import { STALE_DRAFT } from './save-draft';
import { storedVersion } from './stored';

/** Makes one's draft say again what a version says; the version stays as it is. */
export const takeBackVersion = defineVerb({
  action: 'practical.change',
  input: takeBackVersionInput,
  async run(context): Promise<{ revision: number; savedAt: string }> {
    const { actor, input, tx, found, authorize, refuse, log } = context;
    const { schoolId, personId } = actor;
    const practical = found(await lockPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(practical));
    const { versions } = await loadVersions(context, practical.id);
    const { row } = found(versions.find((each) => each.row.number === input.number));
    const { task, form } = storedVersion(row);
    const kept = { content: draftOf(task, form), savedBy: personId };
    const saved = await updateDraft(tx, schoolId, practical.id, input.revision, kept);
    if (!saved) return refuse('stale', STALE_DRAFT);
    if (task.title !== practical.title)
      await updatePractical(tx, schoolId, practical.id, { title: task.title });
    await log({
      subjectKind: 'practical',
      subjectId: practical.id,
      details: { tookBackVersion: input.number, keptDraft: saved.revision },
    });
    return { revision: saved.revision, savedAt: saved.savedAt.toISOString() };
  },
});
