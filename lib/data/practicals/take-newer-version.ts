import 'server-only';
import {
  lockPractical,
  type PracticalRow,
  selectDraft,
  selectVersion,
  updateDraft,
  updatePractical,
} from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { takeNewerVersionInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { takeOver } from '@/lib/practicals/take-over';
import { type Context, defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';
import { STALE_DRAFT } from './save-draft';
import { type ReplacedDraft, storedDraft, storedVersion } from './stored';

export interface TakenDraft {
  content: PracticalDraft;
  revision: number;
  savedAt: string;
}

/**
 * Takes a newer version of the original over into the draft of a copy, under the copy's own title. The draft that gives
 * way is kept and can be put back.
 */
export const takeNewerVersion = defineVerb({
  action: 'practical.change',
  input: takeNewerVersionInput,
  async run(context): Promise<TakenDraft> {
    const { actor, input, tx, found, authorize, refuse, log } = context;
    const { schoolId, personId } = actor;
    const row = found(await lockPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const draft = found(await selectDraft(tx, schoolId, row.id));
    if (draft.revision !== input.revision) refuse('stale', STALE_DRAFT);
    const before = storedDraft(draft.content);
    const { sourceVersionId, newer } = await loadNewer(context, row);
    const content = takeOver(storedVersion(newer), before);
    const replaced: ReplacedDraft = { content: before, sourceVersionId, takenNumber: newer.number };
    const kept = { content, savedBy: personId, replaced };
    const saved = found(await updateDraft(tx, schoolId, row.id, input.revision, kept));
    await updatePractical(tx, schoolId, row.id, { copiedFromVersionId: newer.versionId });
    await log({
      subjectKind: 'practical',
      subjectId: row.id,
      details: { tookOver: row.title, version: newer.number, fromVersion: newer.versionId },
    });
    return { content, revision: saved.revision, savedAt: saved.savedAt.toISOString() };
  },
});

/** The version asked for, if it is a later one of the same original and may be looked at. */
async function loadNewer(
  { actor, input, tx, found, refuse }: Context<{ versionId: string }>,
  row: PracticalRow,
) {
  const { schoolId } = actor;
  const { copiedFromVersionId, sourceKind } = row;
  if (!copiedFromVersionId) {
    return refuse(
      'conflict',
      'This practical was not taken from a version, so there is nothing to take over.',
    );
  }
  if (sourceKind === 'variant') {
    return refuse(
      'conflict',
      'A variant has sizes of its own. Take the prices over where its variants stand.',
    );
  }
  const source = found(await selectVersion(tx, schoolId, copiedFromVersionId));
  const newer = found(await selectVersion(tx, schoolId, input.versionId));
  found(newer.practicalId === source.practicalId ? newer : null);
  found(may(actor, 'version.read', practicalSubject(newer)) ? newer : null);
  if (newer.number <= source.number) {
    refuse('conflict', `This practical stands on version ${source.number} already.`);
  }
  return { sourceVersionId: copiedFromVersionId, newer };
}
