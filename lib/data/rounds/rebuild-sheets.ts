import type { Transaction } from '@/db/client';
import {
  deleteOtherSheets,
  type EventRow,
  type SheetRow,
  type StandingRow,
  selectAttemptVersions,
  selectEventsOf,
  selectRubrics,
  updateStandings,
  upsertSheets,
} from '@/db/queries/sheets';
import { type Rubric, scoreAttempt } from '@/lib/scoring';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { rubricSchema } from '@/lib/scoring/schemas';
import { SIDES, type Side } from '@/lib/sync/cells';
import { type CellEvent, type DerivedAttempt, deriveAttempt } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';

/**
 * Derives both sides of the attempts from their events, prices them by their sitting's rubric version, and stores the
 * sheets, standings and days late. Takes the same few statements for one attempt as for hundreds.
 */
export async function rebuildSheets(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
): Promise<void> {
  if (attemptIds.length === 0) return;
  const versions = await selectAttemptVersions(tx, schoolId, attemptIds);
  const rubrics = await loadRubrics(tx, schoolId, [...new Set(versions.map((row) => row.rubricVersionId))]);
  const events = groupByAttempt(await selectEventsOf(tx, schoolId, attemptIds));
  const sheets: SheetRow[] = [];
  const standings: StandingRow[] = [];
  for (const { attemptId, rubricVersionId } of versions) {
    const rubric = rubrics.get(rubricVersionId);
    if (!rubric) throw new Error(`rubric version ${rubricVersionId} of attempt ${attemptId} is not there`);
    const recorded = events.get(attemptId) ?? [];
    for (const side of SIDES) {
      const derived = deriveAttempt(recorded, side);
      if (side === 'bench') {
        standings.push({ attemptId, standing: derived.standing, daysLate: derived.attempt.daysLate });
      }
      if (recorded.some((event) => event.side === side)) {
        sheets.push(sheetRow({ schoolId, attemptId, side, rubricVersionId }, rubric, derived));
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

async function loadRubrics(
  tx: Transaction,
  schoolId: string,
  versionIds: string[],
): Promise<Map<string, Rubric>> {
  const rows = versionIds.length > 0 ? await selectRubrics(tx, schoolId, versionIds) : [];
  return new Map(rows.map((row) => [row.id, rubricSchema.parse(row.rubric)]));
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
  rubricVersionId: string;
}

/** While two readings stand against each other there is no score, whatever the engine could make of the rest. */
function sheetRow(key: SheetKey, rubric: Rubric, derived: DerivedAttempt): SheetRow {
  const sheet = scoreAttempt(rubric, derived.attempt);
  const settled = derived.conflicts.length === 0;
  return {
    ...key,
    engineVersion: ENGINE_VERSION,
    recorded: derived.attempt,
    sheet,
    scorePoints: settled ? sheet.score : null,
    provisionalPoints: sheet.provisional,
    totalPoints: sheet.total,
    lostPoints: sheet.lost,
    complete: settled && sheet.complete,
    conflicts: derived.conflicts.length,
    finished: derived.finished,
    lockedAt: derived.lock ? new Date(derived.lock.at) : null,
    measuredAt: derived.measuredAt ? new Date(derived.measuredAt) : null,
  };
}
