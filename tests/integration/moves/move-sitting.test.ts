import { beforeAll, describe, expect, test } from 'vitest';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { readResult } from '@/lib/data/own/read-result';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { moveSitting } from '@/lib/data/sittings/move-sitting';
import { modifyFor } from '@/tests/support/accommodations';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { lockPrediction, markPieces } from '@/tests/support/mark-pieces';
import {
  addVersion,
  dearer,
  move,
  preview,
  publish,
  recordFromEvents,
  standOf,
  withoutLine,
} from '@/tests/support/moves';
import { outcomes, push } from '@/tests/support/push-events';
import { readingsOf } from '@/tests/support/readings';
import { eventOf, type RoundStage, sheetOf, stageRound } from '@/tests/support/round-stage';
import { defaultForm, defaultRubric, ticksOf } from '@/tests/support/rubrics';
import { logOf, makeActor, whileLogFails } from '@/tests/support/school';
import { scoreByOracle } from '@/tests/support/scoring-oracle';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/length': '3 3/8' };

/** Two students: one who loses points, one who loses none. */
async function readClass(): Promise<RoundStage> {
  const stage = await stageRound();
  const { teacher, sittingId, attempts, practical } = stage;
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[1], practical.rubric);
  return stage;
}

async function scoresOf(stage: RoundStage): Promise<(number | null | undefined)[]> {
  const { sheets } = await standOf(stage);
  return stage.attempts.map((id) => sheets.find(({ attempt_id }) => attempt_id === id)?.score);
}

describe('moving a sitting as it is', () => {
  let stage: RoundStage;
  let versionId: string;

  beforeAll(async () => {
    stage = await readClass();
    versionId = await addVersion(stage, 2, dearer);
  });

  test('prices everything by the other version, exactly as re-scoring the events does', async () => {
    const before = await preview(stage, versionId);
    expect(value(await move(stage, versionId))).toEqual({
      sittingId: stage.sittingId,
      sectionId: stage.sectionId,
      versionNumber: 2,
      attempts: 2,
    });
    const stand = await standOf(stage);
    expect(stand).toMatchObject({ number: 2, moves: 1, undone: 0, log: 1 });
    for (const attemptId of stage.attempts) {
      const expected = scoreByOracle(dearer, await recordFromEvents(attemptId));
      const sheet = stand.sheets.find(({ attempt_id }) => attempt_id === attemptId);
      expect(sheet).toMatchObject({ score: expected.score, held: 0, version: 2, sheet: expected });
      expect(before.students.find((each) => each.attemptId === attemptId)?.after).toBe(expected.score);
    }
    const entry = (await logOf(stage.school)).filter(({ action }) => action === 'sitting.move');
    expect(entry).toHaveLength(1);
    expect(entry[0]).toMatchObject({
      actor_id: stage.teacher.personId,
      details: { from: 1, to: 2, holdHarmless: false, lose: 1, same: 1, gain: 0, attempts: 2 },
    });
  });

  test('to the version it stands under already is refused at the field', async () => {
    const input = { sittingId: stage.sittingId, versionId, holdHarmless: false, seen: 'x' };
    expect(fieldsOf(await moveSitting(stage.teacher, input))).toEqual(['versionId']);
  });
});

