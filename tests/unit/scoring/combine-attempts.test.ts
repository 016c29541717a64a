import fc from 'fast-check';
import { Fraction } from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { combineAttempts, type RedoPolicy } from '@/lib/scoring';

const of = (total: number, ...scores: (number | null)[]) => scores.map((score) => ({ score, total }));
const higher: RedoPolicy = { kind: 'higher', capPercent: 90 };
const latest: RedoPolicy = { kind: 'latest', capPercent: 90 };
const average = (roundTo: number): RedoPolicy => ({ kind: 'average', roundTo });

describe('the score of several attempts', () => {
  it('gives the example of its description', () => {
    expect(
      combineAttempts({ kind: 'higher', capPercent: 90 }, [
        { score: 7000, total: 10_000 },
        { score: 9800, total: 10_000 },
      ]),
    ).toBe(9000);
  });

  it.each<[string, RedoPolicy, (number | null)[], number | null]>([
    ['the higher stands', higher, [7000, 8000], 8000],
    ['a worse redo takes nothing', higher, [7000, 5000], 7000],
    ['a redo counts the cap at most', higher, [7000, 9800], 9000],
    ['a first score above the cap stands', higher, [9500, 9800], 9500],
    ['the first is never capped', higher, [9800], 9800],
    ['the highest of three', higher, [5000, 8900, 6000], 8900],
    ['the latest stands, though it is worse', latest, [7000, 5000], 5000],
    ['the latest counts the cap at most', latest, [7000, 8000, 9800], 9000],
    ['the cap is never below the first, for the latest too', latest, [9500, 9800], 9500],
    ['the first that is not null is the first', higher, [null, 9800, 9900], 9800],
    ['a null between is skipped', latest, [7000, 9800, null], 9000],
    ['nothing but nulls', higher, [null, null], null],
    ['a zero is a score', latest, [7000, 0], 0],
    ['no attempt', average(100), [], null],
    ['the mean is rounded half up', average(100), [7000, 8100], 7600],
    ['below half it is rounded down', average(100), [7000, 8098], 7500],
    ['the mean of three in hundredths', average(1), [100, 100, 101], 100],
    ['nulls do not enter the mean', average(1), [7000, null, 8001], 7501],
    ['the mean has no cap', average(1), [10_000, 10_200], 10_100],
  ])('%s', (_, policy, scores, combined) => {
    expect(combineAttempts(policy, of(10_000, ...scores))).toBe(combined);
  });

  it('rounds the cap down to a whole hundredth', () => {
    expect(combineAttempts(higher, of(4555, 0, 4555))).toBe(4099);
  });

  it('refuses scores of different totals, but an attempt without a score has none to compare', () => {
    const unequal = [...of(10_000, 7000), ...of(5000, 4000)];
    for (const policy of [higher, latest, average(1)]) {
      expect(() => combineAttempts(policy, unequal)).toThrow(RangeError);
      expect(combineAttempts(policy, [...of(0, null), ...of(10_000, 7000)])).toBe(7000);
    }
  });

  const scoreArb = fc.integer({ min: 0, max: 2_000_000 });
  const scoresArb = fc.array(fc.option(scoreArb, { freq: 4 }), { maxLength: 5 });
  const totalArb = fc.integer({ min: 0, max: 1_000_000 });

  it('is what plain fractions give', () => {
    fc.assert(
      fc.property(scoresArb, totalArb, fc.integer({ min: 0, max: 100 }), (scores, total, capPercent) => {
        const counted = scores.filter((score) => score !== null);
        const cap = Number(new Fraction(total).mul(capPercent).div(100).floor().valueOf());
        const [first] = counted;
        const capped = counted.map((score, at) =>
          at === 0 || first === undefined ? score : Math.min(score, Math.max(first, cap)),
        );
        const highest = capped.length === 0 ? null : Math.max(...capped);
        expect(combineAttempts({ kind: 'higher', capPercent }, of(total, ...scores))).toBe(highest);
        expect(combineAttempts({ kind: 'latest', capPercent }, of(total, ...scores))).toBe(
          capped.at(-1) ?? null,
        );
      }),
    );
  });

  it('as a mean is never further than half a step from the exact one, and above it at half', () => {
    fc.assert(
      fc.property(
        fc.array(scoreArb, { minLength: 1 }),
        fc.constantFrom(1, 10, 50, 100),
        (scores, roundTo) => {
          const mean = combineAttempts(average(roundTo), of(1_000_000, ...scores)) ?? Number.NaN;
          const off = 2 * (mean * scores.length - scores.reduce((all, score) => all + score, 0));
          expect(mean % roundTo).toBe(0);
          expect(off).toBeLessThanOrEqual(roundTo * scores.length);
          expect(off).toBeGreaterThan(-roundTo * scores.length);
        },
      ),
    );
  });

  it('leaves the attempts as they were', () => {
    const attempts = of(10_000, 7000, null, 9800);
    const before = structuredClone(attempts);
    combineAttempts(higher, attempts);
    combineAttempts(average(100), attempts);
    expect(attempts).toEqual(before);
  });
});
