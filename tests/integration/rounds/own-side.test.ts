import { beforeEach, describe, expect, test } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { AXES } from '@/lib/scoring';
import type { ReadingEvent } from '@/lib/sync/protocol';
import { receiptOf } from '@/lib/sync/receipt';
import { ownerSql } from '../../support/database';
import { outcomes, push } from '../../support/push-events';
import { eventOf, type RoundStage, sheetOf, stageRound, storedEvents } from '../../support/round-stage';

let stage: RoundStage;
let ana: Actor;
let attempt: string;
beforeEach(async () => {
  stage = await stageRound();
  [ana] = stage.students;
  [attempt] = stage.attempts;
});

const LOCK = { lineId: '', ordinal: 0, what: '@lock' };

function own(change: Partial<ReadingEvent> = {}): ReadingEvent {
  return eventOf(ana, attempt, { side: 'own', ...change });
}

/** Every size of every piece: what a student has recorded before a lock. */
function everySize(): ReadingEvent[] {
  return stage.practical.rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => index + 1).flatMap((ordinal) =>
      AXES.map((what) =>
        own({ cell: { lineId: line.id, ordinal, what }, value: { kind: 'value', ticks: line.target[what] } }),
      ),
    ),
  );
}

function lock(receipt: string): ReadingEvent {
  return own({ cell: LOCK, value: { kind: 'lock', locked: true, receipt }, typed: null, unit: null });
}

async function lockAll(): Promise<ReadingEvent> {
  const sizes = everySize();
  const made = lock(await receiptOf(attempt, sizes));
  const answers = await outcomes(push(ana, stage.sittingId, [...sizes, made]));
  expect(new Set(answers)).toEqual(new Set(['kept']));
  return made;
}

describe('a student’s own side', () => {
  test('is kept and scored on its own, and the bench’s side stays empty', async () => {
    expect(await outcomes(push(ana, stage.sittingId, [own()]))).toEqual(['kept']);
    expect(await sheetOf(attempt, 'own')).toMatchObject({ lost_points: 100, complete: false });
    expect(await sheetOf(attempt, 'bench')).toBeUndefined();
    const [entry] = await ownerSql()`
      select about_person_id, action from access_log where school_id = ${stage.school.id}`;
    expect(entry).toMatchObject({ about_person_id: ana.personId, action: 'own.record' });
  });

  test('holds no other student’s attempt, and no cell of the bench', async () => {
    const others = eventOf(ana, stage.attempts[1], { side: 'own' });
    const bench = eventOf(ana, attempt);
    const answers = await outcomes(push(ana, stage.sittingId, [others, bench]));
    expect(answers[0]).toMatch(/not in this round, or not yours/);
    expect(answers[1]).toBe('refused: The bench is recorded by staff.');
  });

  test('is closed to staff, and to a student who is not in the sitting', async () => {
    const { teacher, aide, sittingId } = stage;
    for (const staff of [teacher, aide]) {
      const [answer] = await outcomes(push(staff, sittingId, [eventOf(staff, attempt, { side: 'own' })]));
      expect(answer).toBe('refused: Students record their own side.');
    }
    const elsewhere = await stageRound();
    const [stranger] = elsewhere.students;
    expect(await push(stranger, sittingId, [eventOf(stranger, attempt, { side: 'own' })])).toMatchObject({
      problem: { code: 'not_found' },
    });
  });

  test('is closed once the results are out', async () => {
    await ownerSql()`update sittings set state = 'published' where id = ${stage.sittingId}`;
    const [answer] = await outcomes(push(ana, stage.sittingId, [own()]));
    expect(answer).toMatch(/results are out/);
    const [bench] = await outcomes(push(stage.teacher, stage.sittingId, [eventOf(stage.teacher, attempt)]));
    expect(bench).toBe('kept');
  });
});

