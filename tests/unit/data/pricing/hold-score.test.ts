import fc from 'fast-check';
import { Fraction } from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { holdScore } from '@/lib/data/pricing/hold-score';

const full = { roundTo: 100, ceiling: 102 };

describe('a score that may not drop', () => {
  it('keeps the promise of its example', () => {
    expect(holdScore({ score: 9000, total: 10_000 }, [{ score: 42, total: 45 }], full)).toEqual({
      points: 400,
      from: 0,
    });
  });

  it.each([
    ['nothing earlier', 9000, [], 0, null],
    ['an earlier one that is better', 9000, [[9500, 10_000]], 500, 0],
    ['an earlier one that is the same', 9000, [[9000, 10_000]], 0, null],
    ['an earlier one that is worse', 9000, [[8900, 10_000]], 0, null],
    ['the same share of another total', 9000, [[4050, 4500]], 0, null],
    [
      'the best of several',
      9000,
      [
        [9100, 10_000],
        [4400, 4500],
        [9500, 10_000],
      ],
      800,
      1,
    ],
    [
      'two that are equal: the first',
      9000,
      [
        [9500, 10_000],
        [4275, 4500],
      ],
      500,
      0,
    ],
    ['one past the ceiling', 9000, [[12_000, 10_000]], 1200, 0],
    ['one that is out of nothing', 9000, [[0, 0]], 0, null],
  ])('against %s', (_, score, earlier, points, from) => {
    const others = earlier.map(([one = 0, total = 0]) => ({ score: one, total }));
    expect(holdScore({ score, total: 10_000 }, others, full)).toEqual({ points, from });
  });

  const points = fc.integer({ min: 1, max: 40_000_000 });
  const scoreArb = fc
    .tuple(points, fc.integer({ min: 0, max: 200 }), fc.nat(99))
    .map(([total, percent, more]) => ({ score: Math.floor((total * percent) / 100) + more, total }));
  const caseArb = fc.record({
    total: points,
    steps: fc.nat(500_000),
    earlier: fc.array(scoreArb, { maxLength: 4 }),
    roundTo: fc.constantFrom(100, 50, 10, 1),
    ceiling: fc.integer({ min: 100, max: 200 }),
  });

  it('is never lower than any earlier share, but for the ceiling; stays on the grid and below the ceiling', () => {
    fc.assert(
      fc.property(caseArb, ({ total, steps, earlier, roundTo, ceiling }) => {
        const most = new Fraction(total)
          .mul(ceiling)
          .div(100 * roundTo)
          .floor()
          .mul(roundTo);
        const score = Math.min(steps * roundTo, most.valueOf());
        const held = holdScore({ score, total }, earlier, { roundTo, ceiling });
        const result = new Fraction(score + held.points);
        expect(held.points).toBeGreaterThanOrEqual(0);
        expect(held.points > 0).toBe(held.from !== null);
        expect((score + held.points) % roundTo).toBe(0);
        expect(result.lte(most)).toBe(true);
        for (const each of earlier) {
          const share = new Fraction(each.score).div(each.total);
          expect(result.equals(most) || result.div(total).gte(share)).toBe(true);
        }
        // Rounded up once: one step less would be a drop.
        const best = earlier[held.from ?? -1];
        if (best) {
          const less = result.sub(roundTo).div(total);
          expect(less.lt(new Fraction(best.score).div(best.total))).toBe(true);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
