import { describe, expect, test } from 'vitest';
import { recordOf, valueAt } from '@/lib/round/record';
import { withEvents } from '@/lib/round/record-events';
import { startRound } from '@/lib/round/start-round';
import { deriveAttempt } from '@/lib/sync/derive';
import { countingMint, planFor, TestBench } from '../../support/bench';

const BASE_LENGTH = { lineId: 'base', ordinal: 1, what: 'length' };

describe('undo', () => {
  test('one tap takes back a whole press, and any number of presses to the first', () => {
    const bench = new TestBench();
    bench.step(2);
    bench.tap({ do: 'line-ok' });
    bench.tap({ do: 'rest-ok' });
    bench.tap({ do: 'all-good' });
    for (let count = 0; count < 4; count += 1) bench.tap({ do: 'undo' });
    expect(deriveAttempt(bench.made, 'bench').attempt).toEqual({
      pieces: [],
      work: {},
      bonus: 0,
      daysLate: 0,
    });
    expect(bench.state.spot).toEqual({ lineId: 'base', ordinal: 1, axis: 'thickness' });
    expect(bench.tap({ do: 'undo' }).sound).toBe('refused');
  });

  test('what stood before comes back as it was typed', () => {
    const bench = new TestBench();
    bench.point('base', 1, 'length');
    bench.step(-2);
    bench.point('base', 1, 'length');
    bench.step(3);
    const [back] = bench.tap({ do: 'undo' }).made;
    const [first, second] = bench.made;
    expect(back).toMatchObject({ value: first?.value, typed: first?.typed, supersedes: [second?.id] });
  });

  test('undoing a finish returns to that student', () => {
    const bench = new TestBench();
    bench.tap({ do: 'rest-ok' });
    bench.tap({ do: 'finish' });
    expect(bench.state.attemptId).toBe('attempt-ben');
    bench.tap({ do: 'undo' });
    expect(bench.state.attemptId).toBe('attempt-ana');
    expect(deriveAttempt(bench.made, 'bench').finished).toBe(false);
  });

  test('what another tablet has recorded since is left alone', () => {
    const bench = new TestBench();
    bench.point('base', 1, 'length');
    bench.step(2);
    const mine = bench.made.at(-1);
    if (!mine) throw new Error('nothing was recorded');
    const theirs = { ...mine, id: countingMint('9').id(), authorId: 'aide', supersedes: [mine.id] };
    bench.state = withEvents(bench.state, [{ ...theirs, value: { kind: 'gauged' } }]);
    const outcome = bench.tap({ do: 'undo' });
    expect(outcome.made).toEqual([]);
    expect(outcome.sound).toBe('refused');
    expect(valueAt(recordOf(bench.state), BASE_LENGTH)).toEqual({ kind: 'gauged' });
  });

  test('undoing a choice between two readings lays both before you again', () => {
    const bench = twoReadings();
    bench.point('base', 1, 'length');
    bench.tap({ do: 'settle', value: { kind: 'gauged' } });
    expect(valueAt(recordOf(bench.state), BASE_LENGTH)).toEqual({ kind: 'gauged' });
    bench.tap({ do: 'undo' });
    expect(valueAt(recordOf(bench.state), BASE_LENGTH)).toBe('conflict');
  });

  test('a missing piece that is undone has its sizes again', () => {
    const bench = new TestBench();
    bench.step(1);
    bench.tap({ do: 'ask', about: 'missing' });
    bench.tap({ do: 'missing', scope: 'piece' });
    expect(deriveAttempt(bench.made, 'bench').attempt.pieces).toMatchObject([
      { state: 'missing', sizes: {} },
    ]);
    bench.tap({ do: 'undo' });
    expect(deriveAttempt(bench.made, 'bench').attempt.pieces).toMatchObject([
      { state: 'present', sizes: { thickness: { kind: 'value' } } },
    ]);
  });
});

function twoReadings(): TestBench {
  const mine = new TestBench();
  mine.point('base', 1, 'length');
  mine.step(2);
  const theirs = new TestBench(planFor(undefined, { personId: 'aide' }), countingMint('9'));
  theirs.tap({ do: 'line-ok' });
  mine.state = withEvents(mine.state, theirs.made);
  return mine;
}

describe('two readings', () => {
  test('the cursor passes them by, and a tap opens both', () => {
    const bench = twoReadings();
    bench.point('base', 1, 'length');
    expect(bench.state.asked).toEqual({ about: 'conflict', cell: BASE_LENGTH });
  });

  test('an aide can neither choose nor read over them', () => {
    const { made, state } = twoReadings();
    const both = [...state.events.values()].flat();
    const aide = new TestBench(
      planFor(undefined, { personId: 'aide', maySettle: false, mayFinish: false }),
      countingMint('7'),
      both,
    );
    aide.point('base', 1, 'length');
    expect(aide.tap({ do: 'settle', value: { kind: 'gauged' } }).made).toEqual([]);
    expect(made.length).toBeGreaterThan(0);
  });

  test('a piece missing here and measured there opens as two readings, settled either way', () => {
    const measured = new TestBench(planFor(undefined, { personId: 'aide' }), countingMint('9'));
    measured.step(1);
    const missing = new TestBench();
    missing.tap({ do: 'ask', about: 'missing' });
    missing.tap({ do: 'missing', scope: 'piece' });
    const torn = withEvents(missing.state, measured.made);
    for (const [state, pieces] of [
      ['missing', [{ state: 'missing', sizes: {} }]],
      ['present', [{ state: 'present', sizes: { thickness: { kind: 'value' } } }]],
    ] as const) {
      const bench = new TestBench(planFor(), countingMint('5'));
      bench.state = torn;
      bench.point('base', 1, 'length');
      expect(bench.state.asked).toMatchObject({ about: 'conflict', cell: { what: 'piece' } });
      bench.tap({ do: 'settle', value: { kind: 'state', state } });
      const { derived } = recordOf(bench.state);
      expect(derived.conflicts).toEqual([]);
      expect(derived.attempt.pieces).toMatchObject(pieces);
    }
  });
});

test('a round opens where this device left it', () => {
  const bench = new TestBench();
  bench.tap({ do: 'open', attemptId: 'attempt-cleo' });
  bench.point('side', 2, 'width');
  const { attemptId, spot } = bench.state;
  const place = { attemptId, spot, order: 'piece' as const, skipped: ['attempt-ana'] };
  expect(startRound(planFor(), bench.made, place)).toMatchObject({
    attemptId,
    spot,
    skipped: ['attempt-ana'],
  });
});
