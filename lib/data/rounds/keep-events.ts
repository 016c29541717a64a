import 'server-only';
import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import { selectStoodVersions } from '@/db/queries/moves';
import { insertEvents, isOwnSitting, lockAttempts, selectRound, selectSameEvents } from '@/db/queries/rounds';
import { type EventRow, selectEventsOf } from '@/db/queries/sheets';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/policy';
import { keepEventsInput } from '@/lib/contracts/rounds';
import type { Result } from '@/lib/result';
import { rubricSchema } from '@/lib/scoring/schemas';
import type { CellEvent } from '@/lib/sync/derive';
import { PROTOCOL_VERSION, type PushAnswer, readingEventSchema } from '@/lib/sync/protocol';
import { type Desk, judgeBatch, type Verdict } from '@/lib/sync/server/judge-batch';
import { asCellEvent, storedFingerprint } from '@/lib/sync/server/stored-event';
import { type Context, defineVerb } from '../verb';
import { rebuildSheets } from './rebuild-sheets';
import { roundSubject } from './round-subject';

type Keep = Context<z.output<typeof keepEventsInput>>;

const keepBenchEvents = defineVerb({
  action: 'round.record',
  input: keepEventsInput,
  async run(context): Promise<PushAnswer> {
    const { actor, input, tx, found, authorize } = context;
    const round = found(await selectRound(tx, actor.schoolId, input.sittingId));
    const { subject, formerAideIds } = await roundSubject(tx, round);
    const accessEnded = !may(actor, 'round.record', subject) && formerAideIds.includes(actor.personId);
    authorize(accessEnded ? { ...subject, aideIds: formerAideIds } : subject);
    return keep(context, round, {
      personId: actor.personId,
      kind: 'staff',
      mayFinish: may(actor, 'round.finish', subject),
      maySettle: may(actor, 'round.settle', subject),
      accessEnded,
    });
  },
});

const keepOwnEvents = defineVerb({
  action: 'own.record',
  input: keepEventsInput,
  async run(context): Promise<PushAnswer> {
    const { actor, input, tx, found, authorize } = context;
    const round = found(await selectRound(tx, actor.schoolId, input.sittingId));
    const own = await isOwnSitting(tx, actor.schoolId, round.sittingId, actor.personId);
    authorize({ schoolId: round.schoolId, studentId: own ? actor.personId : null });
    const sender = { personId: actor.personId, kind: 'student' as const };
    return keep(context, round, { ...sender, mayFinish: false, maySettle: false, accessEnded: false });
  },
});

/**
 * Keeps a batch of events of one sitting: each is kept, already there, or refused with its reason, and the sheets of
 * the touched attempts follow in the same transaction. Batches that touch the same attempt wait for one another.
 */
export function keepEvents(actor: Actor | null, raw: unknown): Promise<Result<PushAnswer>> {
  return actor?.role === 'student' ? keepOwnEvents(actor, raw) : keepBenchEvents(actor, raw);
}

type Round = NonNullable<Awaited<ReturnType<typeof selectRound>>>;

async function keep(context: Keep, round: Round, sender: Desk['sender']): Promise<PushAnswer> {
  const { actor, tx, log } = context;
  const { deviceId, events } = context.input.push;
  const desk = await layDesk(tx, round, sender, deviceId, events);
  const verdicts = await judgeBatch(desk, deviceId, events);
  const kept = verdicts.filter((verdict) => verdict.outcome === 'kept');
  await insertEvents(
    tx,
    kept.map((verdict) => eventRow(actor, round, deviceId, verdict)),
  );
  const touched = [...new Set(kept.map(({ event }) => event.attemptId))].sort();
  await rebuildSheets(tx, actor.schoolId, touched);
  if (kept.length > 0) {
    await log({
      subjectKind: 'sitting',
      subjectId: round.sittingId,
      aboutPersonId: sender.kind === 'student' ? actor.personId : null,
      details: { kept: kept.length, attempts: touched, deviceId },
    });
  }
  return { protocol: PROTOCOL_VERSION, answers: verdicts.map(answerOf) };
}

async function layDesk(
  tx: Transaction,
  round: Round,
  sender: Desk['sender'],
  deviceId: string,
  events: Keep['input']['push']['events'],
): Promise<Desk> {
  const parsed = events.flatMap((event) => readingEventSchema.safeParse(event).data ?? []);
  const wanted = [...new Set(parsed.map((event) => event.attemptId))];
  const locked = wanted.length > 0 ? await lockAttempts(tx, round.schoolId, round.sittingId, wanted) : [];
  const own = locked.filter((row) => sender.kind === 'staff' || row.studentId === sender.personId);
  const attempts = new Map<string, CellEvent[]>(own.map((row) => [row.id, []]));
  const stored = own.length > 0 ? await selectEventsOf(tx, round.schoolId, [...attempts.keys()]) : [];
  for (const row of stored) attempts.get(row.attemptId)?.push(asCellEvent(row));
  const same = await selectSameEvents(
    tx,
    round.schoolId,
    deviceId,
    events.map(({ id }) => id),
    parsed.map(({ sequence }) => sequence),
  );
  const stood = await selectStoodVersions(tx, round.schoolId, round.sittingId);
  return {
    sittingId: round.sittingId,
    rubrics: stood.map(({ rubric }) => rubricSchema.parse(rubric)),
    published: round.state === 'published',
    sender,
    attempts,
    known: new Map(same.map((row) => [row.id, storedFingerprint(row)])),
    sequences: new Map(same.filter((row) => row.deviceId === deviceId).map((row) => [row.sequence, row.id])),
  };
}

function eventRow(
  actor: Actor,
  round: Round,
  deviceId: string,
  { event, flags }: Extract<Verdict, { outcome: 'kept' }>,
): Omit<EventRow, 'receivedAt'> {
  const { id, attemptId, side, value, typed, unit, instrument, supersedes, sequence, authorId } = event;
  return {
    schoolId: actor.schoolId,
    id,
    sittingId: round.sittingId,
    attemptId,
    side,
    ...event.cell,
    value,
    readingTicks: value.kind === 'value' ? value.ticks : null,
    typed,
    unit,
    instrument,
    supersedes,
    deviceId,
    sequence,
    capturedAt: new Date(event.capturedAt),
    authorId,
    senderId: actor.personId,
    flags,
  };
}

function answerOf(verdict: Verdict): PushAnswer['answers'][number] {
  return verdict.outcome === 'kept' ? { id: verdict.id, outcome: 'kept' } : verdict;
}