describe('moving a sitting so that nobody drops', () => {
  test('keeps the better score on another total, names what was held, and lets the others gain', async () => {
    const stage = await readClass();
    const rubric = { ...dearer, outOf: 4500, roundTo: 10 };
    const versionId = await addVersion(stage, 2, rubric);
    const [before] = await scoresOf(stage);
    value(await move(stage, versionId, { holdHarmless: true }));
    const own = scoreByOracle(rubric, await recordFromEvents(stage.attempts[0])).score ?? 0;
    const kept = Math.ceil(((before ?? 0) * 45) / 1000) * 10;
    expect(kept).toBeGreaterThan(own);
    expect(await scoresOf(stage)).toEqual([kept, 4500]);
    const [sheet] = (await standOf(stage)).sheets.filter(
      ({ attempt_id }) => attempt_id === stage.attempts[0],
    );
    expect(sheet).toMatchObject({ held: kept - own, total: 4500 });

    await publish(stage);
    const told = value(await readResult(stage.students[0], { sittingId: stage.sittingId }));
    expect(told).toMatchObject({
      score: kept,
      total: 4500,
      held: { points: kept - own, versionNumber: 1 },
      versionNumber: 2,
    });
    expect(value(await readResult(stage.students[1], { sittingId: stage.sittingId })).held).toBeNull();
  });

  test('goes on holding over further moves, and ends with one as it is', async () => {
    const stage = await readClass();
    const [best] = await scoresOf(stage);
    const second = await addVersion(stage, 2, dearer);
    const third = await addVersion(stage, 3, { ...dearer, ceiling: 101 });
    value(await move(stage, second, { holdHarmless: true }));
    value(await move(stage, third, { holdHarmless: true }));
    expect((await scoresOf(stage))[0]).toBe(best);
    value(await move(stage, second));
    const bare = scoreByOracle(dearer, await recordFromEvents(stage.attempts[0])).score;
    expect((await scoresOf(stage))[0]).toBe(bare);
    expect(bare).toBeLessThan(best ?? 0);
  });

  test('holds what is recorded after the move too, and the bonus each version would have given', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, attempts, students, practical } = stage;
    const form = defaultForm();
    const prediction = { ...form.policies.prediction, full: 0, close: 0 };
    const versionId = await addVersion(stage, 2, dearer, {
      form: { ...form, policies: { ...form.policies, prediction } },
    });
    value(await move(stage, versionId, { holdHarmless: true }));
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await publish(stage);
    const recorded = await recordFromEvents(attempts[0]);
    const before = scoreByOracle(practical.rubric, { ...recorded, bonus: 200 }).score ?? 0;
    const now = scoreByOracle(dearer, recorded).score ?? 0;
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      score: before,
      bonus: 0,
      held: { points: before - now, versionNumber: 1 },
    });
  });
});

describe('a move is refused', () => {
  let stage: RoundStage;
  let versionId: string;

  beforeAll(async () => {
    stage = await readClass();
    versionId = await addVersion(stage, 2, dearer);
  });

  test('to whoever looked before a reading, a standing, a modified rubric or a publication came', async () => {
    const { teacher, sittingId, attempts } = stage;
    const attempt = async (change: () => Promise<unknown>) => {
      const { seen } = await preview(stage, versionId);
      await change();
      return code(await moveSitting(teacher, { sittingId, versionId, holdHarmless: true, seen }));
    };
    const before = await standOf(stage);
    const [wrong] = await ownerSql()`
      select id from reading_events where attempt_id = ${attempts[1]} and line_id = 'base' and what = 'length'`;
    const reread = eventOf(teacher, attempts[1], { supersedes: [wrong?.id] });
    expect(await attempt(() => push(teacher, sittingId, [reread]))).toBe('stale');
    expect(
      await attempt(() => changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'zero' })),
    ).toBe('stale');
    let accommodationId = '';
    expect(
      await attempt(async () => {
        accommodationId = await modifyFor(stage, {});
      }),
    ).toBe('stale');
    expect(await attempt(() => endAccommodation(teacher, { accommodationId }))).toBe('stale');
    expect(await attempt(() => publish(stage))).toBe('stale');
    expect(await standOf(stage)).toMatchObject({ number: before.number, moves: 0, log: 0 });
  });

  test('to everybody but the section’s own teachers', async () => {
    const { school, aide, students, sittingId } = stage;
    const { seen } = await preview(stage, versionId);
    const input = { sittingId, versionId, holdHarmless: true, seen };
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'head'),
      await makeActor(school, 'admin'),
    ]) {
      expect(code(await moveSitting(actor, input))).toBe('forbidden');
    }
    expect(code(await moveSitting(await makeActor(school, 'teacher'), input))).toBe('not_found');
    expect(code(await moveSitting((await stageRound()).teacher, input))).toBe('not_found');
    expect(code(await moveSitting(null, input))).toBe('unauthenticated');
    expect(fieldsOf(await moveSitting(stage.teacher, { ...input, seen: '' }))).toEqual(['seen']);
    expect(await standOf(stage)).toMatchObject({ number: 1, moves: 0, log: 0 });
  });

  test('whole when its last write fails: neither move nor sheet nor version is left behind', async () => {
    const before = await standOf(stage);
    const { seen } = await preview(stage, versionId);
    const input = { sittingId: stage.sittingId, versionId, holdHarmless: true, seen };
    expect(await whileLogFails(() => moveSitting(stage.teacher, input))).toBeInstanceOf(Error);
    expect(await standOf(stage)).toEqual(before);
    expect(value(await moveSitting(stage.teacher, input))).toMatchObject({ versionNumber: 2 });
  });
});

