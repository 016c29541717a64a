import { Fraction } from 'fraction.js';
import { beforeAll, describe, expect, test } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { startRedo } from '@/lib/data/sittings/start-redo';
import type { Attempt, Rubric } from '@/lib/scoring';
import { modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { modifyFor, WIDER } from '@/tests/support/accommodations';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { enroll, makeAttempt, makePractical } from '@/tests/support/factories';
import { lockPrediction, markPieces } from '@/tests/support/mark-pieces';
import { addVersion, dearer, preview, recordFromEvents, withoutLine } from '@/tests/support/moves';
import { push } from '@/tests/support/push-events';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { defaultForm, defaultRubric } from '@/tests/support/rubrics';
import { logOf, makeActor } from '@/tests/support/school';
import { scoreByOracle } from '@/tests/support/scoring-oracle';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/length': '3 3/8' };

async function join(stage: RoundStage, familyName: string): Promise<[Actor, string]> {
  const student = await makeActor(stage.school, 'student', { givenName: 'Extra', familyName });
  await enroll(stage.school, stage.sectionId, student.personId);
  return [student, await makeAttempt(stage.school, stage.sittingId, student.personId)];
}

/** Out of 45 points instead of 100, and the first free distance half as wide. */
function other(): Rubric {
  const rubric = defaultRubric();
  const halve = (bands: { within: number; lose: number }[]) =>
    bands.map(({ within, lose }, at) => ({ within: at === 0 ? within / 2 : within, lose }));
  return {
    ...rubric,
    outOf: 4500,
    roundTo: 50,
    lines: rubric.lines.map((line) => {
      const rule = {
        ...line.sizes.length,
        over: halve(line.sizes.length.over),
        under: halve(line.sizes.length.under),
      };
      return { ...line, sizes: { thickness: rule, width: rule, length: rule } };
    }),
  };
}

describe('the preview of a move', () => {
  let stage: RoundStage;
  let versionId: string;
  const from = defaultRubric();
  const to = other();

  beforeAll(async () => {
    stage = await stageRound();
    const { teacher, sittingId, attempts } = stage;
    versionId = await addVersion(stage, 2, to);
    await markPieces(teacher, sittingId, attempts[0], from, SHORT);
    await markPieces(teacher, sittingId, attempts[1], from, { 'side/2/width': '2 1/40' });
    const [, perfect] = await join(stage, 'Cole');
    await markPieces(teacher, sittingId, perfect, from);
    const [, gross] = await join(stage, 'Dunn');
    await markPieces(teacher, sittingId, gross, from, { 'end/2/length': '3', 'side/1/thickness': '0.55' });
    const [, begun] = await join(stage, 'Ek');
    await push(teacher, sittingId, [eventOf(teacher, begun)]);
    const [, zero] = await join(stage, 'Fell');
    value(await changeAttempt(teacher, { sittingId, attemptId: zero, standing: 'zero' }));
    const [, absent] = await join(stage, 'Gray');
    await markPieces(teacher, sittingId, absent, from, SHORT);
    value(await changeAttempt(teacher, { sittingId, attemptId: absent, standing: 'absent' }));
    const [, torn] = await join(stage, 'Hale');
    await markPieces(teacher, sittingId, torn, from);
    await push(teacher, sittingId, [eventOf(teacher, torn, { supersedes: [] })]);
    const [again] = await join(stage, 'Iver');
    const tried = (await ownerSql()`select id from attempts where student_id = ${again.personId}`)[0]?.id;
    await markPieces(teacher, sittingId, tried, from, SHORT);
    value(await startRedo(teacher, { sittingId, studentId: again.personId }));
  });

  test('equals an independent re-scoring of the stored events, student by student', async () => {
    const { students, ...sums } = await preview(stage, versionId);
    expect(students.map(({ familyName, attemptNumber }) => [familyName, attemptNumber])).toEqual([
      ['Abbott', 1],
      ['Brandt', 1],
      ['Cole', 1],
      ['Dunn', 1],
      ['Ek', 1],
      ['Fell', 1],
      ['Gray', 1],
      ['Hale', 1],
      ['Iver', 1],
      ['Iver', 2],
    ]);
    const changes: Fraction[] = [];
    for (const moved of students) {
      const { familyName, attemptNumber } = moved;
      if (['Ek', 'Gray', 'Hale'].includes(familyName) || attemptNumber === 2) {
        expect(moved).toMatchObject({ before: null, after: null, held: null, change: null });
        continue;
      }
      if (familyName === 'Fell') {
        expect(moved).toMatchObject({ before: 0, after: 0, held: 0, change: 0 });
        changes.push(new Fraction(0));
        continue;
      }
      const recorded = await recordFromEvents(moved.attemptId);
      const [before, after] = [scoreByOracle(from, recorded), scoreByOracle(to, recorded)];
      const onNewScale = new Fraction(before.score ?? Number.NaN).mul(45).div(100);
      const change = new Fraction(after.score ?? Number.NaN).sub(onNewScale).add(0.5).floor();
      const kept = onNewScale.div(50).ceil().mul(50);
      const held = kept.gt(after.score ?? 0) ? kept.valueOf() : after.score;
      expect(moved).toMatchObject({
        before: before.score,
        after: after.score,
        change: change.valueOf(),
        held,
      });
      expect(moved).toMatchObject({ told: false, modified: false });
      changes.push(change);
    }
    const mean = changes.reduce((sum, each) => sum.add(each), new Fraction(0)).div(changes.length);
    expect(sums).toMatchObject({
      from: { number: 1, total: 10_000 },
      to: { versionId, number: 2, total: 4500 },
      gain: changes.filter((each) => each.gt(0)).length,
      same: changes.filter((each) => each.equals(0)).length,
      lose: changes.filter((each) => each.lt(0)).length,
      meanChange: mean.add(0.5).floor().valueOf(),
      notAsked: [],
    });
    expect(sums.lose).toBeGreaterThan(0);
  });

  test('is the same as long as nothing changes, and another after a reading or under another version', async () => {
    const { seen } = await preview(stage, versionId);
    expect((await preview(stage, versionId)).seen).toBe(seen);
    const third = await addVersion(stage, 3, dearer);
    expect((await preview(stage, third)).seen).not.toBe(seen);
    const { teacher, sittingId, attempts } = stage;
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'excused' }));
    expect((await preview(stage, versionId)).seen).not.toBe(seen);
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'expected' }));
    expect((await preview(stage, versionId)).seen).toBe(seen);
  });

  test('tells how far it has come, and stops when it is called off', async () => {
    const { teacher, sittingId } = stage;
    const heard: [number, number][] = [];
    const onProgress = (done: number, of: number) => heard.push([done, of]);
    value(await previewMove(teacher, { sittingId, versionId }, { onProgress }));
    expect(heard).toEqual([
      [0, 10],
      [10, 10],
    ]);
    const stopping = new AbortController();
    const running = previewMove(
      teacher,
      { sittingId, versionId },
      { signal: stopping.signal, onProgress: () => stopping.abort() },
    );
    await expect(running).rejects.toMatchObject({ name: 'AbortError' });
  });

  test('is the section’s own teacher’s alone, and only of a version of this practical', async () => {
    const { school, aide, students, sittingId, teacher, practical } = stage;
    const ask = async (actor: Actor | null, id = versionId) =>
      previewMove(actor, { sittingId, versionId: id });
    expect(code(await ask(null))).toBe('unauthenticated');
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'head'),
      await makeActor(school, 'admin'),
    ]) {
      expect(code(await ask(actor))).toBe('forbidden');
    }
    expect(code(await ask(await makeActor(school, 'teacher')))).toBe('not_found');
    expect(code(await ask((await stageRound()).teacher))).toBe('not_found');
    const foreign = await makePractical(school, teacher.personId);
    expect(code(await ask(teacher, foreign.versionId))).toBe('not_found');
    expect(fieldsOf(await ask(teacher, practical.versionId))).toEqual(['versionId']);
    expect(fieldsOf(await ask(teacher, 'second'))).toEqual(['versionId']);
  });

  test('is a look at records that is logged, and changes nothing', async () => {
    const { school, teacher, sittingId } = stage;
    const entries = (await logOf(school)).filter(({ action }) => action === 'sitting.read');
    expect(entries.length).toBeGreaterThan(0);
    expect(entries.at(-1)?.actor_id).toBe(teacher.personId);
    const [sitting] = await ownerSql()`select rubric_version_id from sittings where id = ${sittingId}`;
    expect(sitting?.rubric_version_id).toBe(stage.practical.versionId);
  });
});

