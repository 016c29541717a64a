import 'server-only';
import type { Transaction } from '@/db/client';
import { selectEventsOf } from '@/db/queries/sheets';
import type { ScoreSheet } from '@/lib/scoring';
import { type CellEvent, deriveAttempt } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';
import { sheetUnder } from '../pricing/price-work';
import { priceVersion } from '../pricing/pricing';
import type { LoadedSitting } from './load-gradebook';

/** By attempt: the sheets of those whose published one is of a modified rubric, by the sitting's own. */
export type PlainSheets = ReadonlyMap<string, ScoreSheet>;

/**
 * Works the published sheets of modified rubrics out again by the sitting's own. From the events that had come by the
 * publication, which never change, so that the same results always give the same file.
 */
export async function loadPlainSheets(
  tx: Transaction,
  schoolId: string,
  sittings: readonly LoadedSitting[],
): Promise<PlainSheets> {
  const sheets = new Map<string, ScoreSheet>();
  for (const { latest } of sittings) {
    if (!latest) continue;
    const modified = [...latest.results.values()].filter(
      ({ accommodationId, sheet }) => accommodationId !== null && sheet !== null,
    );
    const ids = modified.map(({ attemptId }) => attemptId);
    const events = ids.length > 0 ? await eventsUntil(tx, schoolId, ids, latest.publication.publishedAt) : [];
    const { versionId, number, rubric, form } = latest.version;
    const version = priceVersion({ versionId, number, rubric, policy: form.policies.prediction }, null);
    for (const attemptId of ids) {
      const own = events.filter((event) => event.attemptId === attemptId);
      sheets.set(attemptId, sheetUnder(version, deriveAttempt(own, 'bench').attempt));
    }
  }
  return sheets;
}

async function eventsUntil(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
  moment: Date,
): Promise<(CellEvent & { attemptId: string })[]> {
  const rows = await selectEventsOf(tx, schoolId, attemptIds);
  return rows
    .filter(({ receivedAt }) => receivedAt <= moment)
    .map((row) => ({ ...asCellEvent(row), attemptId: row.attemptId }));
}
