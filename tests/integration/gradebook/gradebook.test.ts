import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { explanationSchema, gradebookSchema } from '@/lib/contracts/gradebook';
import { explainCell } from '@/lib/data/gradebook/explain-cell';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { startRedo } from '@/lib/data/sittings/start-redo';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { markPieces } from '@/tests/support/mark-pieces';
import { push } from '@/tests/support/push-events';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor } from '@/tests/support/school';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };

async function publish({ teacher, sittingId }: RoundStage, withoutUnread = false) {
  const { seen } = value(await previewPublication(teacher, { sittingId }));
  return value(await publishSitting(teacher, { sittingId, withoutUnread, seen }));
}

const bookOf = async ({ teacher, sectionId }: RoundStage) =>
  value(await readGradebook(teacher, { sectionId }));

let stage: RoundStage;
let head: Actor;

beforeAll(async () => {
  stage = await stageRound();
  head = await makeActor(stage.school, 'head');
});

describe('readGradebook', () => {
  it('shows numbers of what is being recorded as unpublished, and words where there is none', async () => {
    const round = await stageRound();
    const { teacher, sittingId, attempts, practical } = round;
    const before = await bookOf(round);
    expect(before.students.map(({ cells }) => cells[0]?.status)).toEqual(['not read', 'not read']);
    await push(teacher, sittingId, [eventOf(teacher, attempts[1])]);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const book = await bookOf(round);
    expect(gradebookSchema.parse(book)).toEqual(book);
    expect(book.sittings).toMatchObject([{ title: 'Nine parts', open: true, publication: null }]);
    const [ana, ben] = book.students;
    // 1/16 under is 1, 3/32 under is 2, 1/16 over is 1: 4 of 81 points.
    expect(ana?.cells[0]).toMatchObject({
      published: false,
      status: 'scored',
      score: 9500,
      lost: { under: 300, over: 100, dearestUnder: 200, dearestOver: 100 },
    });
    expect(ben?.cells[0]).toMatchObject({ published: false, status: 'reading' });
    expect([ana?.mean, ben?.mean]).toEqual([null, null]);
  });

  it('shows what was published, its mean with zeros counted, and what has changed since', async () => {
    const round = await stageRound();
    const { teacher, sittingId, attempts, practical } = round;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'zero' });
    await publish(round);
    const book = await bookOf(round);
    expect(
      book.students.map(({ cells, mean }) => [cells[0]?.status, cells[0]?.score, cells[0]?.published, mean]),
    ).toEqual([
      ['scored', 9500, true, 950],
      ['zero', 0, true, 0],
    ]);
    expect(book.sittings[0]?.publication).toMatchObject({ number: 1, changedSince: 0 });
    await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'excused' });
    const after = await bookOf(round);
    expect(after.students[1]?.cells[0]).toMatchObject({ status: 'zero', score: 0, changed: true });
    expect(after.sittings[0]?.publication).toMatchObject({ number: 1, changedSince: 1 });
    await publish(round);
    expect((await bookOf(round)).students[1]).toMatchObject({
      mean: null,
      cells: [{ status: 'excused', score: null }],
    });
  });

  it('counts a redo by the rubric’s rule', async () => {
    const round = await stageRound();
    const { teacher, sittingId, attempts, practical, students } = round;
    const missing = Object.fromEntries(
      practical.rubric.lines.flatMap((line) =>
        Array.from({ length: line.quantity }, (_, index) => [
          `${line.id}/${index + 1}/width`,
          line.id === 'base' || line.id === 'end' ? '3 5/8' : '2 1/8',
        ]),
      ),
    );
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, missing);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric);
    await publish(round);
    // Nine widths at 3 points of 81: 67.
    expect((await bookOf(round)).students[0]?.cells[0]).toMatchObject({ score: 6700, attemptNumber: 1 });
    value(await startRedo(teacher, { sittingId, studentId: students[0].personId }));
    const [redo] = await ownerSql()<
      { id: string }[]
    >`select id from attempts where sitting_id = ${sittingId} and number = 2`;
    await markPieces(teacher, sittingId, redo?.id ?? '', practical.rubric);
    expect((await bookOf(round)).students[0]?.cells[0]).toMatchObject({ score: 6700, changed: true });
    await publish(round);
    expect((await bookOf(round)).students[0]?.cells[0]).toMatchObject({
      score: 9000,
      attemptNumber: 2,
      attemptId: redo?.id,
    });
    const explained = value(await explainCell(teacher, { sectionId: round.sectionId, attemptId: redo?.id }));
    expect(explained).toMatchObject({
      score: 10_000,
      counted: 9000,
      redo: 'the higher counts; a redo is worth at most 90%',
      attempts: [
        { number: 1, score: 6700 },
        { number: 2, score: 10_000 },
      ],
    });
  });

  it('says which readings a tablet still holds', async () => {
    const round = await stageRound();
    const { teacher, sittingId, attempts } = round;
    const cell = (ordinal: number) => ({ lineId: 'divider', ordinal, what: 'length' });
    const deviceId = '3f1f7f7e-6f0e-4a58-9d0c-0a5a6cfa0002';
    await push(
      teacher,
      sittingId,
      [1, 2, 5].map((sequence, at) => eventOf(teacher, attempts[0], { sequence, cell: cell(at + 1) })),
      { deviceId },
    );
    const book = await bookOf(round);
    expect(book.sittings[0]?.notArrived).toBe(2);
    expect(book.students[0]?.cells[0]?.notArrived).toBe(2);
  });

  it('is for the own teacher and the head of the department, and every look is logged once an hour', async () => {
    const { teacher, sectionId, school, aide, students } = stage;
    expect(value(await readGradebook(teacher, { sectionId })).may).toEqual({ export: true, change: true });
    value(await readGradebook(teacher, { sectionId }));
    expect(value(await readGradebook(head, { sectionId })).may).toEqual({ export: false, change: false });
    const looks = (await logOf(school)).filter(({ action }) => action === 'gradebook.read');
    expect(looks.map(({ actor_id }) => actor_id)).toEqual([teacher.personId, head.personId]);
    expect(code(await readGradebook(aide, { sectionId }))).toBe('forbidden');
    expect(code(await readGradebook(students[0], { sectionId }))).toBe('forbidden');
    expect(code(await readGradebook(await makeActor(school, 'teacher'), { sectionId }))).toBe('not_found');
    expect(code(await readGradebook({ ...head, departmentId: null }, { sectionId }))).toBe('not_found');
    expect(code(await readGradebook(teacher, { sectionId: 'x' }))).toBe('invalid');
  });
});

describe('explainCell', () => {
  it('explains every lost point, and logs whose record was looked at', async () => {
    const round = await stageRound();
    const { teacher, sittingId, attempts, practical, sectionId, school, students } = round;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const explained = value(await explainCell(teacher, { sectionId, attemptId: attempts[0] }));
    expect(explanationSchema.parse(explained)).toEqual(explained);
    expect(explained).toMatchObject({
      published: false,
      status: 'scored',
      score: 9500,
      lost: { points: 400, ofTotal: 494 },
    });
    expect(explained.rows.map(({ piece, what, points }) => [piece, what, points])).toEqual([
      ['base', 'length', 100],
      ['end 1', 'length', 200],
      ['divider 2', 'width', 100],
    ]);
    expect((await logOf(school)).at(-1)).toMatchObject({
      action: 'gradebook.read',
      about_person_id: students[0].personId,
    });
  });

  it('shows nothing of another section', async () => {
    const other = await stageRound();
    const { teacher, sectionId } = stage;
    expect(code(await explainCell(teacher, { sectionId, attemptId: other.attempts[0] }))).toBe('not_found');
    expect(
      code(await explainCell(teacher, { sectionId: other.sectionId, attemptId: other.attempts[0] })),
    ).toBe('not_found');
  });
});
