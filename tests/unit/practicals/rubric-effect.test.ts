import { describe, expect, it } from 'vitest';
import { matchLines, renameExcused, renameLines } from '@/lib/practicals/match-lines';
import { LEAST_TOLD, rubricEffect } from '@/lib/practicals/rubric-effect';
import type { Rubric } from '@/lib/scoring';
import type { Modification } from '@/lib/scoring/modification';
import {
  makeAttempt,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  sixtyFourths,
  value,
} from '@/tests/support/scoring-examples';
import { scoreByOracle } from '@/tests/support/scoring-oracle';

const shelf = makeLine({ id: 'shelf', label: 'shelf', quantity: 1 });
const { target } = shelf;
const wide = { ...target, width: target.width + sixtyFourths(32) };

const rule = makeRule();
const dear = makeRule({
  under: rule.under.map((band) => ({ ...band, lose: 2 * band.lose })),
  beyondUnder: 2 * rule.beyondUnder,
});
const dearer = (rubric: Rubric): Rubric => ({
  ...rubric,
  lines: rubric.lines.map((line) => ({ ...line, sizes: { ...line.sizes, length: dear } })),
});

const plain = makeRubric({ lines: [shelf], outOf: 10_000, roundTo: 1 });
const short = (steps: number, lineId = 'shelf') =>
  makeAttempt([
    makePiece(lineId, 1, {
      thickness: value(target.thickness),
      width: value(target.width),
      length: value(target.length - sixtyFourths(steps)),
    }),
  ]);
const work = (count: number) =>
  Array.from({ length: count }, (_, index) => ({ attempt: short(index), modification: null }));

describe('the effect of another rubric', () => {
  it('is the mean and each change as the oracle prices them', () => {
    const other = dearer(plain);
    const { scale, groups } = rubricEffect(other, [{ rubric: plain, work: work(12) }]);
    expect(scale).toEqual({ kind: 'points', total: 10_000 });
    const scores = (rubric: Rubric) =>
      work(12).map(({ attempt }) => scoreByOracle(rubric, attempt).provisional ?? 0);
    const [now, then] = [scores(plain), scores(other)];
    const mean = (all: number[]) =>
      10 * Math.round(all.reduce((sum, each) => sum + each, 0) / all.length / 10);
    expect(groups).toEqual([
      {
        students: 12,
        effect: {
          meanNow: mean(now),
          meanThen: mean(then),
          change: mean(then) - mean(now),
          changes: then.map((each, index) => each - (now[index] ?? 0)).sort((a, b) => a - b),
        },
      },
    ]);
    expect(groups[0]?.effect?.change).toBeLessThan(0);
  });

  it(`of a group under ${LEAST_TOLD} is told by its number alone`, () => {
    const few = { rubric: plain, work: work(LEAST_TOLD - 1) };
    const enough = { rubric: plain, work: work(LEAST_TOLD) };
    const { groups } = rubricEffect(plain, [few, enough]);
    expect(groups.map(({ students, effect }) => [students, effect === null])).toEqual([
      [9, true],
      [10, false],
    ]);
  });

  it('stands in shares of the total where totals differ', () => {
    const half = { ...plain, outOf: 5000 };
    const { scale, groups } = rubricEffect(half, [{ rubric: plain, work: work(10) }]);
    expect(scale).toEqual({ kind: 'share' });
    expect(groups[0]?.effect?.change).toBe(0);
  });

  it('prices a modified rubric as modified on both sides', () => {
    const modification: Modification = {
      format: 1,
      widen: { num: 1, den: 1 },
      excused: [{ lineId: 'shelf', axis: 'length' }],
      checks: [],
    };
    const modified = work(10).map(({ attempt }) => ({ attempt, modification }));
    const { groups } = rubricEffect(dearer(plain), [{ rubric: plain, work: modified }]);
    expect(groups[0]?.effect).toMatchObject({ meanNow: 10_000, meanThen: 10_000, change: 0 });
  });

  it('matches lines by what they ask for, whatever they are called', () => {
    const renamed = dearer({ ...plain, lines: [{ ...shelf, id: 'board' }] });
    const byName = rubricEffect(dearer(plain), [{ rubric: plain, work: work(10) }]);
    expect(rubricEffect(renamed, [{ rubric: plain, work: work(10) }])).toEqual(byName);
  });
});

describe('matching lines', () => {
  const line = (id: string, sizes = target) => makeLine({ id, label: id, quantity: 1, target: sizes });

  it('takes the same id first, then the first like one that is left', () => {
    const from = { lines: [line('a'), line('b'), line('c', wide)] };
    const to = { lines: [line('b'), line('c'), line('x', wide)] };
    expect([...matchLines(from, to)].sort()).toEqual([
      ['a', 'c'],
      ['b', 'b'],
      ['c', 'x'],
    ]);
  });

  it('leaves out what has no like, and renames pieces, offsets and what is excused', () => {
    expect(matchLines({ lines: [line('a', wide)] }, { lines: [line('a')] }).size).toBe(0);
    const names = new Map([['shelf', 'board']]);
    const attempt = { ...short(1), adjust: { shelf: { length: 5 } } };
    const renamed = renameLines(attempt, names);
    expect(renamed).toEqual({ ...short(1, 'board'), adjust: { board: { length: 5 } } });
    const excused = [
      { lineId: 'shelf', axis: null },
      { lineId: null, axis: 'width' as const },
    ];
    const modification: Modification = { format: 1, widen: { num: 1, den: 1 }, excused, checks: [] };
    expect(renameExcused(modification, names).excused).toEqual([
      { lineId: 'board', axis: null },
      { lineId: null, axis: 'width' },
    ]);
  });
});
