import 'server-only';
import {
  lockPractical,
  selectDraft,
  selectLatestVersion,
  selectVersion,
  updateDraft,
} from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { takePricesInput } from '@/lib/contracts/variants';
import { takePrices as pricesTaken } from '@/lib/practicals/take-prices';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';
import { STALE_DRAFT } from './save-draft';
import { type ReplacedDraft, storedDraft, storedVersion } from './stored';

/** Takes the prices of the original's latest version into a variant's draft; its words and sizes stay. */
export const takePrices = defineVerb({
  action: 'practical.change',
  input: takePricesInput,
  async run({ actor, input, tx, found, authorize, refuse, log }): Promise<{ revision: number }> {
    const { schoolId, personId } = actor;
    const row = found(await lockPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const { sourceKind, copiedFromVersionId: sourceVersionId } = row;
    if (sourceKind !== 'variant' || !sourceVersionId) {
      return refuse('conflict', 'This practical is no variant, so there are no prices to take over.');
    }
    const source = found(await selectVersion(tx, schoolId, sourceVersionId));
    const latest = found(await selectLatestVersion(tx, schoolId, source.practicalId));
    found(may(actor, 'version.read', practicalSubject(source)) ? latest : null);
    if (latest.id !== input.versionId) {
      refuse('stale', 'The original was published again since. Look at the difference once more.');
    }
    const draft = found(await selectDraft(tx, schoolId, row.id));
    if (draft.revision !== input.revision) refuse('stale', STALE_DRAFT);
    const before = storedDraft(draft.content);
    const content = pricesTaken({ number: latest.number, ...storedVersion(latest) }, before);
    const replaced: ReplacedDraft = { content: before, sourceVersionId, takenNumber: latest.number };
    const kept = { content, savedBy: personId, replaced };
    const saved = found(await updateDraft(tx, schoolId, row.id, input.revision, kept));
    const details = { tookPrices: row.title, version: latest.number, fromVersion: latest.id };
    await log({ subjectKind: 'practical', subjectId: row.id, details });
    return { revision: saved.revision };
  },
});
