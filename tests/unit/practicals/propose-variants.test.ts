import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it, vi } from 'vitest';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { proposeVariants } from '@/lib/practicals/propose-variants';
import { fitsInStrips } from '@/lib/practicals/propose-variants-fit';
import { judgeVariant } from '@/lib/practicals/propose-variants-judge';
import type { VariantQuestion } from '@/lib/practicals/propose-variants-types';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { AXES } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';
import { ticksOf } from '@/tests/support/rubrics';
import { handedIn, pricedFor, questionArb, starter } from '@/tests/support/variant-examples';

vi.setConfig({ testTimeout: 60_000 });

const EIGHTH = TICKS_PER_INCH / 8;
const graduations = { in: [EIGHTH, 2 * EIGHTH], mm: [TICKS_PER_MM, 5 * TICKS_PER_MM] };

const questions: [string, VariantQuestion][] = STARTER_IDS.flatMap((id) => {
  const { task, rubric } = starter(id);
  return graduations[task.unit].flatMap((graduation) =>
    [1, 3, 6].map((count): [string, VariantQuestion] => [
      `${id}, ${count} by ${graduation} ticks`,
      { task, rubric, others: [], count, graduation },
    ]),
  );
});

const sizesOf = ({ lines }: CutList) => lines.flatMap(({ target }) => AXES.map((axis) => target[axis]));

const woodOf = ({ lines }: CutList, kerf: number) =>
  lines.reduce(
    (sum, { quantity, target }) =>
      sum.add(
        new Fraction(quantity)
          .mul(target.thickness)
          .mul(target.width)
          .mul(target.length + kerf),
      ),
    new Fraction(0),
  );

/** Every promise of the rule, each held against what the engine or plain fractions say. */
function expectPromises(question: VariantQuestion): void {
  const { task, rubric, count, graduation } = question;
  const { proposals, stopped } = proposeVariants(question);
  expect(proposals.length).toBeLessThanOrEqual(count);
  expect(stopped === null).toBe(proposals.length === count);
  if (stopped) expect(task.cutList.lines.map(({ id }) => id)).toContain(stopped.lineId);
  for (const { cutList } of proposals) {
    expectLikePieces(task.cutList, cutList, graduation);
    expectLikeWood(question, cutList);
  }
  expectNothingFits(rubric, [task.cutList, ...proposals.map(({ cutList }) => cutList)]);
}

function expectLikePieces(original: CutList, variant: CutList, graduation: number): void {
  const strip = ({ lines }: CutList) =>
    lines.map(({ id, label, quantity, target }) => ({ id, label, quantity, thickness: target.thickness }));
  expect(strip(variant)).toEqual(strip(original));
  const [before, after] = [sizesOf(original), sizesOf(variant)];
  for (const [index, size] of before.entries()) {
    const moved = Math.abs((after[index] ?? 0) - size);
    expect(moved % graduation).toBe(0);
    expect(moved * 4).toBeLessThanOrEqual(size);
    for (const [other, against] of before.entries()) {
      expect(Math.sign((after[index] ?? 0) - (after[other] ?? 0))).toBe(Math.sign(size - against));
    }
  }
}

function expectLikeWood({ task }: VariantQuestion, variant: CutList): void {
  const kerf = task.kerf ?? 0;
  const original = woodOf(task.cutList, kerf);
  const change = woodOf(variant, kerf).sub(original).abs();
  expect(change.compare(original.mul(8).div(100))).toBeLessThanOrEqual(0);
  const smaller = sizesOf(variant).every((size, index) => size <= (sizesOf(task.cutList)[index] ?? 0));
  expect(fitsInStrips(variant.lines, task) || smaller).toBe(true);
}

/** No piece of one list, handed in for any line of another, is the part there: scored by the engine itself. */
function expectNothingFits(rubric: VariantQuestion['rubric'], lists: readonly CutList[]): void {
  for (const from of lists) {
    for (const to of lists) {
      if (from === to) continue;
      const priced = pricedFor(rubric, to);
      for (const { target } of from.lines) {
        for (const { id } of priced.lines) {
          const { gross, beyond } = handedIn(target, priced, id);
          expect(rubric.grossLimit === null ? beyond : gross).toBe(true);
        }
      }
    }
  }
}

