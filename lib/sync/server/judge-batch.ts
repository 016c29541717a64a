import type { Rubric } from '@/lib/scoring';
import { type CellValue, cellKey, valueKey } from '../cells';
import { type CellEvent, deriveAttempt } from '../derive';
import { type EventFlag, type ReadingEvent, readingEventSchema } from '../protocol';
import { receiptOf } from '../receipt';
import { refuseCell } from '../refuse-cell';
import { fingerprint } from './fingerprint';
import { refuseLock } from './refuse-lock';

/** What the server knows of a sitting and of the sender when a batch arrives. */
export interface Desk {
  sittingId: string;
  /** Of every version that the sitting stands or stood under, the present one first: a device may hold an older one. */
  rubrics: readonly Rubric[];
  published: boolean;
  sender: {
    personId: string;
    /** Students record their own side; teachers and aides the bench. */
    kind: 'student' | 'staff';
    mayFinish: boolean;
    maySettle: boolean;
    /** An aide whose days are over may still deliver what was recorded in time; it is flagged. */
    accessEnded: boolean;
  };
  /** The events of every attempt that the sender may record for, both sides; the batch's own are added as they pass. */
  attempts: Map<string, CellEvent[]>;
  /** Fingerprints of stored events by id, and who used which number of this device. */
  known: Map<string, string>;
  sequences: Map<number, string>;
}

export type Verdict =
  | { id: string; outcome: 'kept'; event: ReadingEvent; flags: EventFlag[] }
  | { id: string; outcome: 'already' }
  | { id: string; outcome: 'refused'; reason: string };

/** Judges the events of a batch one after the other, each against what stands by then. Mutates the desk. */
export async function judgeBatch(
  desk: Desk,
  deviceId: string,
  batch: readonly { id: string }[],
): Promise<Verdict[]> {
  const verdicts: Verdict[] = [];
  for (const raw of batch) verdicts.push(await judge(desk, deviceId, raw));
  return verdicts;
}

async function judge(desk: Desk, deviceId: string, raw: { id: string }): Promise<Verdict> {
  const refused = (reason: string): Verdict => ({ id: raw.id, outcome: 'refused', reason });
  const parsed = readingEventSchema.safeParse(raw);
  if (!parsed.success)
    return refused(`This cannot be read: ${parsed.error.issues[0]?.message ?? 'unknown form'}`);
  const event = parsed.data;
  const print = fingerprint(desk.sittingId, deviceId, event);
  const known = desk.known.get(event.id);
  if (known === print) return { id: event.id, outcome: 'already' };
  if (known !== undefined) return refused('Another reading was already kept under the same number.');
  const recorded = desk.attempts.get(event.attemptId);
  if (!recorded) return refused('This student’s work is not in this round, or not yours to record.');
  const reason = refuseEvent(desk, event, recorded) ?? (await refuseBySide(desk, event, recorded));
  if (reason !== null) return refused(reason);
  const flags = flagsOf(desk, event, recorded);
  recorded.push(event);
  desk.known.set(event.id, print);
  desk.sequences.set(event.sequence, event.id);
  return { id: event.id, outcome: 'kept', event, flags };
}

function refuseEvent(desk: Desk, event: ReadingEvent, recorded: readonly CellEvent[]): string | null {
  if (event.authorId !== desk.sender.personId)
    return 'Only the person who recorded this can send it: sign in as that person.';
  if (desk.sequences.has(event.sequence))
    return 'This device already used that number for another reading: two devices share one store.';
  if (event.supersedes.includes(event.id)) return 'A reading cannot replace itself.';
  if (event.value.kind === 'value' && (event.typed === null || event.unit === null))
    return 'A reading needs what was typed and its unit.';
  return refuseCell(desk.rubrics, event.side, event.cell, event.value) ?? refuseByDuty(desk, event, recorded);
}

/** What only the teacher may record, replace or take back. */
function refuseByDuty(desk: Desk, event: ReadingEvent, recorded: readonly CellEvent[]): string | null {
  if (event.side !== 'bench') return null;
  const replaced = recorded.filter(
    ({ id, side, cell }) =>
      side === 'bench' && cellKey(cell) === cellKey(event.cell) && event.supersedes.includes(id),
  );
  if (!desk.sender.mayFinish && [event, ...replaced].some(({ value }) => isTeachersOwn(value)))
    return 'Only the teacher of the section does that.';
  if (desk.sender.maySettle) return null;
  return new Set(replaced.map(({ value }) => valueKey(value))).size > 1
    ? 'Only the teacher of the section chooses between two readings.'
    : null;
}

function isTeachersOwn(value: CellValue): boolean {
  switch (value.kind) {
    case 'finish':
    case 'days-late':
    case 'excused':
      return true;
    case 'standing':
      return value.standing === 'excused' || value.standing === 'zero';
    case 'state':
      return value.state === 'excused';
    default:
      return false;
  }
}

async function refuseBySide(
  desk: Desk,
  event: ReadingEvent,
  recorded: readonly CellEvent[],
): Promise<string | null> {
  const { kind, mayFinish } = desk.sender;
  if (event.side === 'bench') return kind === 'staff' ? null : 'The bench is recorded by staff.';
  if (kind === 'staff')
    return mayFinish ? refuseReopening(event, recorded) : 'Students record their own side.';
  if (desk.published) return 'The results are out: own readings are closed.';
  if (deriveAttempt(recorded, 'own').lock) return 'This is locked: ask your teacher to reopen it.';
  if (event.value.kind !== 'lock') return null;
  if (!event.value.locked) return 'Only your teacher can reopen a lock.';
  const receipt = await receiptOf(event.attemptId, recorded);
  return refuseLock(desk.rubrics, recorded, event.value.receipt, receipt);
}

function refuseReopening(event: ReadingEvent, recorded: readonly CellEvent[]): string | null {
  if (event.value.kind !== 'lock') return 'Students record their own side.';
  if (event.value.locked) return 'Students lock their own readings.';
  return hasBenchReading(recorded) ? 'The bench has begun on these pieces: the lock stays.' : null;
}

/** Any size, piece or check; taking up a receipt or noting an absence is not yet a reading. */
function hasBenchReading(recorded: readonly CellEvent[]): boolean {
  return recorded.some(({ side, cell }) => side === 'bench' && !cell.what.startsWith('@'));
}

function flagsOf(desk: Desk, event: ReadingEvent, recorded: readonly CellEvent[]): EventFlag[] {
  const flags: EventFlag[] = [];
  if (desk.sender.accessEnded) flags.push('access-ended');
  if (event.value.kind === 'lock' && event.value.locked && hasBenchReading(recorded)) {
    if (deriveAttempt(recorded, 'bench').receiptTaken !== event.value.receipt) flags.push('late-lock');
  }
  return flags;
}
