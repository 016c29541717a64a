import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { readResult } from '@/lib/data/own/read-result';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { scoreAttempt } from '@/lib/scoring';
import { deriveAttempt } from '@/lib/sync/derive';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { lockPrediction, markPieces } from '@/tests/support/mark-pieces';
import { push } from '@/tests/support/push-events';
import { readingsOf } from '@/tests/support/readings';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { ticksOf } from '@/tests/support/rubrics';
import { logOf, makeActor, whileLogFails } from '@/tests/support/school';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/length': '3 3/8' };

async function publish(actor: Actor, sittingId: string, more: object = {}, reader: Actor = actor) {
  const { seen } = value(await previewPublication(reader, { sittingId }));
  return publishSitting(actor, { sittingId, withoutUnread: false, seen, ...more });
}

async function publications(sittingId: string): Promise<number> {
  const rows = await ownerSql()`select id from publications where sitting_id = ${sittingId}`;
  return rows.length;
}

/** A class of two, both read to the end: the first loses a few points. */
async function readClass(): Promise<RoundStage> {
  const stage = await stageRound();
  const { teacher, sittingId, attempts, practical } = stage;
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[1], practical.rubric);
  return stage;
}

let head: Actor;
let stranger: Actor;
let shared: RoundStage;

beforeAll(async () => {
  shared = await readClass();
  head = await makeActor(shared.school, 'head');
  stranger = await makeActor(shared.school, 'teacher');
});

