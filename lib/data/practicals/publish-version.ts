import 'server-only';
import {
  forgetReplaced,
  insertVersion,
  lockPractical,
  selectDraft,
  selectLatestVersion,
} from '@/db/queries/practicals';
import { publishVersionInput } from '@/lib/contracts/practicals';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { defineVerb } from '../verb';
import { departmentRubricOf } from './department-rubric';
import { practicalSubject } from './practical-subject';
import { STALE_DRAFT } from './save-draft';
import { storedDraft, storedVersion } from './stored';

/** Makes the kept draft the next version, which nothing can change afterwards. */
export const publishVersion = defineVerb({
  action: 'practical.change',
  input: publishVersionInput,
  async run({ actor, input, tx, found, authorize, refuse, refuseFields, log }) {
    const { schoolId, personId } = actor;
    const row = found(await lockPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    if (row.archivedAt) refuse('conflict', 'This practical is put away. Bring it back first, then publish.');
    const draft = found(await selectDraft(tx, schoolId, row.id));
    if (draft.revision !== input.revision) refuse('stale', STALE_DRAFT);
    const parsed = parseDraft(storedDraft(draft.content));
    if (!parsed.ok) return refuseFields(parsed.errors);
    const { task, form, rubric } = parsed;
    const latest = await selectLatestVersion(tx, schoolId, row.id);
    if (latest && sameInEffect(storedVersion(latest), parsed)) {
      refuse(
        'conflict',
        `Nothing has changed since version ${latest.number}, so there is nothing to publish.`,
      );
    }
    const number = (latest?.number ?? 0) + 1;
    const department = await departmentRubricOf(tx, row, [task]);
    const differs =
      department !== null && !departmentDifferences(department, { ...parsed, label: 'own' }).same;
    const differenceReason = differs ? input.reason : null;
    const versionId = await insertVersion(tx, {
      schoolId,
      practicalId: row.id,
      number,
      task,
      form,
      rubric,
      engineVersion: ENGINE_VERSION,
      differenceReason,
      publishedBy: personId,
    });
    // What is published is meant: a draft from before it is not put back over it by one press.
    if (draft.replaced !== null) await forgetReplaced(tx, schoolId, row.id);
    await log({
      subjectKind: 'rubric version',
      subjectId: versionId,
      details: { published: task.title, version: number, ...(differenceReason && { differenceReason }) },
    });
    return { versionId, number };
  },
});
