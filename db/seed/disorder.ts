import { and, eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { attempts, enrollments, inHand } from '@/db/schema';
import { TICKS_PER_INCH } from '@/lib/length';
import type { CellValue } from '@/lib/sync/cells';
import type { SeededSchool } from './people';
import { morningOf } from './practicals';
import type { Random } from './random';
import { Recorder, recordFinish, recordPieces, type SeedEvent } from './recording';
import type { SeededAttempt, SeededSitting } from './sittings';
import { makeHand, makePieces } from './wood';

const ATTEMPT = { lineId: '', ordinal: 0 };

const UNSENT = 7;

/**
 * The disorder of real life, in the sittings where it happened. Takes the events of a tidy round and gives back those
 * of the round as it was.
 */
export async function addDisorder(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
  events: SeedEvent[],
): Promise<SeedEvent[]> {
  const all = numberAnew(await disorder(tx, random, school, sitting, events));
  return sitting.plan.state === 'under way' ? leaveUnsent(tx, random, school, sitting, all) : all;
}

/** Numbers each device's events without gaps: a gap would say that readings have not arrived. */
function numberAnew(events: SeedEvent[]): SeedEvent[] {
  const used = new Map<string, number>();
  return [...events]
    .sort((a, b) => a.sequence - b.sequence)
    .map((event) => {
      const sequence = (used.get(event.deviceId) ?? 0) + 1;
      used.set(event.deviceId, sequence);
      return { ...event, sequence };
    });
}

async function disorder(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
  events: SeedEvent[],
): Promise<SeedEvent[]> {
  const teacher = () =>
    new Recorder(random, random.uuid(), sitting.section.teacherId, 'bench', afterRound(sitting));
  switch (`${sitting.plan.section} ${sitting.plan.practical}`) {
    case 'cf3 bench-hook':
      return replaceBy(events, sitting.attempts[4], (attempt) => standing(teacher(), attempt, 'absent'));
    case 'cf1 bench-hook':
      return replaceBy(events, sitting.attempts[7], (attempt) => standing(teacher(), attempt, 'zero'));
    case 'cf3 six-stick':
      return redo(tx, random, school, sitting, [
        ...replaceBy(events, sitting.attempts[9], (attempt) => standing(teacher(), attempt, 'excused')),
        ...standing(teacher(), await transferIn(tx, random, school, sitting), 'excused'),
      ]);
    case 'cf3 desk-caddy':
      return splitAndHeld(random, sitting, caliperInMillimetres(random, sitting, events));
    case 'cf5 desk-caddy-okonjo':
      return twoGraders(random, school, sitting, zeroError(random, sitting, events));
    case 'cf3 stair-tower':
      return replaceBy(events, sitting.attempts[2], (attempt) => standing(teacher(), attempt, 'absent'));
    default:
      return events;
  }
}

function afterRound(sitting: SeededSitting): Date {
  return new Date(morningOf(sitting.plan.day).getTime() + 75 * 60_000);
}

function standing(
  recorder: Recorder,
  attempt: SeededAttempt,
  to: 'absent' | 'excused' | 'zero',
): SeedEvent[] {
  return [recorder.record(attempt.id, { ...ATTEMPT, what: '@standing' }, { kind: 'standing', standing: to })];
}

/** Exchanges all that was recorded of one student. */
function replaceBy(
  events: SeedEvent[],
  attempt: SeededAttempt | undefined,
  by: (attempt: SeededAttempt) => SeedEvent[],
): SeedEvent[] {
  if (!attempt) throw new Error('this student is not in the sitting');
  return [...events.filter((event) => event.attemptId !== attempt.id), ...by(attempt)];
}

/** One student read again as a whole, by a reader with something odd about the instrument. */
function readAgain(
  random: Random,
  sitting: SeededSitting,
  events: SeedEvent[],
  at: number,
  odd: { bias?: number; inMillimetres?: boolean },
): SeedEvent[] {
  return replaceBy(events, sitting.attempts[at], (attempt) => {
    const recorder = new Recorder(
      random,
      random.uuid(),
      sitting.section.teacherId,
      'bench',
      afterRound(sitting),
    );
    const reader = { bias: 0, ...odd, instrument: 'caliper' as const, gauges: false };
    return [
      ...recordPieces(random, recorder, attempt.id, sitting.version.rubric, attempt.pieces, reader),
      ...recordFinish(random, recorder, attempt.id, sitting.version.rubric),
    ];
  });
}

/** A caliper left on millimetres: recorded as what was typed, in its own unit. */
function caliperInMillimetres(random: Random, sitting: SeededSitting, events: SeedEvent[]): SeedEvent[] {
  return readAgain(random, sitting, events, 11, { inMillimetres: true });
}

/** Three students read with a caliper that shows 0.012 in too much. */
function zeroError(random: Random, sitting: SeededSitting, events: SeedEvent[]): SeedEvent[] {
  const bias = (TICKS_PER_INCH * 12) / 1000;
  return [5, 6, 7].reduce((all, at) => readAgain(random, sitting, all, at, { bias }), events);
}

/** A piece that split in the vise, and one with another student's name on it. */
function splitAndHeld(random: Random, sitting: SeededSitting, events: SeedEvent[]): SeedEvent[] {
  const recorder = new Recorder(
    random,
    random.uuid(),
    sitting.section.teacherId,
    'bench',
    afterRound(sitting),
  );
  const supersede = (at: number, lineId: string, ordinal: number, what: string, value: CellValue) => {
    const attempt = sitting.attempts[at];
    if (!attempt) throw new Error('this student is not in the sitting');
    const before = events.filter(
      ({ attemptId, cell }) =>
        attemptId === attempt.id && cell.lineId === lineId && cell.ordinal === ordinal && cell.what === what,
    );
    return recorder.record(
      attempt.id,
      { lineId, ordinal, what },
      value,
      undefined,
      before.map(({ id }) => id),
    );
  };
  return [
    ...events,
    supersede(3, 'side', 2, 'length', { kind: 'spoiled' }),
    supersede(8, 'divider', 2, 'piece', { kind: 'state', state: 'held', note: 'other name on it' }),
  ];
}

/** Another teacher read the same student on another tablet: both readings stand until somebody chooses. */
function twoGraders(
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
  events: SeedEvent[],
): SeedEvent[] {
  const attempt = sitting.attempts[13];
  const second = school.staff.get('lindqvist');
  const [first] = sitting.version.rubric.lines;
  if (!attempt || !second || !first) throw new Error('the second grader has nothing to read');
  const recorder = new Recorder(random, random.uuid(), second, 'bench', afterRound(sitting));
  const mine = events.filter(
    ({ attemptId, cell }) =>
      attemptId === attempt.id && cell.lineId === first.id && cell.what !== 'thickness',
  );
  return [
    ...events,
    ...mine
      .filter(({ value }) => value.kind === 'value' || value.kind === 'gauged')
      .map(({ cell }) => {
        const target = first.target[cell.what === 'width' ? 'width' : 'length'];
        const value: CellValue = { kind: 'value', ticks: target - TICKS_PER_INCH / 16 };
        return recorder.record(attempt.id, cell, value, { typed: null, unit: 'in', instrument: 'rule' });
      }),
  ];
}

/** A student who came from another section after the sitting: excused from what they never saw. */
async function transferIn(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
): Promise<SeededAttempt> {
  const from = school.sections.get('cf6');
  const student = from?.students[2];
  if (!from || !student) throw new Error('nobody to transfer');
  const { schoolId, sectionId } = { schoolId: school.id, sectionId: from.id };
  await tx
    .update(enrollments)
    .set({ leftOn: '2026-10-30' })
    .where(
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.sectionId, sectionId),
        eq(enrollments.studentId, student.id),
      ),
    );
  await tx
    .insert(enrollments)
    .values({ schoolId, sectionId: sitting.section.id, studentId: student.id, joinedOn: '2026-11-02' });
  sitting.section.students.push(student);
  const attempt = { id: random.uuid(), student, pieces: [] };
  await tx.insert(attempts).values({
    ...{ schoolId, id: attempt.id, sittingId: sitting.id, studentId: student.id },
    ...{ number: 1, createdAt: morningOf('2026-11-02') },
  });
  sitting.attempts.push(attempt);
  return attempt;
}