describe('lines that come and go with a version', () => {
  test('leave their readings in the events, and count again when the sitting comes back', async () => {
    const stage = await readClass();
    const { practical, attempts } = stage;
    const fewer = withoutLine(practical.rubric, 'divider');
    const versionId = await addVersion(stage, 2, fewer);
    const before = await standOf(stage);
    const count = async () =>
      (await ownerSql()`select 1 from reading_events where attempt_id = ${attempts[0]}`).length;
    const events = await count();
    value(await move(stage, versionId));
    const recorded = await recordFromEvents(attempts[0]);
    const asked = { ...recorded, pieces: recorded.pieces.filter(({ lineId }) => lineId !== 'divider') };
    expect((await scoresOf(stage))[0]).toBe(scoreByOracle(fewer, asked).score);
    expect(await count()).toBe(events);
    value(await move(stage, practical.versionId));
    expect((await standOf(stage)).sheets).toEqual(before.sheets);
  });

  test('a conflict on a piece that is no longer asked for holds nothing up', async () => {
    const stage = await readClass();
    const { teacher, sittingId, attempts, practical } = stage;
    const cell = { lineId: 'divider', ordinal: 1, what: 'length' };
    await push(teacher, sittingId, [eventOf(teacher, attempts[0], { cell, supersedes: [] })]);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 1, score_points: null });
    const fewer = withoutLine(practical.rubric, 'divider');
    const versionId = await addVersion(stage, 2, fewer);
    const looked = await preview(stage, versionId);
    value(await move(stage, versionId));
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 0, complete: true });
    expect((await scoresOf(stage))[0]).toBe(looked.students[0]?.after);
    const back = await preview(stage, practical.versionId);
    expect(back.students[0]).toMatchObject({ before: looked.students[0]?.after, after: null });
  });

  test('a device with an older version’s bundle is heard: its readings are kept, unknown ones refused', async () => {
    const stage = await stageRound();
    const { teacher, students, sittingId, attempts, practical } = stage;
    const versionId = await addVersion(stage, 2, withoutLine(practical.rubric, 'divider'));
    const third = withoutLine(defaultRubric([['lid', 1, '1/2 x 2 x 4']]), 'none');
    value(await move(stage, versionId));
    const old = eventOf(teacher, attempts[0], { cell: { lineId: 'divider', ordinal: 1, what: 'length' } });
    const unknown = eventOf(teacher, attempts[0], { cell: { lineId: 'lid', ordinal: 1, what: 'length' } });
    expect(await outcomes(push(teacher, sittingId, [old, unknown]))).toEqual([
      'kept',
      'refused: This rubric has no line “lid”.',
    ]);
    expect(await sheetOf(attempts[0])).toMatchObject({ lost_points: 0, conflicts: 0 });
    // Moved on, the first version and the second are both known still.
    value(await move(stage, await addVersion(stage, 3, third)));
    const late = eventOf(teacher, attempts[0], {
      cell: { lineId: 'divider', ordinal: 2, what: 'length' },
      value: { kind: 'value', ticks: ticksOf('3 1/2') },
      typed: '3 1/2',
    });
    expect(await outcomes(push(teacher, sittingId, [late]))).toEqual(['kept']);
    // A lock made under the first version closes all that it asks for.
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    expect((await sheetOf(attempts[0], 'own'))?.locked_at).not.toBeNull();
    const open = readingsOf(students[1], attempts[1], practical.rubric, {}, 'own').slice(1);
    const lock = eventOf(students[1], attempts[1], {
      ...{ side: 'own', cell: { lineId: '', ordinal: 0, what: '@lock' } },
      value: { kind: 'lock', locked: true, receipt: 'x' },
      ...{ typed: null, unit: null, instrument: null },
    });
    const device = { deviceId: students[1].personId };
    expect((await outcomes(push(students[1], sittingId, [...open, lock], device))).at(-1)).toBe(
      'refused: 3 sizes are neither recorded nor marked “couldn’t read”.',
    );
  });
});
