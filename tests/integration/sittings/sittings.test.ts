import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { changeDue } from '@/lib/data/sittings/change-due';
import { listSittings } from '@/lib/data/sittings/list-sittings';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { readOpenChoices } from '@/lib/data/sittings/read-open-choices';
import { readSitting } from '@/lib/data/sittings/read-sitting';
import { startRedo } from '@/lib/data/sittings/start-redo';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { makePractical } from '@/tests/support/factories';
import { markPieces } from '@/tests/support/mark-pieces';
import { push } from '@/tests/support/push-events';
import { eventOf, type RoundStage, stageRound, storedEvents } from '@/tests/support/round-stage';
import { logOf, makeActor, makePerson, makeSchool, makeSection, whileLogFails } from '@/tests/support/school';

let stage: RoundStage;
let stranger: Actor;
let head: Actor;

beforeAll(async () => {
  stage = await stageRound();
  stranger = await makeActor(stage.school, 'teacher');
  head = await makeActor(stage.school, 'head');
});

describe('openSitting', () => {
  const sectionWith = async (count: number) => {
    const students = await Promise.all(
      Array.from({ length: count }, () => makePerson(stage.school, ['student'])),
    );
    return makeSection(stage.school, {
      teacherIds: [stage.teacher.personId],
      studentIds: students.map(({ personId }) => personId),
    });
  };

  it('gives the version to the section with an attempt for everyone in it', async () => {
    const { teacher, practical, school } = stage;
    const sectionId = await sectionWith(3);
    const input = { sectionId, versionId: practical.versionId, dueOn: '2026-12-18' };
    const { sittingId } = value(await openSitting(teacher, input));
    const sitting = value(await readSitting(teacher, { sittingId }));
    expect(sitting).toMatchObject({
      title: 'Nine parts',
      dueOn: '2026-12-18',
      versionNumber: 1,
      published: false,
    });
    expect(sitting.students).toHaveLength(3);
    expect(sitting.students[0]).toMatchObject({
      attemptNumber: 1,
      standing: 'expected',
      progress: 'not read',
      current: true,
    });
    expect((await logOf(school)).filter(({ action }) => action === 'sitting.open')).toHaveLength(1);
    expect(value(await listSittings(teacher, {})).find((row) => row.sittingId === sittingId)).toMatchObject({
      students: 3,
      read: 0,
    });
  });

  it('takes a practical once, and none that is not of the department', async () => {
    const { teacher, practical } = stage;
    const sectionId = await sectionWith(1);
    const input = { sectionId, versionId: practical.versionId };
    value(await openSitting(teacher, input));
    expect(fieldsOf(await openSitting(teacher, input))).toEqual(['versionId']);
    const elsewhere = await makeSchool();
    const foreign = await makePractical(elsewhere, (await makeActor(elsewhere, 'teacher')).personId);
    expect(fieldsOf(await openSitting(teacher, { sectionId, versionId: foreign.versionId }))).toEqual([
      'versionId',
    ]);
    expect(
      fieldsOf(await openSitting(teacher, { sectionId, versionId: practical.versionId, dueOn: 'soon' })),
    ).toEqual(['dueOn']);
  });

  it('offers a section the versions it does not have, the latest first', async () => {
    const { teacher, school } = stage;
    const { practicalId, versionId } = await makePractical(school, teacher.personId);
    await ownerSql()`
      insert into rubric_versions (school_id, practical_id, number, task, form, rubric, engine_version, published_by)
      select school_id, practical_id, 2, task, form, rubric, engine_version, published_by
      from rubric_versions where id = ${versionId}`;
    const sectionId = await sectionWith(1);
    const sections = value(await readOpenChoices(teacher, {})).sections;
    const offered = sections.find((section) => section.sectionId === sectionId)?.versions ?? [];
    expect(offered.at(-1)).toMatchObject({ versionId, number: 1, latest: false });
    expect(offered.filter(({ latest }) => latest).map(({ number }) => number)).toContain(2);
    value(await openSitting(teacher, { sectionId, versionId }));
    const after = value(await readOpenChoices(teacher, {})).sections.find(
      (section) => section.sectionId === sectionId,
    );
    expect(after?.versions.some((choice) => choice.versionId === versionId)).toBe(false);
    expect(practicalId).toBeTruthy();
  });

  it('is the own teacher’s alone and leaves nothing behind when its last write fails', async () => {
    const { teacher, practical, aide } = stage;
    const sectionId = await sectionWith(1);
    const input = { sectionId, versionId: practical.versionId };
    expect(code(await openSitting(stranger, input))).toBe('not_found');
    expect(code(await openSitting(aide, input))).toBe('forbidden');
    expect(code(await openSitting(head, input))).toBe('forbidden');
    expect(await whileLogFails(() => openSitting(teacher, input))).toBeInstanceOf(Error);
    const rows = await ownerSql()`select id from sittings where section_id = ${sectionId}`;
    expect(rows).toHaveLength(0);
  });
});

