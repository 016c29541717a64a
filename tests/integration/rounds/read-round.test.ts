import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { roundBundleSchema } from '@/lib/contracts/rounds';
import { listRounds } from '@/lib/data/rounds/list-rounds';
import { readInHand } from '@/lib/data/rounds/read-in-hand';
import { readRound } from '@/lib/data/rounds/read-round';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { ownerSql } from '../../support/database';
import { enroll, makeAttempt } from '../../support/factories';
import { push } from '../../support/push-events';
import { eventOf, type RoundStage, stageRound } from '../../support/round-stage';
import { logOf, makeActor, makeSchool } from '../../support/school';

let stage: RoundStage;
beforeEach(async () => {
  stage = await stageRound();
});

async function bundleFor(actor = stage.teacher) {
  const result = await readRound(actor, { sittingId: stage.sittingId });
  if (!result.ok) throw new Error(result.problem.message);
  return result.value;
}

describe('the bundle of a round', () => {
  test('has task, rubric, roster in order with attempts, and the bench’s events; the device can parse it', async () => {
    const { teacher, sittingId, attempts } = stage;
    const event = eventOf(teacher, attempts[0]);
    await push(teacher, sittingId, [event]);
    const bundle = await bundleFor();
    expect(roundBundleSchema.parse(JSON.parse(JSON.stringify(bundle)))).toEqual(bundle);
    expect(bundle).toMatchObject({
      period: '3',
      versionNumber: 1,
      rubric: stage.practical.rubric,
      task: stage.practical.task,
      may: { finish: true, settle: true },
      authors: { [teacher.personId]: 'Dayo Okonjo' },
    });
    expect(bundle.students.map(({ givenName, attemptId }) => [givenName, attemptId])).toEqual([
      ['Ana', attempts[0]],
      ['Ben', attempts[1]],
    ]);
    expect(bundle.events).toMatchObject([{ ...event, deviceId: expect.any(String) }]);
  });

  test('never holds what a student recorded, whatever the role', async () => {
    const [ana] = stage.students;
    await push(ana, stage.sittingId, [eventOf(ana, stage.attempts[0], { side: 'own' })]);
    for (const actor of [stage.teacher, stage.aide]) {
      const text = JSON.stringify(await bundleFor(actor));
      expect(text).not.toContain('"own"');
      expect(text).not.toContain('6 15/16');
    }
  });

  test('an aide may neither finish nor settle', async () => {
    expect((await bundleFor(stage.aide)).may).toEqual({ finish: false, settle: false });
  });

  test('one who joined later gets an attempt, once; one who left is not in it; a redo is the latest attempt', async () => {
    const { school, sectionId, sittingId, students } = stage;
    const late = await makeActor(school, 'student', { givenName: 'Zoe', familyName: 'Aalto' });
    await enroll(school, sectionId, late.personId);
    const redo = await makeAttempt(school, sittingId, students[1].personId, 2);
    await ownerSql()`update enrollments set left_on = current_date - 3 where student_id = ${students[0].personId}`;
    await bundleFor();
    const bundle = await bundleFor();
    expect(
      bundle.students.map(({ givenName, attemptNumber, attemptId }) => [givenName, attemptNumber, attemptId]),
    ).toEqual([
      ['Zoe', 1, expect.any(String)],
      ['Ben', 2, redo],
    ]);
    const [row] = await ownerSql()`
      select count(*)::int as count from attempts where sitting_id = ${sittingId} and student_id = ${late.personId}`;
    expect(row?.count).toBe(1);
  });

  test('the day a student leaves on, by the school’s clock, is the first without them; the day before is with them', async () => {
    const { school, sectionId, students } = stage;
    const late = await makeActor(school, 'student', { givenName: 'Zoe', familyName: 'Aalto' });
    await enroll(school, sectionId, late.personId);
    const leaves = (personId: string, days: number) => ownerSql()`
      update enrollments set left_on = (now() at time zone 'America/Chicago')::date + ${days}::int
      where student_id = ${personId}`;
    await leaves(late.personId, 0);
    await leaves(students[0].personId, 0);
    await leaves(students[1].personId, 1);
    expect((await bundleFor()).students.map(({ givenName }) => givenName)).toEqual(['Ben']);
    expect(await listRounds(stage.teacher, {})).toMatchObject({ value: [{ students: 1 }] });
    const made = await ownerSql()`select 1 from attempts where student_id = ${late.personId}`;
    expect(made).toHaveLength(0);
  });

  test('opening it is in the access log with the students it shows, once an hour and person', async () => {
    await bundleFor();
    await bundleFor();
    await bundleFor(stage.aide);
    expect(await logOf(stage.school)).toMatchObject([
      {
        action: 'round.read',
        actor_id: stage.teacher.personId,
        details: { students: stage.students.map(({ personId }) => personId) },
      },
      { action: 'round.read', actor_id: stage.aide.personId },
    ]);
  });

  test('is not found by teachers of other sections or schools, and forbidden to students', async () => {
    const elsewhere = await makeSchool();
    for (const stranger of [
      await makeActor(stage.school, 'teacher'),
      await makeActor(elsewhere, 'teacher'),
    ]) {
      expect(await readRound(stranger, { sittingId: stage.sittingId })).toMatchObject({
        problem: { code: 'not_found' },
      });
    }
    expect(await readRound(stage.students[0], { sittingId: stage.sittingId })).toMatchObject({
      problem: { code: 'forbidden' },
    });
    expect(await readRound(stage.teacher, { sittingId: 'x' })).toMatchObject({
      problem: { code: 'invalid' },
    });
  });
});

