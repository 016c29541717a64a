import type { Transaction } from '@/db/client';
import {
  deleteOtherSheets,
  type EventRow,
  type SheetRow,
  type StandingRow,
  selectEventsOf,
  updateStandings,
  upsertSheets,
} from '@/db/queries/sheets';
import type { Points } from '@/lib/scoring';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { hasCell, SIDES, type Side } from '@/lib/sync/cells';
import { type CellEvent, type DerivedAttempt, deriveAttempt } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';
import { loadPricing } from '../pricing/load-pricing';
import { holdPoints, pricerOf, sheetUnder } from '../pricing/price-work';
import type { Pricing } from '../pricing/pricing';

/** Attempts at a time, so that a large sitting's events are never all in memory. */
const ATTEMPTS_AT_A_TIME = 500;

/**
 * Derives both sides of the attempts from their events, prices them as `loadPricing` says, and stores the sheets,
 * standings and days late. Takes the same few statements for one attempt as for hundreds.
 */
export async function rebuildSheets(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
): Promise<void> {
  const pricings = await loadPricing(tx, schoolId, attemptIds);
  const ids = [...pricings.keys()];
  for (let from = 0; from < ids.length; from += ATTEMPTS_AT_A_TIME) {
    await rebuildSome(tx, schoolId, ids.slice(from, from + ATTEMPTS_AT_A_TIME), pricings);
  }
}

async function rebuildSome(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
  pricings: ReadonlyMap<string, Pricing>,
): Promise<void> {
  const events = groupByAttempt(await selectEventsOf(tx, schoolId, attemptIds));
  const sheets: SheetRow[] = [];
  const standings: StandingRow[] = [];
  for (const attemptId of attemptIds) {
    const pricing = pricings.get(attemptId);
    if (!pricing) throw new Error(`attempt ${attemptId} has no price`);
    const recorded = events.get(attemptId) ?? [];
    for (const side of SIDES) {
      const derived = deriveAttempt(recorded, side);
      if (side === 'bench') {
        standings.push({ attemptId, standing: derived.standing, daysLate: derived.attempt.daysLate });
      }
      if (recorded.some((event) => event.side === side)) {
        sheets.push(sheetRow({ schoolId, attemptId, side }, pricing, derived));
      }
    }
  }
  for (const side of SIDES) {
    const kept = sheets.filter((row) => row.side === side).map((row) => row.attemptId);
    await deleteOtherSheets(tx, schoolId, attemptIds, { side, attemptIds: kept });
  }
  await upsertSheets(tx, sheets);
  await updateStandings(tx, schoolId, standings);
}

function groupByAttempt(rows: readonly EventRow[]): Map<string, CellEvent[]> {
  const groups = new Map<string, CellEvent[]>();
  for (const row of rows) {
    const group = groups.get(row.attemptId) ?? [];
    group.push(asCellEvent(row));
    groups.set(row.attemptId, group);
  }
  return groups;
}

interface SheetKey {
  schoolId: string;
  attemptId: string;
  side: Side;
}

/**
 * While two readings that the version asks for stand against each other there is no score, whatever the engine could
 * make of the rest. What earlier versions gave more is held at the bench alone: a prediction is what the pieces cost.
 */
function sheetRow(key: SheetKey, pricing: Pricing, derived: DerivedAttempt): SheetRow {
  const sheet = sheetUnder(pricing, derived.attempt);
  const held = key.side === 'bench' ? heldOf(pricing, derived) : 0;
  const conflicts = derived.conflicts.filter((cell) => hasCell(pricing.published, cell)).length;
  const plus = (points: Points | null) => (points === null ? null : points + held);
  return {
    ...key,
    rubricVersionId: pricing.versionId,
    engineVersion: ENGINE_VERSION,
    recorded: derived.attempt,
    sheet,
    scorePoints: conflicts === 0 ? plus(sheet.score) : null,
    provisionalPoints: plus(sheet.provisional),
    totalPoints: sheet.total,
    heldPoints: held,
    accommodationId: pricing.accommodationId,
    lostPoints: sheet.lost,
    complete: conflicts === 0 && sheet.complete,
    conflicts,
    finished: derived.finished,
    lockedAt: derived.lock ? new Date(derived.lock.at) : null,
    measuredAt: derived.measuredAt ? new Date(derived.measuredAt) : null,
  };
}

function heldOf(pricing: Pricing, { attempt }: DerivedAttempt): Points {
  if (pricing.held.length === 0) return 0;
  const priceBy = pricerOf({ bench: attempt, own: null });
  return holdPoints(pricing, priceBy(pricing), priceBy).points;
}