describe('readSitting', () => {
  it('tells how far each student’s pieces are read', async () => {
    const { teacher, sittingId, attempts, practical } = await stageRound();
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    await push(teacher, sittingId, [eventOf(teacher, attempts[1])]);
    const { students } = value(await readSitting(teacher, { sittingId }));
    expect(students.map(({ givenName, progress }) => [givenName, progress])).toEqual([
      ['Ana', 'read'],
      ['Ben', 'begun'],
    ]);
  });

  it('counts each student once on the list, by the latest attempt, and nobody who has left', async () => {
    const { teacher, sittingId, attempts, practical, students, sectionId } = await stageRound();
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric);
    const listed = async () =>
      value(await listSittings(teacher, {})).find((row) => row.sittingId === sittingId);
    expect(await listed()).toMatchObject({ students: 2, read: 2, begun: 0, away: 0, conflicts: 0 });
    value(await startRedo(teacher, { sittingId, studentId: students[0].personId }));
    expect(await listed()).toMatchObject({ students: 2, read: 1 });
    await ownerSql()`
      update enrollments set left_on = current_date - 1
      where section_id = ${sectionId} and student_id = ${students[1].personId}`;
    expect(await listed()).toMatchObject({ students: 1, read: 0 });
  });

  it('tells whose tablet has numbered readings that have not arrived', async () => {
    const { teacher, sittingId, attempts } = await stageRound();
    const deviceId = '3f1f7f7e-6f0e-4a58-9d0c-0a5a6cfa0001';
    const events = [1, 2, 6].map((sequence) =>
      eventOf(teacher, attempts[0], {
        sequence,
        cell: { lineId: 'divider', ordinal: sequence === 6 ? 3 : sequence, what: 'length' },
      }),
    );
    await push(teacher, sittingId, events, { deviceId });
    expect(value(await readSitting(teacher, { sittingId })).notArrived).toEqual([
      { name: 'Dayo Okonjo', readings: 3 },
    ]);
  });

  it('is shown to the head of the department, not to another teacher', async () => {
    const { sittingId } = stage;
    expect(code(await readSitting(head, { sittingId }))).toBe('ok');
    expect(code(await readSitting(stranger, { sittingId }))).toBe('not_found');
    expect(code(await readSitting(stage.aide, { sittingId }))).toBe('forbidden');
  });
});