describe('who has whose pieces in hand', () => {
  test('is told to the other devices, until put down', async () => {
    const { teacher, aide, sittingId, attempts } = stage;
    const [tablet, other] = [randomUUID(), randomUUID()];
    const take = (attemptId: string | null) =>
      takeInHand(teacher, { sittingId, deviceId: tablet, attemptId });
    const seenBy = async (deviceId: string) => {
      const result = await readInHand(aide, { sittingId, deviceId });
      return result.ok ? result.value.others.map(({ name, attemptId }) => [name, attemptId]) : result.problem;
    };
    await take(attempts[0]);
    expect(await seenBy(other)).toEqual([['D. Okonjo', attempts[0]]]);
    expect(await seenBy(tablet)).toEqual([]);
    await take(attempts[1]);
    expect(await seenBy(other)).toEqual([['D. Okonjo', attempts[1]]]);
    await take(null);
    expect(await seenBy(other)).toEqual([]);
  });

  test('a device not heard of for a while has put them down', async () => {
    const { teacher, aide, sittingId, attempts } = stage;
    await takeInHand(teacher, { sittingId, deviceId: randomUUID(), attemptId: attempts[0] });
    await ownerSql()`update in_hand set seen_at = now() - interval '3 minutes' where sitting_id = ${sittingId}`;
    expect(await readInHand(aide, { sittingId, deviceId: randomUUID() })).toMatchObject({
      ok: true,
      value: { others: [] },
    });
  });

  test('takes no attempt of another sitting, and tells strangers nothing', async () => {
    const other = await stageRound();
    const input = { sittingId: stage.sittingId, deviceId: randomUUID() };
    expect(await takeInHand(stage.teacher, { ...input, attemptId: other.attempts[0] })).toMatchObject({
      problem: { code: 'not_found' },
    });
    expect(await readInHand(other.teacher, input)).toMatchObject({ problem: { code: 'not_found' } });
    expect(await takeInHand(stage.students[0], { ...input, attemptId: null })).toMatchObject({
      problem: { code: 'forbidden' },
    });
  });
});

describe('today’s rounds', () => {
  const rows = async (actor = stage.teacher) => {
    const result = await listRounds(actor, {});
    if (!result.ok) throw new Error(result.problem.message);
    return result.value;
  };

  test('say how far each has come', async () => {
    const { teacher, sittingId, attempts } = stage;
    const at = (what: string) => ({ lineId: '', ordinal: 0, what });
    await push(teacher, sittingId, [
      eventOf(teacher, attempts[0]),
      eventOf(teacher, attempts[0], { cell: at('@finish'), value: { kind: 'finish', done: true } }),
      eventOf(teacher, attempts[1], {
        cell: at('@standing'),
        value: { kind: 'standing', standing: 'absent' },
      }),
    ]);
    expect(await rows()).toMatchObject([
      { sittingId, students: 2, finished: 1, begun: 0, absent: 1, conflicts: 0, published: false },
    ]);
  });

  test('an aide sees those of today’s sections, and none once the days are over', async () => {
    expect(await rows(stage.aide)).toHaveLength(1);
    await ownerSql()`
      update section_staff set from_day = current_date - 9, to_day = current_date - 3
      where person_id = ${stage.aide.personId}`;
    expect(await rows(stage.aide)).toEqual([]);
  });

  test('a teacher sees own sections alone', async () => {
    expect(await rows(await makeActor(stage.school, 'teacher'))).toEqual([]);
  });
});
