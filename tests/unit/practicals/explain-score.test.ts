import fc from 'fast-check';
import { describe, expect, test, vi } from 'vitest';
import { explainScore } from '@/lib/practicals/explain-score';
import { lostByAxis } from '@/lib/practicals/lost-by-axis';
import { scoreAttempt } from '@/lib/scoring';
import { boundsCaseArb, caseArb } from '../../support/scoring-arbitraries';
import { makeAttempt, makeLine, makePiece, makeRubric, sixtyFourths } from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const sum = (all: readonly number[]) => all.reduce((total, each) => total + each, 0);

describe('the explanation of a score', () => {
  test('a point of 45 is 2.22 of 100, and three of them are 6.67 together', () => {
    const line = makeLine({ quantity: 5 });
    const rubric = makeRubric({ lines: [line], outOf: 10_000, roundTo: 100 });
    const short = { length: line.target.length - sixtyFourths(4) };
    const pieces = [1, 2, 3, 4, 5].map((ordinal) => makePiece('shelf', ordinal, ordinal <= 3 ? short : {}));
    const explained = explainScore(rubric, scoreAttempt(rubric, makeAttempt(pieces)), 0);
    expect(explained.rows.map(({ points, ofTotal }) => [points, ofTotal])).toEqual([
      [100, 223],
      [100, 222],
      [100, 222],
    ]);
    expect(explained).toMatchObject({
      lost: { points: 300, ofTotal: 667 },
      kept: { points: 4200, ofTotal: 9333 },
      rest: -33,
      score: 9300,
    });
  });

  test('a piece past the gross limit tells its sizes and what makes them up to its worth', () => {
    const line = makeLine({});
    const rubric = makeRubric({ lines: [line], grossLimit: sixtyFourths(16) });
    const piece = makePiece('shelf', 1, { length: line.target.length - sixtyFourths(32) });
    const { rows } = explainScore(rubric, scoreAttempt(rubric, makeAttempt([piece])), 0);
    expect(rows.map(({ kind, points }) => [kind, points])).toEqual([
      ['size', 300],
      ['gross', 600],
    ]);
  });

  test('rows, floor, bonus and rest add up to the score in both scales, whatever the rubric and the attempt', () => {
    const addsUp = fc.property(fc.oneof(caseArb, boundsCaseArb), ({ rubric, attempt }) => {
      const sheet = scoreAttempt(rubric, attempt);
      const explained = explainScore(rubric, sheet, attempt.bonus);
      const { rows, lost, kept, floorGives, floorGivesOfTotal, possible, total, bonus, rest, score } =
        explained;
      expect(sum(rows.map(({ points }) => points))).toBe(sheet.lost);
      expect(lost.points).toBe(sheet.lost);
      expect(possible - lost.points + floorGives).toBe(kept.points);
      if (possible === 0) return;
      expect(sum(rows.map(({ ofTotal }) => ofTotal))).toBe(lost.ofTotal);
      expect(total - lost.ofTotal + floorGivesOfTotal).toBe(kept.ofTotal);
      expect(score).toBe(sheet.score ?? sheet.provisional);
      if (score !== null) expect(kept.ofTotal + bonus + rest).toBe(score);
    });
    fc.assert(addsUp, { numRuns: 800 });
  });

  test('each share is its exact part of the total, a hundredth up or down at most', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const sheet = scoreAttempt(rubric, attempt);
        if (sheet.possible === 0) return;
        for (const { points, ofTotal } of explainScore(rubric, sheet, 0).rows) {
          expect(Math.abs(ofTotal - (points * sheet.total) / sheet.possible)).toBeLessThanOrEqual(1);
        }
      }),
      { numRuns: 300 },
    );
  });
});

describe('points by axis', () => {
  test('axes and the rest are together exactly what was lost', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const sheet = scoreAttempt(rubric, attempt);
        const { axes, other } = lostByAxis(sheet);
        expect(sum(axes.map(({ under, over, spoiled }) => under + over + spoiled)) + other).toBe(sheet.lost);
      }),
      { numRuns: 500 },
    );
  });

  test('short goes under, long goes over, spoiled to neither', () => {
    const line = makeLine({ quantity: 3 });
    const rubric = makeRubric({ lines: [line] });
    const pieces = [
      makePiece('shelf', 1, { length: line.target.length - sixtyFourths(4) }),
      makePiece('shelf', 2, { length: line.target.length + sixtyFourths(6) }),
      makePiece('shelf', 3, { length: { kind: 'spoiled' } }),
    ];
    const [, , length] = lostByAxis(scoreAttempt(rubric, makeAttempt(pieces))).axes;
    expect(length).toEqual({
      axis: 'length',
      under: 100,
      over: 200,
      spoiled: 300,
      dearestUnder: 100,
      dearestOver: 200,
    });
  });
});
