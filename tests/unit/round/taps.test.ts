import { describe, expect, test } from 'vitest';
import { scoreAttempt } from '@/lib/scoring';
import { deriveAttempt } from '@/lib/sync/derive';
import { planFor, STUDENTS, TestBench } from '../../support/bench';

const OFF: [string, number, string, number][] = [
  ['base', 1, 'length', -2],
  ['end', 2, 'width', 2],
  ['side', 1, 'length', -3],
  ['side', 2, 'thickness', 3],
  ['divider', 2, 'length', -4],
  ['divider', 4, 'width', 2],
];

function sheetOf(bench: TestBench) {
  const derived = deriveAttempt(
    bench.made.filter(({ attemptId }) => attemptId === 'attempt-ana'),
    'bench',
  );
  return { ...derived, sheet: scoreAttempt(bench.state.plan.rubric, derived.attempt) };
}

describe('taps on nine pieces, none missing, 27 sizes', () => {
  test('six off-band sizes take 15 taps from first cell to finish, and the sheet is complete', () => {
    const bench = new TestBench();
    for (const [lineId, ordinal, axis, steps] of OFF) {
      bench.point(lineId, ordinal, axis);
      bench.step(steps);
    }
    bench.tap({ do: 'rest-ok' });
    bench.tap({ do: 'all-good' });
    bench.tap({ do: 'finish' });
    expect(bench.taps).toBe(15);
    const { sheet, finished } = sheetOf(bench);
    expect(finished).toBe(true);
    expect(sheet.complete).toBe(true);
    // Two steps of 1/32 lose 1 point, three lose 2, four lose 3: 1 + 1 + 2 + 2 + 3 + 1.
    expect(sheet.lost).toBe(1000);
    expect(bench.state.attemptId).toBe('attempt-ben');
  });

  test('off-band sizes that follow each other need no tap on their cells', () => {
    const bench = new TestBench();
    for (let count = 0; count < 6; count += 1) bench.step(2);
    bench.tap({ do: 'rest-ok' });
    bench.tap({ do: 'all-good' });
    bench.tap({ do: 'finish' });
    expect(bench.taps).toBe(9);
  });

  test('all 27 sizes by number take 29 taps, the cursor advancing by itself', () => {
    const bench = new TestBench();
    for (let count = 0; count < 27; count += 1) bench.step((count % 3) - 1);
    expect(bench.state.spot).toBeNull();
    bench.tap({ do: 'all-good' });
    bench.tap({ do: 'finish' });
    expect(bench.taps).toBe(29);
    expect(sheetOf(bench).sheet).toMatchObject({ complete: true, lost: 0 });
  });

  test('by caliper, 27 presses of the instrument and 2 taps', () => {
    const bench = new TestBench();
    for (let count = 0; count < 27; count += 1) {
      const spot = bench.state.spot;
      const line = bench.state.plan.rubric.lines.find(({ id }) => id === spot?.lineId);
      if (!spot || !line) throw new Error('the cursor stands nowhere');
      const text = (line.target[spot.axis] / 254_000_000 + 0.011).toFixed(3);
      bench.feed({ do: 'instrument', text, at: count * 1000 });
    }
    bench.tap({ do: 'all-good' });
    bench.tap({ do: 'finish' });
    expect(bench.taps).toBe(2);
    expect(sheetOf(bench).sheet).toMatchObject({ complete: true, lost: 0 });
  });

  test('missing, held and spoiled take 2 taps each, undo and skip 1', () => {
    const bench = new TestBench();
    bench.tap({ do: 'ask', about: 'missing' });
    bench.tap({ do: 'missing', scope: 'piece' });
    expect(bench.taps).toBe(2);
    bench.tap({ do: 'ask', about: 'held' });
    bench.tap({ do: 'held', note: 'other name on it' });
    expect(bench.taps).toBe(4);
    bench.tap({ do: 'ask', about: 'spoiled' });
    bench.tap({ do: 'spoiled', scope: 'size' });
    expect(bench.taps).toBe(6);
    const { attempt } = deriveAttempt(bench.made, 'bench');
    expect(attempt.pieces).toMatchObject([
      { lineId: 'base', ordinal: 1, state: 'missing' },
      { lineId: 'end', ordinal: 1, state: 'held' },
      { lineId: 'end', ordinal: 2, sizes: { thickness: { kind: 'spoiled' } } },
    ]);
    bench.tap({ do: 'undo' });
    expect(deriveAttempt(bench.made, 'bench').attempt.pieces).toHaveLength(2);
    expect(bench.taps).toBe(7);
    bench.tap({ do: 'skip' });
    expect(bench.taps).toBe(8);
    expect(bench.state.attemptId).toBe('attempt-ben');
  });

  test('finishing opens the next present student, going round, and ends the round when none is left', () => {
    const bench = new TestBench(planFor());
    const opened: string[] = [];
    bench.tap({ do: 'open', attemptId: 'attempt-cleo' });
    bench.tap({ do: 'standing', standing: 'absent' });
    for (let count = 0; count < STUDENTS.length - 1; count += 1) {
      opened.push(bench.state.attemptId);
      bench.tap({ do: 'rest-ok' });
      bench.tap({ do: 'finish' });
    }
    expect(opened).toEqual(['attempt-dov', 'attempt-ana', 'attempt-ben']);
    expect(bench.state.asked).toEqual({ about: 'round-end' });
  });

  test('an aide goes to the next student who still has unread sizes, and records no finish', () => {
    const bench = new TestBench(planFor(undefined, { mayFinish: false, maySettle: false, personId: 'aide' }));
    bench.tap({ do: 'rest-ok' });
    bench.tap({ do: 'finish' });
    expect(bench.state.attemptId).toBe('attempt-ben');
    expect(bench.made.some(({ cell }) => cell.what === '@finish')).toBe(false);
  });
});
