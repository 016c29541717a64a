import { beforeAll, describe, expect, test } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { listTasks } from '@/lib/data/own/list-tasks';
import { readResult } from '@/lib/data/own/read-result';
import { readTask } from '@/lib/data/own/read-task';
import { readInHand } from '@/lib/data/rounds/read-in-hand';
import { readRound } from '@/lib/data/rounds/read-round';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { readSitting } from '@/lib/data/sittings/read-sitting';
import { code, value } from '../../support/answers';
import { lockPrediction, markPieces, readingsOf } from '../../support/mark-pieces';
import { outcomes, push } from '../../support/push-events';
import { eventOf, type RoundStage, stageRound } from '../../support/round-stage';
import { ticksOf } from '../../support/rubrics';
import { makeActor, makeSection } from '../../support/school';

/** Readings that occur nowhere else: if one of these numbers is in an answer, it leaked. */
const OF_THE_BENCH = { 'base/1/length': '6.98765' };
const OF_ANA = { 'base/1/length': '6.91234' };
const OF_BEN = { 'base/1/length': '6.95432' };

const marksOf = (misses: Record<string, string>) =>
  Object.values(misses).flatMap((text) => [text, String(ticksOf(text))]);

let stage: RoundStage;
let ana: Actor;
let ben: Actor;

beforeAll(async () => {
  stage = await stageRound();
  [ana, ben] = stage.students;
  const { teacher, sittingId, attempts, practical } = stage;
  await lockPrediction(ana, sittingId, attempts[0], practical.rubric, OF_ANA);
  await outcomes(
    push(ben, sittingId, readingsOf(ben, attempts[1], practical.rubric, OF_BEN, 'own').slice(0, 5), {
      deviceId: ben.personId,
    }),
  );
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, OF_THE_BENCH);
});

describe('the practicals of a student', () => {
  test('are those of the own sections, each at its stage and with how far the measuring is', async () => {
    expect(value(await listTasks(ana, {}))).toEqual([
      expect.objectContaining({ sittingId: stage.sittingId, stage: 'locked', sizes: { of: 27, done: 27 } }),
    ]);
    expect(value(await listTasks(ben, {}))).toEqual([
      expect.objectContaining({
        sittingId: stage.sittingId,
        stage: 'to do',
        sizes: { of: 27, done: 5 },
        redo: false,
      }),
    ]);
    const newcomer = await makeActor(stage.school, 'student');
    await makeSection(stage.school, { studentIds: [newcomer.personId] });
    expect(value(await listTasks(newcomer, {}))).toEqual([]);
  });

  test.each(['teacher', 'head', 'aide', 'admin'] as const)('are nothing for a %s', async (role) => {
    const actor = await makeActor(stage.school, role);
    expect(code(await listTasks(actor, {}))).toBe('forbidden');
    expect(code(await readTask(actor, { sittingId: stage.sittingId }))).toBe('forbidden');
    expect(code(await readResult(actor, { sittingId: stage.sittingId }))).toBe('forbidden');
  });

  test('need a sign-in and a whole address', async () => {
    expect(code(await readTask(null, { sittingId: stage.sittingId }))).toBe('unauthenticated');
    expect(code(await readTask(ana, { sittingId: 'bench' }))).toBe('invalid');
  });
});

describe('what reaches a student before publication', () => {
  test('is the task with its prices and the own readings, locked or not', async () => {
    const view = value(await readTask(ana, { sittingId: stage.sittingId }));
    expect(view).toMatchObject({ stage: 'locked', attemptId: stage.attempts[0], studentId: ana.personId });
    expect(view.task).toEqual(stage.practical.task);
    expect(view.rubric).toEqual(stage.practical.rubric);
    expect(view.events).toHaveLength(28);
    expect(
      view.events.every(({ side, attemptId }) => side === 'own' && attemptId === stage.attempts[0]),
    ).toBe(true);
  });

  test('holds no reading and no score of the bench, no standing, and nothing of another student', async () => {
    const { prediction, ...task } = value(await readTask(ana, { sittingId: stage.sittingId }));
    const answers = [
      await listTasks(ana, {}),
      task,
      await readResult(ana, { sittingId: stage.sittingId }),
    ].map((answer) => JSON.stringify(answer));
    // What the own readings come to is the student's own; it is looked through for the others' marks alone.
    expect(prediction?.explanation.lost.points).toBe(200);
    for (const mark of [...marksOf(OF_THE_BENCH), ...marksOf(OF_BEN)]) {
      expect(JSON.stringify(prediction)).not.toContain(mark);
    }
    for (const answer of answers) {
      for (const mark of [...marksOf(OF_THE_BENCH), ...marksOf(OF_BEN)]) expect(answer).not.toContain(mark);
      expect(answer).not.toContain('"bench"');
      expect(answer).not.toMatch(/"(score|scorePoints|provisional|lost|standing|finished|sheet)":/);
      expect(answer).not.toContain(stage.attempts[1]);
      expect(answer).not.toContain(ben.personId);
    }
    // The marks would be found if they were there.
    expect(answers.join()).toContain(marksOf(OF_ANA)[1]);
  });

  test('a result is not found, even where the bench has finished', async () => {
    expect(code(await readResult(ana, { sittingId: stage.sittingId }))).toBe('not_found');
  });
});

describe('somebody else’s practical', () => {
  test('is not found from another section and from another school', async () => {
    const other = await stageRound();
    const neighbour = await makeActor(stage.school, 'student');
    await makeSection(stage.school, { studentIds: [neighbour.personId] });
    for (const actor of [neighbour, other.students[0]]) {
      expect(code(await readTask(actor, { sittingId: stage.sittingId }))).toBe('not_found');
      expect(code(await readResult(actor, { sittingId: stage.sittingId }))).toBe('not_found');
    }
  });

  test('takes no reading from a classmate, a neighbour or another school', async () => {
    const { sittingId, attempts } = stage;
    const own = { side: 'own' as const };
    expect(
      await outcomes(push(ben, sittingId, [eventOf(ben, attempts[0], own)], { deviceId: ben.personId })),
    ).toEqual([expect.stringMatching(/^refused: .*not yours to record/)]);
    const other = await stageRound();
    const [stranger] = other.students;
    expect(code(await push(stranger, sittingId, [eventOf(stranger, attempts[0], own)]))).toBe('not_found');
    expect(
      await outcomes(
        push(stranger, other.sittingId, [eventOf(stranger, attempts[0], own)], {
          deviceId: stranger.personId,
        }),
      ),
    ).toEqual([expect.stringMatching(/^refused/)]);
  });

  test('takes no bench reading from a student', async () => {
    const event = eventOf(ben, stage.attempts[1]);
    expect(await outcomes(push(ben, stage.sittingId, [event], { deviceId: ben.personId }))).toEqual([
      'refused: The bench is recorded by staff.',
    ]);
  });

  test('is not to be had by the verbs of staff either', async () => {
    const { sittingId, sectionId } = stage;
    expect(code(await readRound(ana, { sittingId }))).toBe('forbidden');
    expect(code(await readInHand(ana, { sittingId, deviceId: ana.personId }))).toBe('forbidden');
    expect(code(await readSitting(ana, { sittingId }))).toBe('forbidden');
    expect(code(await previewPublication(ana, { sittingId }))).toBe('forbidden');
    expect(code(await readGradebook(ana, { sectionId }))).toBe('forbidden');
  });
});