describe('changeAttempt', () => {
  it('keeps events like the bench’s own, each replacing the one before', async () => {
    const { teacher, sittingId, attempts, school } = await stageRound();
    const at = { sittingId, attemptId: attempts[0] };
    expect(value(await changeAttempt(teacher, { ...at, standing: 'absent' }))).toEqual({ changed: true });
    expect(value(await changeAttempt(teacher, { ...at, standing: 'absent' }))).toEqual({ changed: false });
    expect(value(await changeAttempt(teacher, { ...at, standing: 'excused' }))).toEqual({ changed: true });
    expect(value(await changeAttempt(teacher, { ...at, days: '2' }))).toEqual({ changed: true });
    expect(value(await readSitting(teacher, { sittingId })).students[0]).toMatchObject({
      standing: 'excused',
      daysLate: 2,
      conflicts: 0,
    });
    const events = await ownerSql()<{ sequence: number; device_id: string; supersedes: string[] }[]>`
      select sequence, device_id, supersedes from reading_events where attempt_id = ${attempts[0]} order by sequence`;
    expect(events.map(({ sequence, supersedes }) => [sequence, supersedes.length])).toEqual([
      [1, 0],
      [2, 1],
      [3, 0],
    ]);
    expect(new Set(events.map(({ device_id }) => device_id)).size).toBe(1);
    expect((await logOf(school)).filter(({ action }) => action === 'sitting.change')).toHaveLength(3);
  });

  it('settles two standings that stand against each other', async () => {
    const { teacher, aide, sittingId, attempts } = await stageRound();
    const cell = { lineId: '', ordinal: 0, what: '@standing' };
    const plain = { cell, typed: null, unit: null, instrument: null };
    await push(teacher, sittingId, [
      eventOf(teacher, attempts[0], { ...plain, value: { kind: 'standing', standing: 'absent' } }),
    ]);
    await push(aide, sittingId, [
      eventOf(aide, attempts[0], { ...plain, value: { kind: 'standing', standing: 'expected' } }),
    ]);
    expect(value(await readSitting(teacher, { sittingId })).students[0]?.conflicts).toBe(1);
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'absent' }));
    expect(value(await readSitting(teacher, { sittingId })).students[0]).toMatchObject({
      standing: 'absent',
      conflicts: 0,
    });
  });

  it('refuses what is none, other people, and attempts of another sitting', async () => {
    const { sittingId, attempts, teacher, aide } = stage;
    const at = { sittingId, attemptId: attempts[0] };
    const other = await stageRound();
    expect(fieldsOf(await changeAttempt(teacher, { ...at, standing: 'ill' }))).toEqual(['standing']);
    expect(fieldsOf(await changeAttempt(teacher, { ...at, days: '-1' }))).toEqual(['days']);
    expect(
      code(await changeAttempt(teacher, { sittingId, attemptId: other.attempts[0], standing: 'zero' })),
    ).toBe('not_found');
    expect(code(await changeAttempt(stranger, { ...at, standing: 'zero', days: 1 }))).toBe('not_found');
    expect(code(await changeAttempt(aide, { ...at, standing: 'zero', days: 1 }))).toBe('forbidden');
    expect(code(await changeAttempt(head, { ...at, standing: 'zero', days: 1 }))).toBe('forbidden');
    expect(
      await whileLogFails(() => changeAttempt(teacher, { ...at, standing: 'zero', days: 1 })),
    ).toBeInstanceOf(Error);
    expect(await storedEvents(attempts[0])).toEqual([]);
    expect(value(await readSitting(teacher, { sittingId })).students[0]).toMatchObject({
      standing: 'expected',
      daysLate: 0,
    });
  });
});

describe('startRedo', () => {
  it('gives the next attempt once the one before is read', async () => {
    const { teacher, sittingId, attempts, practical, students } = await stageRound();
    const at = { sittingId, studentId: students[0].personId };
    expect(code(await startRedo(teacher, at))).toBe('conflict');
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    expect(value(await startRedo(teacher, at))).toEqual({ attemptNumber: 2 });
    expect(code(await startRedo(teacher, at))).toBe('conflict');
    const shown = value(await readSitting(teacher, { sittingId })).students.filter(
      ({ studentId }) => studentId === at.studentId,
    );
    expect(shown.map(({ attemptNumber, current }) => [attemptNumber, current])).toEqual([
      [1, false],
      [2, true],
    ]);
  });

  it('is the own teacher’s alone and leaves nothing behind when its last write fails', async () => {
    const { teacher, sittingId, attempts, practical, students, aide } = await stageRound();
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    const at = { sittingId, studentId: students[0].personId };
    expect(code(await startRedo(aide, at))).toBe('forbidden');
    expect(code(await startRedo(stranger, at))).toBe('not_found');
    expect(code(await startRedo(teacher, { sittingId, studentId: 'nobody' }))).toBe('invalid');
    expect(await whileLogFails(() => startRedo(teacher, at))).toBeInstanceOf(Error);
    expect(value(await readSitting(teacher, { sittingId })).students).toHaveLength(2);
  });
});

describe('changeDue', () => {
  it('sets the day or takes it away, for the own teacher alone', async () => {
    const { teacher, sittingId, aide } = await stageRound();
    expect(value(await changeDue(teacher, { sittingId, dueOn: '2026-12-20' }))).toEqual({
      dueOn: '2026-12-20',
    });
    expect(value(await changeDue(teacher, { sittingId, dueOn: '' }))).toEqual({ dueOn: null });
    expect(fieldsOf(await changeDue(teacher, { sittingId, dueOn: '20 Dec' }))).toEqual(['dueOn']);
    expect(code(await changeDue(stranger, { sittingId, dueOn: '2026-12-20' }))).toBe('not_found');
    expect(code(await changeDue(aide, { sittingId, dueOn: '2026-12-20' }))).toBe('forbidden');
    expect(await whileLogFails(() => changeDue(teacher, { sittingId, dueOn: '2026-12-20' }))).toBeInstanceOf(
      Error,
    );
    expect(value(await readSitting(teacher, { sittingId })).dueOn).toBeNull();
  });
});