describe('in the preview of a move', () => {
  test('predictions in time count with their bonus under each version, late ones not', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, attempts, students, practical } = stage;
    const form = defaultForm();
    const prediction = { ...form.policies.prediction, full: 50, close: 0 };
    const versionId = await addVersion(stage, 2, practical.rubric, {
      form: { ...form, policies: { ...form.policies, prediction } },
    });
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric, SHORT);
    await lockPrediction(students[1], sittingId, attempts[1], practical.rubric, SHORT);
    const { students: moved } = await preview(stage, versionId);
    const bare = scoreByOracle(practical.rubric, await recordFromEvents(attempts[0])).score ?? 0;
    const withBonus = (bonus: number, recorded: Attempt) =>
      scoreByOracle(practical.rubric, { ...recorded, bonus }).score;
    const recorded = await recordFromEvents(attempts[0]);
    expect(moved[0]).toMatchObject({ before: withBonus(200, recorded), after: withBonus(50, recorded) });
    expect(moved[0]?.held).toBe(moved[0]?.before);
    expect(moved[1]).toMatchObject({ before: bare, after: bare, change: 0 });
  });

  test('a student’s modified rubric is applied to both versions', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, attempts, practical } = stage;
    const versionId = await addVersion(stage, 2, dearer);
    for (const attemptId of attempts) {
      await markPieces(teacher, sittingId, attemptId, practical.rubric, SHORT);
    }
    const modification = { ...WIDER, excused: [{ lineId: 'base', axis: null }] };
    await modifyFor(stage, { modification });
    const recorded = await recordFromEvents(attempts[0]);
    const expected = (rubric: Rubric) =>
      scoreByOracle(modifyRubric(rubric, modification), modifyAttempt(rubric, recorded, modification)).score;
    const { students } = await preview(stage, versionId);
    expect(students[0]).toMatchObject({
      modified: true,
      before: expected(practical.rubric),
      after: expected(dearer),
    });
    expect(students[1]).toMatchObject({
      modified: false,
      before: scoreByOracle(practical.rubric, recorded).score,
      after: scoreByOracle(dearer, recorded).score,
    });
    expect(students[0]?.after ?? 0).toBeGreaterThan(students[1]?.after ?? 0);
  });

  test('readings of a line that the version does not ask for are left out, and the line is named', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, attempts, practical } = stage;
    const rubric = withoutLine(practical.rubric, 'divider');
    const versionId = await addVersion(stage, 2, { ...rubric, workChecks: [] });
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const { students, notAsked } = await preview(stage, versionId);
    expect(notAsked).toEqual([
      { label: 'divider', attempts: 1 },
      { label: 'name and period on pieces', attempts: 1 },
    ]);
    const recorded = await recordFromEvents(attempts[0]);
    const asked = {
      ...recorded,
      work: {},
      pieces: recorded.pieces.filter(({ lineId }) => lineId !== 'divider'),
    };
    expect(students[0]?.after).toBe(scoreByOracle({ ...rubric, workChecks: [] }, asked).score);
  });
});
