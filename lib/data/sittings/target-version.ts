import 'server-only';
import type { Transaction } from '@/db/client';
import { selectWholeVersions } from '@/db/queries/moves';
import type { SittingRow } from '@/db/queries/sittings';
import { asPublished } from '../pricing/load-pricing';
import type { PublishedVersion } from '../pricing/pricing';
import type { Context } from '../verb';

/** The version that a sitting is to be moved to: another published one of its practical. */
export async function targetVersion(
  tx: Transaction,
  sitting: SittingRow,
  versionId: string,
  { found, refuseFields }: Pick<Context<unknown>, 'found' | 'refuseFields'>,
): Promise<PublishedVersion> {
  const versions = await selectWholeVersions(tx, sitting.schoolId, sitting.practicalId);
  const row = found(versions.find((version) => version.versionId === versionId));
  if (versionId === sitting.rubricVersionId) {
    refuseFields({ versionId: [`The sitting stands under version ${row.number} already.`] });
  }
  return asPublished(row);
}