describe('the proposals keep what the rule promises', () => {
  it.each(questions)('for the starter %s', (_, question) => expectPromises(question));

  it('for any other task', () => {
    fc.assert(fc.property(questionArb, expectPromises), { numRuns: 60 });
  });
});

describe('proposing', () => {
  it('gives the same proposals to the same question and leaves it as it was', () => {
    fc.assert(
      fc.property(questionArb, (question) => {
        const before = structuredClone(question);
        expect(proposeVariants(question)).toEqual(proposeVariants(structuredClone(question)));
        expect(question).toEqual(before);
      }),
      { numRuns: 25 },
    );
  });

  it('finds as many as wanted where the pieces leave room', () => {
    const { task, rubric } = starter('desk-caddy');
    const { proposals, step } = proposeVariants({ task, rubric, others: [], count: 6, graduation: EIGHTH });
    expect(proposals).toHaveLength(6);
    expect(step).toBe(ticksOf('3/8'));
  });

  it('tells what moves, in words', () => {
    const { task, rubric } = starter('six-stick');
    const [first] = proposeVariants({ task, rubric, others: [], count: 1, graduation: EIGHTH }).proposals;
    expect(first?.words).toEqual([
      ['Length of stick: ', { ticks: ticksOf('3 3/4') }, ' becomes ', { ticks: ticksOf('4 1/8') }, '.'],
      ['Length of key: ', { ticks: ticksOf('1 1/2') }, ' becomes ', { ticks: ticksOf('1 1/8') }, '.'],
      ['It takes 7.5 percent more wood than the original.'],
    ]);
  });

  it('keeps apart from the variants that there are already', () => {
    const { task, rubric } = starter('six-stick');
    const ask = (others: VariantQuestion['others']) =>
      proposeVariants({ task, rubric, others, count: 1, graduation: EIGHTH }).proposals;
    const [first] = ask([]);
    if (!first) throw new Error('There is no proposal.');
    const [next] = ask([{ name: 'variant B', cutList: first.cutList }]);
    if (!next) throw new Error('There is no other proposal.');
    expectNothingFits(rubric, [task.cutList, first.cutList, next.cutList]);
    expect(
      ask([
        { name: 'variant B', cutList: first.cutList },
        { name: 'variant C', cutList: next.cutList },
      ]),
    ).toEqual([]);
  });

  it('names the line that stops it where pieces can only be lent to each other', () => {
    const { task, rubric } = starter('stair-tower');
    expect(proposeVariants({ task, rubric, others: [], count: 1, graduation: EIGHTH })).toMatchObject({
      proposals: [],
      stopped: { lineId: 'block-1', words: [expect.stringContaining('“block 1”'), expect.any(String)] },
    });
  });

  it('names the line of which no size may move', () => {
    const { task, rubric } = starter('six-stick');
    const { proposals, stopped } = proposeVariants({
      task,
      rubric,
      others: [],
      count: 2,
      graduation: 2 * EIGHTH,
    });
    expect(proposals).toEqual([]);
    expect(stopped).toEqual({
      lineId: 'key',
      words: [
        '“key” stops the next one: ',
        'none of its sizes can move by ',
        { ticks: ticksOf('1/2') },
        ' within a quarter of itself.',
      ],
    });
  });

  it('refuses a count or a graduation that makes no sense', () => {
    const { task, rubric } = starter('six-stick');
    for (const wrong of [
      { count: 0 },
      { count: 7 },
      { count: 1.5 },
      { graduation: 0 },
      { graduation: 0.5 },
    ]) {
      expect(() =>
        proposeVariants({ task, rubric, others: [], count: 1, graduation: EIGHTH, ...wrong }),
      ).toThrow(RangeError);
    }
  });

  it('has an answer for two hundred lines', () => {
    const { task, rubric } = starter('bench-hook');
    const [line] = task.cutList.lines;
    const [priced] = rubric.lines;
    if (!line || !priced) throw new Error('The starter has no line.');
    const target = (index: number) => ({ ...line.target, length: ticksOf('9') + index * EIGHTH });
    const lines = Array.from({ length: 200 }, (_, index) => ({
      ...line,
      id: `p-${index}`,
      target: target(index),
    }));
    const question = {
      task: { ...task, blank: null, cutList: { lines } },
      rubric: { ...rubric, lines: lines.map((each) => ({ ...priced, ...each })) },
      others: [],
      count: 6,
      graduation: EIGHTH,
    };
    const { proposals, stopped } = proposeVariants(question);
    expect(stopped === null).toBe(proposals.length === 6);
  });
});

