import { describe, expect, test } from 'vitest';
import { nextStudent, studentStatus } from '@/lib/round/students';
import { deriveAttempt } from '@/lib/sync/derive';
import { STUDENTS, TestBench } from '../../support/bench';

describe('walking the round', () => {
  test('the cursor goes from piece to piece, or down a line one axis at a time', () => {
    const bench = new TestBench();
    bench.point('end', 1, 'thickness');
    bench.step(0);
    expect(bench.state.spot).toEqual({ lineId: 'end', ordinal: 1, axis: 'width' });
    bench.tap({ do: 'order', order: 'line' });
    bench.point('end', 1, 'length');
    bench.step(0);
    expect(bench.state.spot).toEqual({ lineId: 'end', ordinal: 2, axis: 'length' });
  });

  test('a size that was read can be read again, and the cursor goes on to the next unread one', () => {
    const bench = new TestBench();
    bench.tap({ do: 'line-ok' });
    bench.point('base', 1, 'width');
    bench.step(2);
    expect(bench.state.spot).toEqual({ lineId: 'end', ordinal: 1, axis: 'thickness' });
    expect(deriveAttempt(bench.made, 'bench').conflicts).toEqual([]);
  });

  test('finishing with sizes unread is said first and done at the second press', () => {
    const bench = new TestBench();
    bench.step(0);
    expect(bench.tap({ do: 'finish' })).toMatchObject({ made: [], sound: 'refused' });
    expect(bench.state.asked).toEqual({ about: 'finish', unread: 26, conflicts: 0 });
    expect(bench.tap({ do: 'finish' }).made).toMatchObject([{ value: { kind: 'finish', done: true } }]);
    expect(bench.state.attemptId).toBe('attempt-ben');
  });

  test('one who is in another’s hands comes after everybody else', () => {
    const bench = new TestBench();
    bench.state = { ...bench.state, elsewhere: ['attempt-ben'] };
    expect(nextStudent(bench.state)?.givenName).toBe('cleo');
    bench.state = { ...bench.state, elsewhere: STUDENTS.map(({ attemptId }) => attemptId) };
    expect(nextStudent(bench.state)?.givenName).toBe('ben');
  });

  test('a student who was skipped is remembered until taken up again', () => {
    const bench = new TestBench();
    bench.tap({ do: 'skip' });
    const [ana] = STUDENTS;
    if (!ana) throw new Error('no students');
    expect(studentStatus(bench.state, ana).skipped).toBe(true);
    bench.tap({ do: 'open', attemptId: ana.attemptId });
    expect(studentStatus(bench.state, ana).skipped).toBe(false);
  });

  test('all the rest of a line missing in two taps leaves what was measured', () => {
    const bench = new TestBench();
    bench.point('divider', 1, 'length');
    bench.step(0);
    bench.point('divider', 2, 'length');
    bench.tap({ do: 'ask', about: 'missing' });
    bench.tap({ do: 'missing', scope: 'line' });
    const { pieces } = deriveAttempt(bench.made, 'bench').attempt;
    expect(pieces.map(({ ordinal, state }) => [ordinal, state])).toEqual([
      [1, 'present'],
      [2, 'missing'],
      [3, 'missing'],
      [4, 'missing'],
    ]);
  });

  test('one piece fails one check; all good leaves that failing', () => {
    const bench = new TestBench();
    bench.point('end', 1, 'checks');
    bench.tap({ do: 'check', checkId: 'square', level: 1 });
    bench.tap({ do: 'all-good' });
    const { attempt } = deriveAttempt(bench.made, 'bench');
    expect(attempt.pieces.find(({ lineId, ordinal }) => lineId === 'end' && ordinal === 1)?.checks).toEqual({
      square: 1,
      surface: 0,
    });
    expect(attempt.work).toEqual({ labelled: 0 });
  });

  test('a check that the piece does not have, or a level past its last, records nothing', () => {
    const bench = new TestBench();
    bench.point('end', 1, 'checks');
    expect(bench.tap({ do: 'check', checkId: 'polish', level: 0 }).made).toEqual([]);
    expect(bench.tap({ do: 'check', checkId: 'square', level: 2 }).made).toEqual([]);
  });

  test('a held piece keeps what was read of it and is opened again by a tap and “it is here”', () => {
    const bench = new TestBench();
    bench.step(1);
    bench.tap({ do: 'ask', about: 'held' });
    bench.tap({ do: 'held', note: 'in dispute' });
    expect(bench.state.spot).toEqual({ lineId: 'end', ordinal: 1, axis: 'thickness' });
    bench.point('base', 1, 'thickness');
    expect(bench.state.asked).toMatchObject({ about: 'found' });
    bench.tap({ do: 'found' });
    expect(bench.state.spot).toEqual({ lineId: 'base', ordinal: 1, axis: 'width' });
    expect(deriveAttempt(bench.made, 'bench').attempt.pieces).toMatchObject([
      { state: 'present', sizes: { thickness: { kind: 'value' } } },
    ]);
  });

  test('nothing is recorded twice by pressing OK twice', () => {
    const bench = new TestBench();
    bench.tap({ do: 'rest-ok' });
    expect(bench.tap({ do: 'rest-ok' }).made).toEqual([]);
    expect(bench.tap({ do: 'line-ok' }).made).toEqual([]);
    bench.tap({ do: 'all-good' });
    expect(bench.tap({ do: 'all-good' }).made).toEqual([]);
  });
});
