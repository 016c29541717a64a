import 'server-only';
import { randomUUID } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { nextSequence } from '@/db/queries/attempts';
import { insertEvents, lockAttempts } from '@/db/queries/rounds';
import { selectEventsOf } from '@/db/queries/sheets';
import type { SittingRow } from '@/db/queries/sittings';
import type { Actor } from '@/lib/auth/actor';
import { type CellValue, cellKey, valueKey } from '@/lib/sync/cells';
import { deriveCells } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { deskDeviceId } from './desk-device';

export interface DeskEntry {
  what: '@standing' | '@days-late';
  value: CellValue;
  /** What an untouched cell stands for: to record that again changes nothing. */
  untouched: CellValue;
}

/**
 * Appends what a teacher decides at the desk as the bench would: events that each replace every head of their cell,
 * with the sheets rebuilt in the same transaction. Null when there is no such attempt; `changed` is false when the
 * cells already say all of it. `studentId` tells whom it is about.
 */
export async function recordAtDesk(
  tx: Transaction,
  actor: Actor,
  sitting: SittingRow,
  attemptId: string,
  entries: readonly DeskEntry[],
): Promise<{ studentId: string; changed: boolean } | null> {
  const { schoolId, personId } = actor;
  const [attempt] = await lockAttempts(tx, schoolId, sitting.sittingId, [attemptId]);
  if (!attempt) return null;
  const { studentId } = attempt;
  const cells = deriveCells((await selectEventsOf(tx, schoolId, [attemptId])).map(asCellEvent), 'bench');
  const news = entries.flatMap(({ what, value, untouched }) => {
    const cell = { lineId: '', ordinal: 0, what };
    const state = cells.get(cellKey(cell));
    const now = state ? state.value : untouched;
    if (now !== null && valueKey(now) === valueKey(value)) return [];
    return [{ ...cell, value, supersedes: state?.heads.map(({ id }) => id) ?? [] }];
  });
  if (news.length === 0) return { studentId, changed: false };
  const deviceId = deskDeviceId(schoolId, personId);
  const first = await nextSequence(tx, schoolId, deviceId);
  await insertEvents(
    tx,
    news.map((event, index) => ({
      schoolId,
      id: randomUUID(),
      sittingId: sitting.sittingId,
      attemptId,
      side: 'bench' as const,
      ...event,
      deviceId,
      sequence: first + index,
      capturedAt: new Date(),
      authorId: personId,
      senderId: personId,
    })),
  );
  await rebuildSheets(tx, schoolId, [attemptId]);
  return { studentId, changed: true };
}
