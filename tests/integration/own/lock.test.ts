import { describe, expect, test } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { readResult } from '@/lib/data/own/read-result';
import { readTask } from '@/lib/data/own/read-task';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { explainScore } from '@/lib/practicals/explain-score';
import { ownRecordOf, predictedSheet } from '@/lib/practicals/own-record';
import { receiptOf } from '@/lib/sync/receipt';
import { modifyFor, WIDER } from '../../support/accommodations';
import { value } from '../../support/answers';
import { lockPrediction, markPieces, readingsOf } from '../../support/mark-pieces';
import { outcomes, push } from '../../support/push-events';
import { eventOf, type RoundStage, sheetOf, stageRound, storedEvents } from '../../support/round-stage';

const send = (student: Actor, stage: RoundStage, events: Parameters<typeof push>[2]) =>
  outcomes(push(student, stage.sittingId, events, { deviceId: student.personId }));

const bare = { typed: null, unit: null, instrument: null } as const;

function lockEvent(
  author: Actor,
  attemptId: string,
  receipt: string,
  locked = true,
  supersedes: string[] = [],
) {
  return eventOf(author, attemptId, {
    side: 'own',
    cell: { lineId: '', ordinal: 0, what: '@lock' },
    value: { kind: 'lock', locked, receipt },
    supersedes,
    ...bare,
  });
}

