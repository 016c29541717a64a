import { describe, expect, test } from 'vitest';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from '@/lib/practicals/both-scales';
import { distinctPrices } from '@/lib/practicals/distinct-prices';
import { faceScale } from '@/lib/practicals/face-scale';
import type { Line, Rubric } from '@/lib/scoring';
import { defaultRubric, defaultRule, ticksOf } from '../../support/rubrics';
import { makeLine, makeRubric } from '../../support/scoring-examples';

describe('points on both scales', () => {
  test('1 of 45 is 2.22 of 100', () => {
    const rubric = makeRubric({ lines: [makeLine({ quantity: 5 })], outOf: 10_000 });
    expect([possiblePoints(rubric), totalPoints(rubric), pointsOfTotal(rubric, 100)]).toEqual([
      4500, 10_000, 222,
    ]);
    expect(isOneScale(rubric)).toBe(false);
  });

  test('a start of 100 is one scale, and so is a total that is not scaled', () => {
    const start = makeRubric({ basis: 'start', start: 10_000, outOf: null });
    expect([possiblePoints(start), isOneScale(start)]).toEqual([10_000, true]);
    expect(isOneScale(makeRubric({ outOf: null }))).toBe(true);
  });
});

describe('each price once', () => {
  const rubric = defaultRubric();

  test('one price for all is “every size”', () => {
    expect(distinctPrices(rubric).map(({ label }) => label)).toEqual(['every size']);
  });

  test('an exception is named by axis and line, and the rest by what is left', () => {
    const dear = { ...defaultRule(), beyondUnder: 600 };
    const change = (line: Line): Line =>
      line.id === 'base' || line.id === 'end' ? { ...line, sizes: { ...line.sizes, length: dear } } : line;
    const prices = distinctPrices({ ...rubric, lines: rubric.lines.map(change) });
    expect(prices.map(({ label }) => label)).toEqual([
      'every thickness; every width; length of side and divider',
      'length of base and end',
    ]);
  });
});

describe('the face that shows a price', () => {
  const face = (rubric: Rubric, also: number[] = []) => {
    const [line] = rubric.lines;
    if (!line) throw new Error('a rubric has a line');
    return faceScale(rubric, line, 'length', also);
  };

  test('the default bands show in 32nds, one past the last edge', () => {
    expect(face(defaultRubric())).toEqual({ graduation: ticksOf('1/32'), span: 4 });
  });

  test('millimetres show in halves', () => {
    const rubric = defaultRubric([['stem', 1, '16 x 16 x 220']], 'mm');
    expect(face(rubric)).toEqual({ graduation: ticksOf('0.5', 'mm'), span: 5 });
  });

  test('an edge at 1/64 gets 64ths, and wide bands a coarser rule', () => {
    const bands = (...edges: string[]) =>
      edges.map((edge, at) => ({ within: ticksOf(edge), lose: at * 100 }));
    const priced = (...edges: string[]) => {
      const rubric = defaultRubric();
      const rule = { ...defaultRule(), over: bands(...edges), under: bands(...edges) };
      const sizes = { thickness: rule, width: rule, length: rule };
      return { ...rubric, lines: rubric.lines.map((line) => ({ ...line, sizes })) };
    };
    expect(face(priced('1/64', '1/32'))).toEqual({ graduation: ticksOf('1/64'), span: 3 });
    expect(face(priced('1/8', '1/2'))).toEqual({ graduation: ticksOf('1/8'), span: 5 });
  });

  test('a reading further out widens the face as far as there is room', () => {
    expect(face(defaultRubric(), [-ticksOf('1/8')]).span).toBe(5);
    expect(face(defaultRubric(), [ticksOf('2')]).span).toBe(8);
  });
});
