import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { assignLeast, type Cost } from '@/lib/scoring/assign-least';
import { everyAssignment } from '../../support/every-assignment';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

type Costs = (Cost | null)[][];

const solve = (costs: Costs, capacities: number[]) =>
  assignLeast(costs.length, capacities, (row, column) => costs[row]?.[column] ?? null);

/** Sums of both ranks, then the columns in the order of the rows; null where a pair must not be. */
function rank(costs: Costs, columns: number[]): number[] | null {
  const picked = columns.map((column, row) => costs[row]?.[column] ?? null);
  if (picked.includes(null)) return null;
  const sum = (of: 'major' | 'minor') => picked.reduce((all, cost) => all + (cost?.[of] ?? 0), 0);
  return [sum('major'), sum('minor'), ...columns];
}

function compare(one: number[], other: number[]): number {
  const at = one.findIndex((value, index) => value !== other[index]);
  return at < 0 ? 0 : (one[at] ?? 0) - (other[at] ?? 0);
}

/** The columns of the first of all possible assignments, every one of them looked at. */
function solveByLooking(costs: Costs, capacities: number[]): number[] | null {
  const ranked = everyAssignment(costs.length, capacities).flatMap((columns) => {
    const ranks = rank(costs, columns);
    return ranks ? [ranks] : [];
  });
  return ranked.toSorted(compare)[0]?.slice(2) ?? null;
}

const costArb = (most: number, freq: number): fc.Arbitrary<Cost | null> => {
  const amount = fc.integer({ min: 0, max: most });
  const cost = fc.record({ major: amount, minor: amount });
  return freq === 0 ? cost : fc.option(cost, { freq });
};

/** Few different costs, so that most cases have equals to choose among. */
const caseArb = fc
  .record({
    rows: fc.integer({ min: 0, max: 4 }),
    capacities: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 1, maxLength: 4 }),
    most: fc.constantFrom(0, 1, 2, 9),
    freq: fc.constantFrom(0, 3),
  })
  .chain(({ rows, capacities, most, freq }) => {
    const row = fc.array(costArb(most, freq), { minLength: capacities.length, maxLength: capacities.length });
    return fc.record({
      capacities: fc.constant(capacities),
      costs: fc.array(row, { minLength: rows, maxLength: rows }),
    });
  });

describe('the least assignment', () => {
  it('gives the example of its description', () => {
    expect(assignLeast(2, [1, 1], (row, column) => ({ major: row === column ? 2 : 1, minor: 0 }))).toEqual([
      1, 0,
    ]);
  });

  it('is the first of all that are possible, or is refused where none is', () => {
    let refused = 0;
    fc.assert(
      fc.property(caseArb, ({ costs, capacities }) => {
        const expected = solveByLooking(costs, capacities);
        if (expected) {
          expect(solve(costs, capacities)).toEqual(expected);
        } else {
          refused += 1;
          expect(() => solve(costs, capacities)).toThrow(RangeError);
        }
      }),
      { numRuns: 4000 },
    );
    expect(refused).toBeGreaterThan(100);
  });

  it.each<[string, Costs, number[], number[]]>([
    ['nobody to place', [], [1], []],
    [
      'the major rank before the minor',
      [
        [
          { major: 1, minor: 9 },
          { major: 2, minor: 0 },
        ],
      ],
      [1, 1],
      [0],
    ],
    [
      'the minor rank between equals',
      [
        [
          { major: 1, minor: 9 },
          { major: 1, minor: 0 },
        ],
      ],
      [1, 1],
      [1],
    ],
    [
      'earlier rows first where all is equal',
      [
        [zero(), zero()],
        [zero(), zero()],
      ],
      [1, 1],
      [0, 1],
    ],
    [
      'room used up in order',
      [
        [zero(), zero()],
        [zero(), zero()],
        [zero(), zero()],
      ],
      [2, 1],
      [0, 0, 1],
    ],
    [
      'an earlier row moved by nobody',
      [
        [zero(), zero()],
        [zero(), null],
      ],
      [1, 1],
      [1, 0],
    ],
  ])('%s', (_, costs, capacities, columns) => {
    expect(solve(costs, capacities)).toEqual(columns);
  });

  it('is exact where the major sums are far above what a float of both ranks could hold', () => {
    const far = 3_000_000_000_000;
    const costs = [
      [
        { major: far, minor: 1 },
        { major: far, minor: 0 },
      ],
      [
        { major: far, minor: 0 },
        { major: far, minor: 0 },
      ],
    ];
    expect(solve(costs, [1, 1])).toEqual([1, 0]);
  });
});

function zero(): Cost {
  return { major: 0, minor: 0 };
}
