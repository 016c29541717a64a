import { describe, expect, test } from 'vitest';
import { explainCell } from '@/lib/data/gradebook/explain-cell';
import { exportGrades, exportSizes } from '@/lib/data/gradebook/export-files';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { listTasks } from '@/lib/data/own/list-tasks';
import { readResult } from '@/lib/data/own/read-result';
import { readTask } from '@/lib/data/own/read-task';
import { undoMove } from '@/lib/data/sittings/undo-move';
import { explainScore } from '@/lib/practicals/explain-score';
import { modifyRubric } from '@/lib/scoring/modification';
import { modifyFor, WIDER } from '@/tests/support/accommodations';
import { value } from '@/tests/support/answers';
import { lockPrediction, markPieces } from '@/tests/support/mark-pieces';
import { addVersion, dearer, latestMove, move, publish } from '@/tests/support/moves';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/length': '3 3/8' };

/** The first loses points, the second none. */
async function readClass(): Promise<RoundStage> {
  const stage = await stageRound();
  const { teacher, sittingId, attempts, practical } = stage;
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[1], practical.rubric);
  return stage;
}

describe('after a move, a student is told', () => {
  test('only of an own score that changed, with the one before', async () => {
    const stage = await readClass();
    const { students, sittingId } = stage;
    await publish(stage);
    const first = value(await readResult(students[0], { sittingId }));
    expect(first).toMatchObject({ corrected: false, before: null });
    expect(value(await listTasks(students[0], {}))).toMatchObject([{ scoreChanged: false }]);

    value(await move(stage, await addVersion(stage, 2, dearer)));
    expect(value(await readResult(students[0], { sittingId }))).toEqual(first);
    await publish(stage);
    expect(value(await readResult(students[0], { sittingId }))).toMatchObject({
      versionNumber: 2,
      corrected: true,
      before: { score: first.score, total: first.total },
    });
    expect(value(await listTasks(students[0], {}))).toMatchObject([{ scoreChanged: true }]);
    expect(value(await readResult(students[1], { sittingId }))).toMatchObject({
      versionNumber: 2,
      score: 10_000,
      corrected: false,
      before: null,
    });
    expect(value(await listTasks(students[1], {}))).toMatchObject([{ scoreChanged: false }]);
  });

  test('nothing by the task either: its prices and the prediction stay those that were told', async () => {
    const stage = await stageRound();
    const { teacher, students, sittingId, attempts, practical } = stage;
    await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric);
    await publish(stage);
    const before = value(await readTask(students[0], { sittingId }));
    value(await move(stage, await addVersion(stage, 2, dearer)));
    expect(value(await readTask(students[0], { sittingId }))).toEqual(before);
    const { predicted } = value(await readResult(students[0], { sittingId }));
    expect(before).toMatchObject({ versionNumber: 1, prediction: { explanation: { score: predicted } } });
    await publish(stage);
    const after = value(await readTask(students[0], { sittingId }));
    expect(after.versionNumber).toBe(2);
    expect(after.prediction?.explanation.score).toBeLessThan(Number(predicted));
  });

  test('nothing when nobody was to drop and nobody gained', async () => {
    const stage = await readClass();
    const { students, sittingId } = stage;
    await publish(stage);
    value(await move(stage, await addVersion(stage, 2, dearer), { holdHarmless: true }));
    await publish(stage);
    for (const student of students) {
      expect(value(await readResult(student, { sittingId }))).toMatchObject({
        corrected: false,
        before: null,
      });
    }
  });
});