describe('publishSitting', () => {
  it('tells every student the engine’s own score of what was recorded', async () => {
    const { teacher, sittingId, attempts, practical, students, school, sectionId } = await readClass();
    expect(value(await publish(teacher, sittingId))).toEqual({
      sectionId,
      number: 1,
      scored: 2,
      notRead: 0,
      changed: 2,
    });
    const events = readingsOf(teacher, attempts[0], practical.rubric, SHORT);
    const engine = scoreAttempt(practical.rubric, deriveAttempt(events, 'bench').attempt);
    const result = value(await readResult(students[0], { sittingId }));
    expect(result).toMatchObject({
      status: 'scored',
      score: engine.score,
      total: 10_000,
      bonus: 0,
      corrected: false,
    });
    expect(result.sheet).toEqual(engine);
    expect((await logOf(school)).filter(({ action }) => action === 'sitting.publish')).toHaveLength(1);
    const [sitting] = await ownerSql()`select state from sittings where id = ${sittingId}`;
    expect(sitting?.state).toBe('published');
  });

  it('previews what goes out: scored, absent, excused, zero, not read, begun', async () => {
    const { teacher, sittingId, attempts } = await stageRound();
    await push(teacher, sittingId, [eventOf(teacher, attempts[0])]);
    expect(value(await previewPublication(teacher, { sittingId }))).toMatchObject({
      number: 1,
      scored: 0,
      incomplete: [{ givenName: 'Ana' }],
      unread: [{ givenName: 'Ben' }],
      conflicts: [],
      changed: null,
    });
    await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'zero' });
    await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'absent' });
    expect(value(await previewPublication(teacher, { sittingId }))).toMatchObject({
      zero: 1,
      absent: [{ givenName: 'Ben' }],
      incomplete: [],
      unread: [],
    });
  });

  it('logs a look at what goes out as a look at the sitting, once an hour', async () => {
    const { teacher, sittingId, school } = await stageRound();
    value(await previewPublication(teacher, { sittingId }));
    value(await previewPublication(teacher, { sittingId }));
    expect(await logOf(school)).toMatchObject([
      { action: 'sitting.read', actor_id: teacher.personId, details: { students: 2 } },
    ]);
  });

  it('waits for the teacher’s word before anyone goes out as not read, and then gives no number', async () => {
    const { teacher, sittingId, attempts, practical, students } = await stageRound();
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    await push(teacher, sittingId, [eventOf(teacher, attempts[1])]);
    expect(fieldsOf(await publish(teacher, sittingId))).toEqual(['withoutUnread']);
    expect(await publications(sittingId)).toBe(0);
    expect(value(await publish(teacher, sittingId, { withoutUnread: 'on' }))).toMatchObject({
      scored: 1,
      notRead: 1,
    });
    expect(value(await readResult(students[1], { sittingId }))).toMatchObject({
      status: 'not read',
      score: null,
      sheet: null,
    });
  });

  it('gives a zero as the number 0, and absent and excused without one', async () => {
    const { teacher, sittingId, attempts, students } = await stageRound();
    await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'zero' });
    await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'excused' });
    value(await publish(teacher, sittingId));
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({ status: 'zero', score: 0 });
    expect(value(await readResult(students[1], { sittingId }))).toMatchObject({
      status: 'excused',
      score: null,
    });
  });

  it('refuses while two readings stand against each other, also without the unread', async () => {
    const { teacher, aide, sittingId, attempts } = await readClass();
    const other = eventOf(aide, attempts[0], { value: { kind: 'value', ticks: ticksOf('7') }, typed: '7' });
    await push(aide, sittingId, [other], { deviceId: aide.personId });
    expect(value(await previewPublication(teacher, { sittingId })).conflicts).toMatchObject([
      { givenName: 'Ana' },
    ]);
    const refused = await publish(teacher, sittingId, { withoutUnread: true });
    expect(refused).toMatchObject({
      ok: false,
      problem: { code: 'conflict', message: expect.stringContaining('Ana Abbott') },
    });
    expect(await publications(sittingId)).toBe(0);
  });

  it('adds the bonus of a locked prediction that measured well', async () => {
    const { teacher, sittingId, attempts, practical, students } = await stageRound();
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric, SHORT);
    value(await publish(teacher, sittingId));
    const [with_, without] = await Promise.all(students.map((student) => readResult(student, { sittingId })));
    const first = value(with_ ?? { ok: false, problem: { code: 'not_found', message: '' } });
    const second = value(without ?? { ok: false, problem: { code: 'not_found', message: '' } });
    expect(first).toMatchObject({
      bonus: 200,
      judgement: { because: 'full', agree: 27, of: 27, offBand: 3, caught: 3 },
    });
    expect(first.predicted).toBe(second.score);
    expect(first.score).toBe((second.score ?? 0) + 200);
    expect(second).toMatchObject({ bonus: 0, predicted: null, judgement: null });
  });

  it.each([
    ['count', 200],
    ['leave out', 0],
  ])('asks about predictions that were locked late, and does as told: %s', async (lateLocks, bonus) => {
    const { teacher, sittingId, attempts, practical, students, school } = await stageRound();
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric);
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    expect(value(await previewPublication(teacher, { sittingId })).late).toMatchObject([
      { givenName: 'Ana', bonus: 200 },
    ]);
    expect(fieldsOf(await publish(teacher, sittingId))).toEqual(['lateLocks']);
    value(await publish(teacher, sittingId, { lateLocks }));
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      bonus,
      predicted: expect.any(Number),
    });
    expect((await logOf(school)).at(-1)?.details).toMatchObject({ lateLocks });
  });

  it('publishes again only what has changed, as the next publication', async () => {
    const { teacher, sittingId, attempts, students, practical } = await readClass();
    value(await publish(teacher, sittingId));
    const before = value(await readResult(students[0], { sittingId }));
    const again = await publish(teacher, sittingId);
    expect(again).toMatchObject({
      ok: false,
      problem: { code: 'conflict', message: expect.stringContaining('Nothing changed') },
    });
    expect(value(await previewPublication(teacher, { sittingId }))).toMatchObject({ number: 2, changed: 0 });
    const [wrong] = await ownerSql()<{ id: string }[]>`
      select id from reading_events where attempt_id = ${attempts[0]} and line_id = 'divider' and ordinal = 2 and what = 'length'`;
    const line = practical.rubric.lines.find(({ id }) => id === 'divider');
    await push(teacher, sittingId, [
      eventOf(teacher, attempts[0], {
        cell: { lineId: 'divider', ordinal: 2, what: 'length' },
        value: { kind: 'value', ticks: line?.target.length ?? 0 },
        typed: '3 1/2',
        supersedes: [wrong?.id ?? ''],
      }),
    ]);
    expect(value(await publish(teacher, sittingId))).toMatchObject({ number: 2, changed: 1 });
    const after = value(await readResult(students[0], { sittingId }));
    expect(after.corrected).toBe(true);
    expect(after.score ?? 0).toBeGreaterThan(before.score ?? 0);
    expect(await publications(sittingId)).toBe(2);
  });

  it('sends back whoever looked before something changed', async () => {
    const { teacher, sittingId, attempts } = await readClass();
    const { seen } = value(await previewPublication(teacher, { sittingId }));
    await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'absent' });
    expect(code(await publishSitting(teacher, { sittingId, withoutUnread: false, seen }))).toBe('stale');
    expect(fieldsOf(await publishSitting(teacher, { sittingId, withoutUnread: false, seen: 'x' }))).toEqual([
      'seen',
    ]);
  });

  it('is the own teacher’s alone: no aide, head or other teacher publishes', async () => {
    const { teacher, aide, sittingId } = shared;
    const { seen } = value(await previewPublication(teacher, { sittingId }));
    const input = { sittingId, withoutUnread: true, seen };
    expect(code(await publishSitting(aide, input))).toBe('forbidden');
    expect(code(await publishSitting(head, input))).toBe('forbidden');
    expect(code(await publishSitting(stranger, input))).toBe('not_found');
    expect(code(await previewPublication(stranger, { sittingId }))).toBe('not_found');
    expect(await publications(sittingId)).toBe(0);
  });

  it('leaves neither publication nor results behind when its last write fails', async () => {
    const { teacher, sittingId } = shared;
    const { seen } = value(await previewPublication(teacher, { sittingId }));
    expect(
      await whileLogFails(() => publishSitting(teacher, { sittingId, withoutUnread: false, seen })),
    ).toBeInstanceOf(Error);
    expect(await publications(sittingId)).toBe(0);
    const [sitting] = await ownerSql()`select state from sittings where id = ${sittingId}`;
    expect(sitting?.state).toBe('open');
    expect(value(await publish(teacher, sittingId))).toMatchObject({ number: 1 });
  });
});
