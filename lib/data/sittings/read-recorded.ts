import 'server-only';
import type { Transaction } from '@/db/client';
import { type MoveHead, selectRecorded } from '@/db/queries/move-heads';
import { selectEventsOf } from '@/db/queries/sheets';
import type { Attempt, Rubric } from '@/lib/scoring';
import type { Cell } from '@/lib/sync/cells';
import { type CellEvent, deriveAttempt } from '@/lib/sync/derive';
import { asCellEvent } from '@/lib/sync/server/stored-event';
import { storedAttempt } from '../pricing/stored-attempt';

/** What is recorded of one attempt: by the bench, and by its student where a prediction is locked. */
export interface Recorded {
  head: MoveHead;
  bench: Attempt | null;
  own: Attempt | null;
  /** Cells in which two readings stand against each other. */
  conflicts: Cell[];
}

const ATTEMPTS_AT_A_TIME = 500;

/**
 * What is recorded of the attempts, some hundreds at a time; the next ones are on their way while one works. Read
 * from the stored sheets; from the events where those cannot tell in which cells readings stand against each other.
 */
export async function* readRecorded(
  tx: Transaction,
  schoolId: string,
  heads: readonly MoveHead[],
  { fromEvents }: { fromEvents: boolean },
): AsyncGenerator<Recorded[]> {
  const chunks: MoveHead[][] = [];
  for (let from = 0; from < heads.length; from += ATTEMPTS_AT_A_TIME) {
    chunks.push(heads.slice(from, from + ATTEMPTS_AT_A_TIME));
  }
  let next = chunks[0] && readSome(tx, schoolId, chunks[0], fromEvents);
  for (const index of chunks.keys()) {
    const read = await next;
    const following = chunks[index + 1];
    next = following && readSome(tx, schoolId, following, fromEvents);
    // A failure is met when its turn comes; if nobody asks any more it is nobody's.
    next?.catch(() => {});
    if (read) yield read;
  }
}

async function readSome(
  tx: Transaction,
  schoolId: string,
  heads: readonly MoveHead[],
  fromEvents: boolean,
): Promise<Recorded[]> {
  const recorded = heads.filter(({ versionId }) => versionId !== null);
  const torn = recorded.filter(({ conflicts }) => fromEvents || (conflicts ?? 0) > 0).map(idOf);
  const locked = recorded.filter(({ lockedAt }) => lockedAt !== null).map(idOf);
  const bench = byAttempt(await selectRecorded(tx, schoolId, 'bench', recorded.map(idOf)));
  const own = byAttempt(locked.length > 0 ? await selectRecorded(tx, schoolId, 'own', locked) : []);
  const derived = await deriveSome(tx, schoolId, torn);
  return heads.map((head) => {
    const known = derived.get(head.attemptId);
    return {
      head,
      bench: known?.attempt ?? bench.get(head.attemptId) ?? null,
      own: own.get(head.attemptId) ?? null,
      conflicts: known?.conflicts ?? [],
    };
  });
}

const idOf = ({ attemptId }: MoveHead) => attemptId;

function byAttempt(rows: readonly { attemptId: string; recorded: unknown }[]): Map<string, Attempt> {
  return new Map(rows.map(({ attemptId, recorded }) => [attemptId, storedAttempt(recorded)]));
}

async function deriveSome(tx: Transaction, schoolId: string, attemptIds: readonly string[]) {
  const events = new Map<string, CellEvent[]>(attemptIds.map((id) => [id, []]));
  const rows = attemptIds.length > 0 ? await selectEventsOf(tx, schoolId, attemptIds) : [];
  for (const row of rows) events.get(row.attemptId)?.push(asCellEvent(row));
  return new Map([...events].map(([id, recorded]) => [id, deriveAttempt(recorded, 'bench')]));
}

/** Whether one rubric has a cell that the other has not. */
export function asksForMore(one: Rubric, other: Rubric): boolean {
  const lines = new Map(other.lines.map((line) => [line.id, line]));
  const lacks = (known: readonly { id: string }[], wanted: readonly { id: string }[]) =>
    wanted.some(({ id }) => !known.some((each) => each.id === id));
  return (
    lacks(other.workChecks, one.workChecks) ||
    one.lines.some((line) => {
      const known = lines.get(line.id);
      return !known || known.quantity < line.quantity || lacks(known.checks, line.checks);
    })
  );
}
