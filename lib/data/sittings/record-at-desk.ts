import 'server-only';
import { randomUUID } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { insertEvents, lockAttempts } from '@/db/queries/rounds';
import { selectEventsOf } from '@/db/queries/sheets';
import { nextSequence, type SittingRow } from '@/db/queries/sittings';
import type { Actor } from '@/lib/auth/actor';
import { type CellValue, cellKey, valueKey } from '@/lib/sync/cells';
import { deriveCells } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { deskDeviceId } from './desk-device';

interface DeskEntry {
  attemptId: string;
  what: '@standing' | '@days-late';
  value: CellValue;
  /** What an untouched cell stands for: to record that again changes nothing. */
  untouched: CellValue;
}

/**
 * Appends what a teacher decides at the desk as the bench would: an event that replaces every head of its cell, with
 * the sheets rebuilt in the same transaction. Null when there is no such attempt; `changed` is false when the cell
 * already says this. `studentId` tells whom it is about.
 */
export async function recordAtDesk(
  tx: Transaction,
  actor: Actor,
  sitting: SittingRow,
  entry: DeskEntry,
): Promise<{ studentId: string; changed: boolean } | null> {
  const { schoolId, personId } = actor;
  const { attemptId, value } = entry;
  const [attempt] = await lockAttempts(tx, schoolId, sitting.sittingId, [attemptId]);
  if (!attempt) return null;
  const cell = { lineId: '', ordinal: 0, what: entry.what };
  const events = (await selectEventsOf(tx, schoolId, [attemptId])).map(asCellEvent);
  const state = deriveCells(events, 'bench').get(cellKey(cell));
  const now = state ? state.value : entry.untouched;
  if (now !== null && valueKey(now) === valueKey(value))
    return { studentId: attempt.studentId, changed: false };
  const deviceId = deskDeviceId(schoolId, personId);
  await insertEvents(tx, [
    {
      schoolId,
      id: randomUUID(),
      sittingId: sitting.sittingId,
      attemptId,
      side: 'bench',
      ...cell,
      value,
      supersedes: state?.heads.map(({ id }) => id) ?? [],
      deviceId,
      sequence: await nextSequence(tx, schoolId, deviceId),
      capturedAt: new Date(),
      authorId: personId,
      senderId: personId,
    },
  ]);
  await rebuildSheets(tx, schoolId, [attemptId]);
  return { studentId: attempt.studentId, changed: true };
}
