import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { type AttemptRow, selectAttempts } from '@/db/queries/attempts';
import {
  type PublicationRow,
  type ResultRow,
  selectPublications,
  selectResults,
} from '@/db/queries/publications';
import { insertMissingAttempts, lockAttempts } from '@/db/queries/rounds';
import type { SittingRow } from '@/db/queries/sittings';
import { scoreSheetSchema } from '@/lib/contracts/results';
import { loadPricing } from '../pricing/load-pricing';
import type { Pricing } from '../pricing/pricing';
import { storedAttempt } from '../pricing/stored-attempt';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { type JudgedResult, judgeResult, type RecordedAttempt } from './judge-result';
import { lateLocks } from './late-locks';
import { sameJson } from './same-json';

export interface GatheredAttempt {
  row: AttemptRow;
  recorded: RecordedAttempt;
  pricing: Pricing;
}

/** All that a publication of a sitting depends on, as it stands. */
export interface Gathered {
  attempts: GatheredAttempt[];
  /** Equal as long as nothing that could change a result has changed. */
  seen: string;
  latest: { publication: PublicationRow; results: ResultRow[] } | null;
}

/**
 * Brings the sheets of a sitting up to date with its events and loads what its results are judged from. Those who
 * left the section are in it only with something recorded, a standing, or an earlier result.
 */
export async function gatherResults(tx: Transaction, sitting: SittingRow): Promise<Gathered> {
  const { schoolId, sittingId, sectionId } = sitting;
  if (sitting.state === 'open') await insertMissingAttempts(tx, schoolId, sittingId, sectionId);
  const ids = (await selectAttempts(tx, schoolId, [sittingId])).map(({ attemptId }) => attemptId);
  // A reading that is being kept meanwhile is waited for, so that no sheet is written without it.
  if (ids.length > 0) await lockAttempts(tx, schoolId, sittingId, ids);
  await rebuildSheets(tx, schoolId, ids);
  const late = await lateLocks(tx, sitting);
  const latest = await loadLatest(tx, sitting);
  const told = new Set(latest?.results.map(({ attemptId }) => attemptId));
  const rows = (await selectAttempts(tx, schoolId, [sittingId])).filter(
    (row) => row.here || row.recorded !== null || row.standing !== 'expected' || told.has(row.attemptId),
  );
  const pricings = await loadPricing(tx, schoolId, ids);
  const attempts = rows.map((row) => ({
    row,
    recorded: asRecorded(row, late.has(row.attemptId)),
    pricing: pricingOf(pricings, row.attemptId),
  }));
  const material = attempts.map(({ row, recorded, pricing: { accommodationId, held } }) => [
    ...[row.attemptId, row.here, recorded, accommodationId],
    held.map(({ versionId }) => versionId),
  ]);
  return {
    attempts,
    seen: createHash('sha256')
      .update(sameJson([sitting.rubricVersionId, latest?.publication.number ?? 0, material]))
      .digest('hex'),
    latest,
  };
}

export interface GatheredResult extends JudgedResult {
  row: AttemptRow;
}

/** Each attempt with its result. What holds it up does not hold for those who have left the section. */
export function judgeAll({ attempts }: Gathered, countLate: boolean): GatheredResult[] {
  return attempts.map(({ row, recorded, pricing }) => {
    const result = judgeResult(pricing, recorded, countLate);
    const open = row.here || result.open === 'conflict' ? result.open : null;
    return { row, ...result, open };
  });
}

function pricingOf(pricings: ReadonlyMap<string, Pricing>, attemptId: string): Pricing {
  const pricing = pricings.get(attemptId);
  if (!pricing) throw new Error(`attempt ${attemptId} has no price`);
  return pricing;
}

function asRecorded(row: AttemptRow, late: boolean): RecordedAttempt {
  return {
    standing: row.standing,
    recorded: row.recorded === null ? null : storedAttempt(row.recorded),
    conflicts: row.conflicts ?? 0,
    measuredAt: row.measuredAt,
    own:
      row.ownRecorded === null
        ? null
        : {
            attempt: storedAttempt(row.ownRecorded),
            sheet: scoreSheetSchema.parse(row.ownSheet),
            locked: row.lockedAt !== null,
            late,
          },
  };
}

async function loadLatest(tx: Transaction, { schoolId, sittingId }: SittingRow): Promise<Gathered['latest']> {
  const [publication] = await selectPublications(tx, schoolId, [sittingId]);
  if (!publication) return null;
  return { publication, results: await selectResults(tx, schoolId, [publication.publicationId]) };
}

type Told = Pick<
  ResultRow,
  | 'attemptId'
  | 'status'
  | 'scorePoints'
  | 'totalPoints'
  | 'bonusPoints'
  | 'heldPoints'
  | 'heldVersionId'
  | 'accommodationId'
  | 'predictedPoints'
  | 'measuredAt'
  | 'sheet'
  | 'ownSheet'
  | 'judgement'
>;

export function asTold({ row, open: _, ...result }: GatheredResult): Told {
  return { attemptId: row.attemptId, ...result };
}

/** How many results differ from what the latest publication told; all of them when there is none. */
export function countChanges(
  sitting: SittingRow,
  latest: Gathered['latest'],
  results: readonly GatheredResult[],
): number {
  if (!latest || latest.publication.rubricVersionId !== sitting.rubricVersionId) return results.length;
  const told = new Map(
    latest.results.map(({ publicationId: _p, schoolId: _s, ...row }) => [row.attemptId, sameJson(row)]),
  );
  return results.filter((result) => told.get(result.row.attemptId) !== sameJson(asTold(result))).length;
}
