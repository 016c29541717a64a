import 'server-only';
import type { Transaction } from '@/db/client';
import { selectPublications } from '@/db/queries/publications';
import { selectAttemptIds } from '@/db/queries/sheets';
import type { SittingRow } from '@/db/queries/sittings';

type Sitting = Pick<SittingRow, 'schoolId' | 'sittingId'>;

export async function attemptIdsOf(tx: Transaction, { schoolId, sittingId }: Sitting): Promise<string[]> {
  return (await selectAttemptIds(tx, schoolId, sittingId)).map(({ attemptId }) => attemptId);
}

/** The number of the sitting's latest publication, 0 before the first. */
export async function latestPublication(tx: Transaction, { schoolId, sittingId }: Sitting): Promise<number> {
  const [latest] = await selectPublications(tx, schoolId, [sittingId]);
  return latest?.number ?? 0;
}
