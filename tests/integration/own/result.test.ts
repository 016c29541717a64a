import { beforeAll, describe, expect, test } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { listTasks } from '@/lib/data/own/list-tasks';
import { readResult } from '@/lib/data/own/read-result';
import { readTask } from '@/lib/data/own/read-task';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { startRedo } from '@/lib/data/sittings/start-redo';
import { explainScore } from '@/lib/practicals/explain-score';
import { code, value } from '../../support/answers';
import { lockPrediction, markPieces } from '../../support/mark-pieces';
import { outcomes, push } from '../../support/push-events';
import { eventOf, type RoundStage, stageRound } from '../../support/round-stage';
import { ticksOf } from '../../support/rubrics';

const OF_ANA = { 'base/1/length': '6.91234' };
const OF_BEN = { 'base/1/length': '6.95432' };

async function publish({ teacher, sittingId }: RoundStage) {
  const { seen } = value(await previewPublication(teacher, { sittingId }));
  return value(await publishSitting(teacher, { sittingId, seen, withoutUnread: true, lateLocks: 'count' }));
}

let stage: RoundStage;
let ana: Actor;
let ben: Actor;

beforeAll(async () => {
  stage = await stageRound();
  [ana, ben] = stage.students;
  const { teacher, sittingId, attempts, practical } = stage;
  await lockPrediction(ana, sittingId, attempts[0], practical.rubric, OF_ANA);
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, OF_ANA);
  await markPieces(teacher, sittingId, attempts[1], practical.rubric, OF_BEN);
  await publish(stage);
});

describe('a published result', () => {
  test('is the own one: score, prediction and its judgement, and rows that add up to it', async () => {
    const result = value(await readResult(ana, { sittingId: stage.sittingId }));
    expect(result).toMatchObject({ status: 'scored', corrected: false, judgement: { because: 'full' } });
    if (!result.sheet) throw new Error('a scored result has its sheet');
    const explained = explainScore(result.rubric, result.sheet, result.bonus);
    expect(explained.kept.ofTotal + explained.bonus + explained.rest).toBe(result.score);
    expect(explained.rows).toEqual([
      expect.objectContaining({ lineId: 'base', what: 'length', points: 200 }),
    ]);
    expect(result.predicted).toBe(9800);
  });

  test('holds nothing of a classmate', async () => {
    const told = JSON.stringify([
      await readResult(ana, { sittingId: stage.sittingId }),
      await readTask(ana, { sittingId: stage.sittingId }),
      await listTasks(ana, {}),
    ]);
    expect(told).toContain(String(ticksOf(OF_ANA['base/1/length'])));
    for (const trace of [String(ticksOf(OF_BEN['base/1/length'])), ben.personId, stage.attempts[1]]) {
      expect(told).not.toContain(trace);
    }
  });

  test('closes the own readings', async () => {
    const event = eventOf(ben, stage.attempts[1], { side: 'own' });
    expect(await outcomes(push(ben, stage.sittingId, [event], { deviceId: ben.personId }))).toEqual([
      'refused: The results are out: own readings are closed.',
    ]);
    expect(value(await readTask(ben, { sittingId: stage.sittingId })).stage).toBe('published');
  });

  test('without own readings has no prediction and no judgement', async () => {
    expect(value(await readResult(ben, { sittingId: stage.sittingId }))).toMatchObject({
      status: 'scored',
      predicted: null,
      ownSheet: null,
      judgement: null,
      bonus: 0,
    });
  });
});

describe('results that are no measured score', () => {
  test.each([
    ['absent', null],
    ['excused', null],
    ['zero', 0],
  ] as const)('%s is told as such', async (standing, score) => {
    const other = await stageRound();
    const { teacher, sittingId, attempts } = other;
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing }));
    await publish(other);
    expect(value(await readResult(other.students[0], { sittingId }))).toMatchObject({
      status: standing,
      score,
    });
    expect(value(await readResult(other.students[1], { sittingId }))).toMatchObject({
      status: 'not read',
      score: null,
    });
  });

  test('before publication a standing is nobody’s to see', async () => {
    const { teacher, sittingId, attempts, students } = await stageRound();
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'zero' }));
    const told = JSON.stringify([
      await listTasks(students[0], {}),
      await readTask(students[0], { sittingId }),
    ]);
    expect(told).not.toMatch(/zero|standing/);
    expect(code(await readResult(students[0], { sittingId }))).toBe('not_found');
  });
});

describe('after the first publication', () => {
  test('a correction is told as one, and what it says counts', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical, students } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    await publish(other);
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      score: 10_000,
      corrected: false,
    });
    value(await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'excused' }));
    await publish(other);
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      status: 'excused',
      score: null,
      corrected: true,
    });
  });

  test('a redo leaves the result where it was, and the list tells of the open attempt', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical, students } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, OF_BEN);
    await publish(other);
    value(await startRedo(teacher, { sittingId, studentId: students[0].personId }));
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      attemptNumber: 1,
      status: 'scored',
    });
    expect(value(await listTasks(students[0], {}))).toEqual([
      expect.objectContaining({ stage: 'published', attemptNumber: 2, redo: true }),
    ]);
  });
});
