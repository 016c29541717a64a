import fc from 'fast-check';
import { Fraction } from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { changeBetween, sumUpChanges } from '@/lib/data/sittings/compare-move';

const result = (score: number | null, total = 10_000) => ({ score, total });

describe('the change by a move', () => {
  it.each([
    [result(9000), result(9500), 500],
    [result(9500), result(9000), -500],
    [result(44, 45), result(98, 100), 0],
    [result(4400, 4500), result(9800), 22],
    [result(4500, 4500), result(10_000), 0],
    [result(null), result(9000), null],
    [result(9000), result(null), null],
  ])('from %j to %j is %j', (before, after, change) => {
    expect(changeBetween(before, after)).toBe(change);
  });

  const scoreArb = fc
    .tuple(fc.integer({ min: 1, max: 40_000_000 }), fc.nat())
    .map(([total, at]) => ({ total, score: at % (2 * total) }));

  it('is on the new total’s scale, to the hundredth, half up', () => {
    fc.assert(
      fc.property(scoreArb, scoreArb, (before, after) => {
        const exact = new Fraction(after.score).sub(
          new Fraction(before.score).mul(after.total).div(before.total),
        );
        expect(changeBetween(before, after)).toBe(exact.add(new Fraction(1, 2)).floor().valueOf());
      }),
      { numRuns: 2000 },
    );
  });

  it('is counted and averaged over those with two numbers, half up', () => {
    const students = [100, -50, 0, null, 0].map((change) => ({ change }));
    expect(sumUpChanges(students)).toEqual({ gain: 1, same: 2, lose: 1, meanChange: 13 });
    expect(sumUpChanges([{ change: -50 }, { change: 49 }])).toMatchObject({ meanChange: 0 });
    expect(sumUpChanges([{ change: -3 }, { change: 0 }])).toMatchObject({ meanChange: -1 });
    expect(sumUpChanges([{ change: null }])).toEqual({ gain: 0, same: 0, lose: 0, meanChange: null });
  });
});
