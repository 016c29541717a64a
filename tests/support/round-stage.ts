import { randomUUID } from 'node:crypto';
import type { Actor } from '@/lib/auth/actor';
import type { ReadingEvent } from '@/lib/sync/protocol';
import { ownerSql } from './database';
import { giveAide, makePractical, makeSitting, type TestPractical } from './factories';
import { ticksOf } from './rubrics';
import { makeActor, makeSchool, makeSection, type TestSchool } from './school';

export interface RoundStage {
  school: TestSchool;
  teacher: Actor;
  aide: Actor;
  /** Two students of the section, signed in. */
  students: [Actor, Actor];
  practical: TestPractical;
  sectionId: string;
  sittingId: string;
  /** The attempts of the two students. */
  attempts: [string, string];
}

/** A sitting that is being marked: a teacher, an aide of these days, two students with an attempt each. */
export async function stageRound(given: Parameters<typeof makePractical>[2] = {}): Promise<RoundStage> {
  const school = await makeSchool();
  const teacher = await makeActor(school, 'teacher', { givenName: 'Dayo', familyName: 'Okonjo' });
  const aide = await makeActor(school, 'aide', { givenName: 'Jonah', familyName: 'Pell' });
  const ana = await makeActor(school, 'student', { givenName: 'Ana', familyName: 'Abbott' });
  const ben = await makeActor(school, 'student', { givenName: 'Ben', familyName: 'Brandt' });
  const studentIds = [ana.personId, ben.personId];
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId], studentIds });
  await giveAide(school, sectionId, aide.personId);
  const practical = await makePractical(school, teacher.personId, given);
  const { sittingId, attempts } = await makeSitting(school, sectionId, practical, {
    openedBy: teacher.personId,
    studentIds,
  });
  const [first = '', second = ''] = studentIds.map((id) => attempts.get(id) ?? '');
  return {
    school,
    teacher,
    aide,
    students: [ana, ben],
    practical,
    sectionId,
    sittingId,
    attempts: [first, second],
  };
}

let numbers = 0;

/** A reading of the base's length, as a teacher's tablet sends it, changed as the test wants. */
export function eventOf(author: Actor, attemptId: string, change: Partial<ReadingEvent> = {}): ReadingEvent {
  return {
    id: randomUUID(),
    attemptId,
    side: 'bench',
    cell: { lineId: 'base', ordinal: 1, what: 'length' },
    value: { kind: 'value', ticks: ticksOf('6 15/16') },
    typed: '6 15/16',
    unit: 'in',
    instrument: 'rule',
    supersedes: [],
    sequence: ++numbers,
    capturedAt: '2026-12-01T15:00:00.000Z',
    authorId: author.personId,
    ...change,
  };
}

export interface SheetRow {
  side: string;
  score_points: number | null;
  lost_points: number;
  complete: boolean;
  conflicts: number;
  finished: boolean;
  locked_at: Date | null;
  measured_at: Date | null;
}

export async function sheetOf(
  attemptId: string,
  side: 'bench' | 'own' = 'bench',
): Promise<SheetRow | undefined> {
  const [row] = await ownerSql()<SheetRow[]>`
    select * from score_sheets where attempt_id = ${attemptId} and side = ${side}`;
  return row;
}

export async function storedEvents(attemptId: string) {
  return ownerSql()<
    { id: string; flags: string[]; author_id: string; sender_id: string; typed: string | null }[]
  >`
    select id, flags, author_id, sender_id, typed from reading_events where attempt_id = ${attemptId}
    order by received_at, sequence`;
}