/** Two students cut again: the next attempt, better and still not perfect. */
async function redo(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
  events: SeedEvent[],
): Promise<SeedEvent[]> {
  const day = new Date(afterRound(sitting).getTime() + 6 * 86_400_000);
  const recorder = new Recorder(random, random.uuid(), sitting.section.teacherId, 'bench', day);
  const again: SeedEvent[] = [];
  for (const first of [sitting.attempts[11], sitting.attempts[20]]) {
    if (!first) throw new Error('nobody to cut again');
    const hand = {
      ...makeHand(random, { fence: 0, graderBias: 0, skill: 0.45 }),
      forgetsKerf: false,
      losesPiece: false,
    };
    const attempt = {
      id: random.uuid(),
      student: first.student,
      pieces: makePieces(random, sitting.version.rubric, hand),
    };
    await tx.insert(attempts).values({
      ...{ schoolId: school.id, id: attempt.id, sittingId: sitting.id, studentId: first.student.id },
      ...{ number: 2, createdAt: day },
    });
    sitting.attempts.push(attempt);
    const reader = { bias: 0, instrument: 'caliper' as const, gauges: true };
    again.push(
      ...recordPieces(random, recorder, attempt.id, sitting.version.rubric, attempt.pieces, reader),
      ...recordFinish(random, recorder, attempt.id, sitting.version.rubric),
    );
  }
  return [...events, ...again];
}

/** A tablet that went into the cupboard with readings on it: numbers it has used have not arrived. */
async function leaveUnsent(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
  events: SeedEvent[],
): Promise<SeedEvent[]> {
  const attempt = sitting.attempts[14];
  const [line] = sitting.version.rubric.lines;
  const aide = school.staff.get('pell');
  if (!attempt || !line || !aide) throw new Error('no tablet to forget');
  const since = new Date(morningOf(sitting.plan.day).getTime() + 50 * 60_000);
  const recorder = new Recorder(random, random.uuid(), aide, 'bench', since);
  const cell = { lineId: line.id, ordinal: 1, what: 'thickness' };
  const arrived = recorder.record(attempt.id, cell, { kind: 'gauged' });
  await tx.insert(inHand).values({
    ...{ schoolId: school.id, sittingId: sitting.id, deviceId: arrived.deviceId, personId: aide },
    ...{ attemptId: attempt.id, since, seenAt: since },
  });
  return [...events, { ...arrived, sequence: arrived.sequence + UNSENT }];
}