describe('strips from the blank', () => {
  it.each(STARTER_IDS)('the starter %s is yielded by its blank', (id) => {
    const { task } = starter(id);
    expect(fitsInStrips(task.cutList.lines, task)).toBe(true);
  });

  it('counts a kerf a piece along the grain and one between two strips', () => {
    const { task } = starter('six-stick');
    const [stick] = task.cutList.lines;
    if (!stick) throw new Error('The starter has no line.');
    const long = (length: string, quantity = 6) => [
      { ...stick, quantity, target: { ...stick.target, length: ticksOf(length) } },
    ];
    // Three of 4-7/8 and three kerfs of 1/8 are 15: two strips of 3/4 and a kerf, 1-5/8 of 1-7/8 wide.
    expect(fitsInStrips(long('4 7/8'), task)).toBe(true);
    expect(fitsInStrips(long('4 57/64'), task)).toBe(false);
    expect(fitsInStrips(long('4 7/8', 7), task)).toBe(false);
    expect(fitsInStrips(long('15', 1), task)).toBe(false);
  });
});

describe('sizes changed by hand', () => {
  it('say that nothing passes as long as it is so', () => {
    const [proposal] = proposeVariants({ task, rubric, others: [], count: 1, graduation: EIGHTH }).proposals;
    const lent = [
      'Any piece borrowed from another is past the gross limit of ',
      { ticks: ticksOf('1/4') },
      ': not that part.',
    ];
    const judged = judgeVariant(task, rubric, proposal?.cutList ?? changed('4'), original);
    expect(judged).toMatchObject({ remarks: [], words: [...(proposal?.words ?? []), lent] });
    expect(judgeVariant(task, rubric, changed('4'), original).words).not.toContainEqual(lent);
  });

  const { task, rubric } = starter('desk-caddy');
  const changed = (size: string): CutList => ({
    lines: task.cutList.lines.map((line) =>
      line.id === 'end' ? { ...line, target: { ...line.target, length: ticksOf(size) } } : line,
    ),
  });
  const original = [{ name: 'the original', cutList: task.cutList }];

  it('say which piece could be lent, and how far it is off', () => {
    const { lent, remarks } = judgeVariant(task, rubric, changed('4 1/4'), original);
    expect(lent.get('end')).toEqual({
      label: 'end',
      of: 'the original',
      off: ticksOf('1/4'),
      verdict: 'passes',
    });
    expect(remarks).toContainEqual([
      '“end” of the original can be lent for “end”: it is ',
      'off by no more than ',
      { ticks: ticksOf('1/4') },
      '.',
    ]);
    expect(judgeVariant(task, rubric, changed('4 3/8'), original).lent.get('end')?.verdict).toBe('gross');
    const free = { ...rubric, grossLimit: null };
    expect(judgeVariant(task, free, changed('4 3/8'), original).lent.get('end')?.verdict).toBe('beyond');
  });

  it('say when they need another amount of wood or more than the blank', () => {
    const words = (size: string) =>
      JSON.stringify(judgeVariant(task, rubric, changed(size), original).remarks);
    expect(words('6')).toContain('percent more wood');
    expect(words('8')).toContain('Whole strips of the blank');
    expect(words('3 1/2')).not.toContain('Whole strips');
  });
});