describe('where points went', () => {
  test('what is held is told apart, and the rows still add up to the score', async () => {
    const stage = await readClass();
    const { teacher, students, sectionId, sittingId, attempts } = stage;
    value(await move(stage, await addVersion(stage, 2, dearer), { holdHarmless: true }));
    const cell = { sectionId, attemptId: attempts[0] };
    const recorded = value(await explainCell(teacher, cell));
    await publish(stage);
    const published = value(await explainCell(teacher, cell));
    for (const explained of [recorded, published]) {
      const { rows, lost, kept, bonus, held, rest, score, possible, total, floorGives } = explained;
      expect(held).toMatchObject({ versionNumber: 1 });
      expect(held?.points).toBeGreaterThan(0);
      expect(rows.reduce((sum, { points }) => sum + points, 0)).toBe(lost.points);
      expect(rows.reduce((sum, { ofTotal }) => sum + ofTotal, 0)).toBe(lost.ofTotal);
      expect(possible - lost.points + floorGives).toBe(kept.points);
      expect(total - lost.ofTotal).toBe(kept.ofTotal);
      expect(kept.ofTotal + bonus + (held?.points ?? 0) + rest).toBe(score);
    }
    expect(published).toMatchObject({ published: true, versionNumber: 2, modified: false });
    const told = value(await readResult(students[0], { sittingId }));
    if (!told.sheet) throw new Error('a scored result has its sheet');
    const own = explainScore(told.rubric, told.sheet, told.bonus, told.held?.points);
    expect(own.score).toBe(told.score);
    expect(own.kept.ofTotal + own.bonus + own.held + own.rest).toBe(told.score);
    const free = value(await explainCell(teacher, { sectionId, attemptId: attempts[1] }));
    expect(free.held).toBeNull();
  });

  test('the gradebook says what is held now and was not when the results went out', async () => {
    const stage = await readClass();
    const { teacher, sectionId, practical } = stage;
    const second = await addVersion(stage, 2, dearer);
    value(await move(stage, second));
    await publish(stage);
    value(await move(stage, practical.versionId, { holdHarmless: true }));
    value(await move(stage, second, { holdHarmless: true }));
    const { sittings, students } = value(await readGradebook(teacher, { sectionId }));
    expect(sittings[0]?.publication?.changedSince).toBe(1);
    expect(students.map(({ cells }) => cells[0]?.changed)).toEqual([true, false]);
  });

  test('the gradebook says what a move changed of what is out, and not after it was taken back', async () => {
    const stage = await readClass();
    const { teacher, sectionId, sittingId } = stage;
    const changed = async () => {
      const { sittings, students } = value(await readGradebook(teacher, { sectionId }));
      return [sittings[0]?.publication?.changedSince, ...students.map(({ cells }) => cells[0]?.changed)];
    };
    await publish(stage);
    value(await move(stage, await addVersion(stage, 2, dearer), { holdHarmless: true }));
    expect(await changed()).toEqual([1, true, false]);
    value(await undoMove(teacher, { sittingId, moveId: await latestMove(stage) }));
    expect(await changed()).toEqual([0, false, false]);
    value(await move(stage, await addVersion(stage, 3, { ...dearer, ceiling: 101 }), { holdHarmless: true }));
    await publish(stage);
    expect(await changed()).toEqual([0, false, false]);
    // The same prices, but what was held is held no longer.
    value(await move(stage, await addVersion(stage, 4, { ...dearer, ceiling: 101 })));
    expect(await changed()).toEqual([1, true, false]);
  });
});

describe('a modified rubric', () => {
  const modification = { ...WIDER, excused: [{ lineId: 'end', axis: null }] };

  test('prices both sides of its student alone, and is named with the result', async () => {
    const stage = await stageRound();
    const { teacher, students, sectionId, sittingId, attempts, practical } = stage;
    await modifyFor(stage, { modification });
    for (const at of [0, 1] as const) {
      await lockPrediction(students[at], sittingId, attempts[at], practical.rubric, SHORT);
      await markPieces(teacher, sittingId, attempts[at], practical.rubric, SHORT);
    }
    await publish(stage);
    const [with_, without] = await Promise.all(students.map((student) => readResult(student, { sittingId })));
    const first = value(with_ ?? { ok: false, problem: { code: 'not_found', message: '' } });
    const second = value(without ?? { ok: false, problem: { code: 'not_found', message: '' } });
    expect(first.rubric).toEqual(modifyRubric(practical.rubric, modification));
    expect(second.rubric).toEqual(practical.rubric);
    expect(first.total).toBe(second.total);
    expect(first.score ?? 0).toBeGreaterThan(second.score ?? 0);
    expect(first.predicted ?? 0).toBeGreaterThan(second.predicted ?? 0);
    expect(JSON.stringify(first)).not.toMatch(/modif|accommodat/i);
    const cell = (attemptId: string) => explainCell(teacher, { sectionId, attemptId });
    expect(value(await cell(attempts[0]))).toMatchObject({ modified: true, score: first.score });
    expect(value(await cell(attempts[1]))).toMatchObject({ modified: false, score: second.score });
  });

  test('leaves the files of sizes as they would be without it, and only the final score in that of grades', async () => {
    const stage = await readClass();
    const { teacher, sectionId, attempts, sittingId, practical } = stage;
    await publish(stage);
    const sizes = async () => value(await exportSizes(teacher, { sectionId })).text;
    const grades = async () => value(await exportGrades(teacher, { sectionId })).text;
    const before = { sizes: await sizes(), grades: await grades() };
    await modifyFor(stage, { modification });
    await publish(stage);
    expect(await sizes()).toBe(before.sizes);
    const after = await grades();
    expect(after).not.toBe(before.grades);
    expect(after.split('\n').length).toBe(before.grades.split('\n').length);
    // What is recorded later is in no file before it is published.
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    expect(await sizes()).toBe(before.sizes);
  });
});
