import { describe, expect, test } from 'vitest';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { undoMove } from '@/lib/data/sittings/undo-move';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { makePractical } from '@/tests/support/factories';
import { markPieces } from '@/tests/support/mark-pieces';
import { addVersion, dearer, latestMove, move, publish, standOf, withoutLine } from '@/tests/support/moves';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, whileLogFails } from '@/tests/support/school';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32' };

async function moved(holdHarmless = true): Promise<RoundStage & { versionId: string }> {
  const stage = await stageRound();
  const { teacher, sittingId, attempts, practical } = stage;
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  const versionId = await addVersion(stage, 2, dearer);
  value(await move(stage, versionId, { holdHarmless }));
  return { ...stage, versionId };
}

const undo = (stage: RoundStage, moveId: string, by = stage.teacher) =>
  undoMove(by, { sittingId: stage.sittingId, moveId });

describe('taking a move back', () => {
  test('restores version and sheets exactly, keeps the move on record, and is logged', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, attempts, practical, school } = stage;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const before = await standOf(stage);
    value(await move(stage, await addVersion(stage, 2, dearer)));
    expect((await standOf(stage)).sheets).not.toEqual(before.sheets);
    const moveId = await latestMove(stage);
    expect(value(await undo(stage, moveId))).toEqual({
      sittingId,
      sectionId: stage.sectionId,
      versionNumber: 1,
      attempts: 2,
    });
    expect(await standOf(stage)).toEqual({ ...before, moves: 1, undone: 1, log: 2 });
    expect((await logOf(school)).at(-1)).toMatchObject({
      action: 'sitting.move',
      actor_id: teacher.personId,
      details: { undone: moveId, from: 2, to: 1 },
    });
    expect(code(await undo(stage, moveId))).toBe('conflict');
  });

  test('goes one by one, the latest first', async () => {
    const stage = await moved();
    const first = await latestMove(stage);
    value(await move(stage, await addVersion(stage, 3, withoutLine(dearer, 'side'))));
    const second = await latestMove(stage);
    expect(code(await undo(stage, first))).toBe('conflict');
    expect(value(await undo(stage, second))).toMatchObject({ versionNumber: 2 });
    expect(value(await undo(stage, first))).toMatchObject({ versionNumber: 1 });
    expect(await standOf(stage)).toMatchObject({ number: 1, moves: 2, undone: 2 });
  });

  test('ends with the next publication, but a move made after one can be taken back', async () => {
    const stage = await moved();
    await publish(stage);
    const stand = await standOf(stage);
    expect(await undo(stage, await latestMove(stage))).toMatchObject({
      ok: false,
      problem: { code: 'conflict', message: expect.stringContaining('published') },
    });
    expect(await standOf(stage)).toEqual(stand);
    value(await move(stage, stage.practical.versionId));
    expect(value(await undo(stage, await latestMove(stage)))).toMatchObject({ versionNumber: 2 });
  });

  test('is the section’s own teachers’ alone', async () => {
    const stage = await moved();
    const { school, aide, students } = stage;
    const moveId = await latestMove(stage);
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'head'),
      await makeActor(school, 'admin'),
    ]) {
      expect(code(await undo(stage, moveId, actor))).toBe('forbidden');
    }
    expect(code(await undo(stage, moveId, await makeActor(school, 'teacher')))).toBe('not_found');
    const other = await moved();
    expect(code(await undo(stage, moveId, other.teacher))).toBe('not_found');
    expect(code(await undo(stage, await latestMove(other)))).toBe('conflict');
    expect(fieldsOf(await undo(stage, 'the last'))).toEqual(['moveId']);
    expect(await standOf(stage)).toMatchObject({ number: 2, undone: 0 });
  });

  test('leaves all as it was when its last write fails', async () => {
    const stage = await moved();
    const stand = await standOf(stage);
    const moveId = await latestMove(stage);
    expect(await whileLogFails(() => undo(stage, moveId))).toBeInstanceOf(Error);
    expect(await standOf(stage)).toEqual(stand);
    expect(value(await undo(stage, moveId))).toMatchObject({ versionNumber: 1 });
  });
});

describe('where a sitting can go', () => {
  test('are the practical’s other versions, each with what it changes, and the way it came', async () => {
    const stage = await moved();
    const { teacher, sittingId, sectionId, practical, versionId } = stage;
    await addVersion(stage, 3, dearer);
    await makePractical(stage.school, teacher.personId);
    const choices = value(await readMoveChoices(teacher, { sittingId }));
    expect(choices).toMatchObject({
      sittingId,
      sectionId,
      title: practical.task.title,
      unit: 'in',
      published: false,
      version: { versionId, number: 2 },
      moves: [
        {
          number: 1,
          from: 1,
          to: 2,
          holdHarmless: true,
          movedBy: 'Dayo Okonjo',
          undone: null,
          canUndo: true,
        },
      ],
    });
    expect(choices.others.map(({ number }) => number)).toEqual([3, 1]);
    expect(choices.others[0]?.changes).toEqual([]);
    expect(JSON.stringify(choices.others[1]?.changes)).toMatch(/Version 1 takes .* less than version 2/);
    await publish(stage);
    const later = value(await readMoveChoices(teacher, { sittingId }));
    expect(later).toMatchObject({ published: true, moves: [{ canUndo: false }] });
    value(await move(stage, practical.versionId));
    value(await undo(stage, await latestMove(stage)));
    expect(value(await readMoveChoices(teacher, { sittingId })).moves).toMatchObject([
      { number: 2, undone: { by: 'Dayo Okonjo' }, canUndo: false },
      { number: 1, undone: null, canUndo: false },
    ]);
  });

  test('are shown to the section’s own teachers alone', async () => {
    const { school, aide, students, sittingId } = await moved();
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'head'),
      await makeActor(school, 'admin'),
    ]) {
      expect(code(await readMoveChoices(actor, { sittingId }))).toBe('forbidden');
    }
    expect(code(await readMoveChoices(await makeActor(school, 'teacher'), { sittingId }))).toBe('not_found');
    expect(code(await readMoveChoices(null, { sittingId }))).toBe('unauthenticated');
  });
});