describe('locking own readings', () => {
  test('waits for every size: read, spoiled, couldn’t read, or on a missing piece', async () => {
    const stage = await stageRound();
    const [ana] = stage.students;
    const [attemptId] = stage.attempts;
    const all = readingsOf(ana, attemptId, stage.practical.rubric, {}, 'own');
    const [first, second, third, ...rest] = all;
    if (!first || !second || !third) throw new Error('a rubric has sizes');
    await send(
      ana,
      stage,
      rest.filter(({ cell }) => cell.lineId !== 'divider' || cell.ordinal !== 4),
    );
    expect(await send(ana, stage, [lockEvent(ana, attemptId, 'ABCD-EFGH')])).toEqual([
      'refused: 6 sizes are neither recorded nor marked “couldn’t read”.',
    ]);
    const made = [
      { ...first, value: { kind: 'unreadable' as const }, ...bare },
      { ...second, value: { kind: 'spoiled' as const }, ...bare },
      third,
      eventOf(ana, attemptId, {
        side: 'own',
        cell: { lineId: 'divider', ordinal: 4, what: 'piece' },
        value: { kind: 'state', state: 'missing' },
        ...bare,
      }),
    ];
    expect(await send(ana, stage, made)).toEqual(['kept', 'kept', 'kept', 'kept']);
    const view = value(await readTask(ana, { sittingId: stage.sittingId }));
    const receipt = await receiptOf(attemptId, view.events);
    expect(await send(ana, stage, [lockEvent(ana, attemptId, receipt)])).toEqual(['kept']);
    expect((await sheetOf(attemptId, 'own'))?.locked_at).not.toBeNull();
  });

  test('keeps the receipt, and the page’s prediction is the server’s own', async () => {
    const stage = await stageRound();
    const [ana] = stage.students;
    const [attemptId] = stage.attempts;
    await lockPrediction(ana, stage.sittingId, attemptId, stage.practical.rubric, {
      'base/1/length': '6 7/8',
    });
    const view = value(await readTask(ana, { sittingId: stage.sittingId }));
    const record = ownRecordOf(view.events);
    expect(record.derived.lock?.receipt).toBe(await receiptOf(attemptId, view.events));
    const sheet = predictedSheet(view.rubric, record);
    expect(sheet.lost).toBe(300);
    expect(view.prediction).toEqual({
      receipt: record.derived.lock?.receipt,
      rubric: view.rubric,
      explanation: explainScore(view.rubric, sheet, 0),
    });
    expect(await sheetOf(attemptId, 'own')).toMatchObject({
      lost_points: 300,
      provisional_points: sheet.provisional,
    });
  });

  test('predicts by what prices the student: the figure and the rows that the result will have', async () => {
    const stage = await stageRound();
    const { teacher, students, sittingId, attempts, practical } = stage;
    const [ana, ben] = students;
    await modifyFor(stage, {
      modification: {
        ...WIDER,
        excused: [{ lineId: 'divider', axis: null }],
        checks: [],
      },
    });
    const short = { 'base/1/length': '6 7/8', 'divider/2/width': '2 1/16' };
    const open = value(await readTask(ana, { sittingId }));
    expect(open.prediction).toBeNull();
    for (const [index, student] of [ana, ben].entries()) {
      await lockPrediction(student, sittingId, attempts[index] ?? '', practical.rubric, short);
      await markPieces(teacher, sittingId, attempts[index] ?? '', practical.rubric);
    }
    const seen = value(await previewPublication(teacher, { sittingId })).seen;
    const before = value(await readTask(ana, { sittingId }));
    value(await publishSitting(teacher, { sittingId, seen, withoutUnread: false, lateLocks: 'count' }));
    const result = value(await readResult(ana, { sittingId }));
    if (!result.ownSheet || !before.prediction) throw new Error('a locked attempt is predicted');
    expect(before.prediction.explanation).toEqual(explainScore(result.rubric, result.ownSheet, 0));
    expect(before.prediction.explanation.score).toBe(result.predicted);
    expect(before.prediction.rubric).toEqual(result.rubric);
    // What the task tells of prices beforehand is the sitting's, whoever looks.
    expect(before.rubric).toEqual(practical.rubric);

    const other = value(await readTask(ben, { sittingId }));
    expect(other.prediction?.rubric).toEqual(practical.rubric);
    expect(other.prediction?.explanation.score).toBeLessThan(result.predicted ?? 0);
    expect(JSON.stringify(before)).not.toMatch(/modif|accommod|excus/i);
  });

  test('with a receipt of other readings is refused, and loses nothing', async () => {
    const stage = await stageRound();
    const [ana] = stage.students;
    const [attemptId] = stage.attempts;
    await send(ana, stage, readingsOf(ana, attemptId, stage.practical.rubric, {}, 'own'));
    expect(await send(ana, stage, [lockEvent(ana, attemptId, 'ABCD-EFGH')])).toEqual([
      expect.stringMatching(/^refused: The receipt does not fit the readings that arrived. Nothing was lost/),
    ]);
    expect(value(await readTask(ana, { sittingId: stage.sittingId })).events).toHaveLength(27);
  });

  test('ends every change; the teacher reopens it before the first bench reading, and not after', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, practical } = stage;
    const [ana] = stage.students;
    const [attemptId] = stage.attempts;
    await lockPrediction(ana, sittingId, attemptId, practical.rubric);
    const again = () => eventOf(ana, attemptId, { side: 'own' });
    expect(await send(ana, stage, [again()])).toEqual([
      'refused: This is locked: ask your teacher to reopen it.',
    ]);

    const lock = value(await readTask(ana, { sittingId })).events.find(
      ({ value: { kind } }) => kind === 'lock',
    );
    if (lock?.value.kind !== 'lock') throw new Error('there is no lock');
    const { receipt } = lock.value;
    const reopen = () => lockEvent(teacher, attemptId, receipt, false, [lock.id]);
    expect(await send(ana, stage, [lockEvent(ana, attemptId, receipt, false, [lock.id])])).toEqual([
      expect.stringMatching(/^refused/),
    ]);
    expect(await outcomes(push(teacher, sittingId, [reopen()]))).toEqual(['kept']);
    const view = value(await readTask(ana, { sittingId }));
    expect(view.stage).toBe('to do');
    const relock = lockEvent(
      ana,
      attemptId,
      receipt,
      true,
      ownRecordOf(view.events)
        .cells.get('/0/@lock')
        ?.heads.map(({ id }) => id),
    );
    expect(await send(ana, stage, [relock])).toEqual(['kept']);

    await outcomes(push(teacher, sittingId, [eventOf(teacher, attemptId)]));
    expect(await outcomes(push(teacher, sittingId, [{ ...reopen(), supersedes: [relock.id] }]))).toEqual([
      'refused: The bench has begun on these pieces: the lock stays.',
    ]);
  });

  test('after the first bench reading without a receipt taken is kept and marked as late', async () => {
    const stage = await stageRound();
    const { teacher, sittingId, practical } = stage;
    const [ana] = stage.students;
    const [attemptId] = stage.attempts;
    await outcomes(push(teacher, sittingId, [eventOf(teacher, attemptId)]));
    await lockPrediction(ana, sittingId, attemptId, practical.rubric);
    const flags = (await storedEvents(attemptId)).flatMap((event) => event.flags);
    expect(flags).toEqual(['late-lock']);
  });
});