describe('the lock', () => {
  test('is refused while a size is open, and when its receipt is of other readings', async () => {
    const sizes = everySize().slice(1);
    const answers = await outcomes(push(ana, stage.sittingId, [...sizes, lock('ABCD-EFGH')]));
    expect(answers.at(-1)).toBe('refused: One size is neither recorded nor marked “couldn’t read”.');
    const rest = everySize()
      .slice(0, 1)
      .map((event) => ({ ...event, value: { kind: 'unreadable' as const } }));
    const again = await outcomes(push(ana, stage.sittingId, [...rest, lock('ABCD-EFGH')]));
    expect(again.at(-1)).toMatch(/^refused: The receipt does not fit/);
    expect(await sheetOf(attempt, 'own')).toMatchObject({ locked_at: null });
  });

  test('takes a missing piece for read', async () => {
    const sizes = everySize().filter(({ cell }) => cell.lineId !== 'base');
    const missing = own({
      cell: { lineId: 'base', ordinal: 1, what: 'piece' },
      value: { kind: 'state', state: 'missing' },
    });
    const readings = [...sizes, missing];
    const answers = await outcomes(
      push(ana, stage.sittingId, [...readings, lock(await receiptOf(attempt, readings))]),
    );
    expect(answers.at(-1)).toBe('kept');
  });

  test('closes the own side at its moment, also within one batch', async () => {
    const made = await lockAll();
    expect(await sheetOf(attempt, 'own')).toMatchObject({
      locked_at: new Date(made.capturedAt),
      complete: false,
      lost_points: 0,
    });
    const later = await outcomes(push(ana, stage.sittingId, [own({ value: { kind: 'unreadable' } })]));
    expect(later).toEqual(['refused: This is locked: ask your teacher to reopen it.']);
    const open = { ...lock(''), value: { kind: 'lock' as const, locked: false, receipt: '' } };
    expect((await outcomes(push(ana, stage.sittingId, [open])))[0]).toMatch(/^refused/);
  });

  test('is reopened by the teacher alone, and never after the first bench reading', async () => {
    const made = await lockAll();
    const reopen = (who: Actor) =>
      eventOf(who, attempt, {
        side: 'own',
        cell: LOCK,
        value: { kind: 'lock', locked: false, receipt: '' },
        supersedes: [made.id],
        typed: null,
        unit: null,
      });
    expect((await outcomes(push(stage.aide, stage.sittingId, [reopen(stage.aide)])))[0]).toMatch(/^refused/);
    expect(await outcomes(push(stage.teacher, stage.sittingId, [reopen(stage.teacher)]))).toEqual(['kept']);
    const change = own({ value: { kind: 'unreadable' } });
    expect(await outcomes(push(ana, stage.sittingId, [change]))).toEqual(['kept']);
    await push(stage.teacher, stage.sittingId, [eventOf(stage.teacher, attempt)]);
    const [late] = await outcomes(push(stage.teacher, stage.sittingId, [reopen(stage.teacher)]));
    expect(late).toMatch(/^refused: The bench has begun/);
  });

  test('that arrives after the bench has begun is kept and marked late, unless the bench took its receipt', async () => {
    const { teacher, sittingId } = stage;
    await push(teacher, sittingId, [eventOf(teacher, attempt)]);
    const made = await lockAll();
    const flagsOf = async (attemptId: string, id: string) =>
      (await storedEvents(attemptId)).find((event) => event.id === id)?.flags;
    expect(await flagsOf(attempt, made.id)).toEqual(['late-lock']);

    stage = await stageRound();
    [ana] = stage.students;
    [attempt] = stage.attempts;
    const sizes = everySize();
    const receipt = await receiptOf(attempt, sizes);
    const taken = eventOf(stage.teacher, attempt, {
      cell: { lineId: '', ordinal: 0, what: '@receipt' },
      value: { kind: 'receipt', receipt },
      typed: null,
      unit: null,
    });
    await push(stage.teacher, stage.sittingId, [taken, eventOf(stage.teacher, attempt)]);
    const honest = lock(receipt);
    await push(ana, stage.sittingId, [...sizes, honest]);
    expect(await flagsOf(attempt, honest.id)).toEqual([]);
  });
});
