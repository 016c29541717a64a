import 'server-only';
import type { Transaction } from '@/db/client';
import { selectLockEvents } from '@/db/queries/attempts';
import { type CellEvent, deriveCells } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';

/** The attempts whose standing lock came after the bench had begun, without a receipt. */
export async function lateLocks(
  tx: Transaction,
  { schoolId, sittingId }: { schoolId: string; sittingId: string },
): Promise<Set<string>> {
  const byAttempt = new Map<string, (CellEvent & { flags: string[] })[]>();
  for (const row of await selectLockEvents(tx, schoolId, sittingId)) {
    const events = byAttempt.get(row.attemptId) ?? [];
    byAttempt.set(row.attemptId, [...events, { ...asCellEvent(row), flags: row.flags }]);
  }
  const isLate = (events: (CellEvent & { flags: string[] })[]) =>
    [...deriveCells(events, 'own').values()].some(({ heads }) =>
      heads.some(({ flags }) => flags.includes('late-lock')),
    );
  return new Set([...byAttempt].flatMap(([attemptId, events]) => (isLate(events) ? [attemptId] : [])));
}
