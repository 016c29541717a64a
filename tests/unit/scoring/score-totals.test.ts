import { describe, expect, it } from 'vitest';
import { type Attempt, type Line, type Piece, type Rubric, scoreAttempt } from '@/lib/scoring';
import { makeAttempt, makeCheck, makeLine, makePiece, makeRubric } from '../../support/scoring-examples';

/** A rubric of one piece worth `worth`, and the sheet of an attempt that lost exactly `lost` of it. */
function totalsOf(
  { worth = 10_000, lost = 0, line = {} }: { worth?: number; lost?: number; line?: Partial<Line> },
  policy: Partial<Rubric> = {},
  given: Partial<Attempt> = {},
) {
  const priced = makeLine({ worth, missing: lost, ...line });
  const pieces: Piece[] = Array.from({ length: priced.quantity }, (_, at) => ({
    ...makePiece('shelf', at + 1),
    state: 'missing',
  }));
  return scoreAttempt(makeRubric({ ...policy, lines: [priced] }), makeAttempt(pieces, given));
}

const scoreOf = (...given: Parameters<typeof totalsOf>) => totalsOf(...given).score;

describe('the example of the description', () => {
  it('a piece worth 100 points that loses 5 scores 95', () => {
    expect(scoreOf({ lost: 500 })).toBe(9500);
  });
});

describe('what is possible', () => {
  it('is the sum of the worths of all pieces', () => {
    const lines = [makeLine({ quantity: 3, worth: 100 }), makeLine({ id: 'rail', worth: 250 })];
    expect(scoreAttempt(makeRubric({ lines }), makeAttempt([]))).toMatchObject({
      possible: 550,
      total: 550,
      raw: 550,
    });
  });

  it('is the start, with basis start, whatever the pieces are worth and whoever is excused', () => {
    const policy = {
      basis: 'start' as const,
      start: 10_000,
      lines: [makeLine({ quantity: 2, missing: 1200 })],
    };
    const excused: Piece = { ...makePiece('shelf', 2), state: 'excused' };
    const missing: Piece = { ...makePiece('shelf', 1), state: 'missing' };
    expect(scoreAttempt(makeRubric(policy), makeAttempt([excused, missing]))).toMatchObject({
      possible: 10_000,
      lost: 1200,
      raw: 8800,
      total: 10_000,
      score: 8800,
    });
  });

  it.each(['worth', 'start'] as const)(
    'does not matter where every piece is excused: there is no score, basis %s',
    (basis) => {
      const start = basis === 'start' ? 10_000 : null;
      const excused: Piece = { ...makePiece('shelf', 1), state: 'excused' };
      const rubric = makeRubric({ basis, start, workChecks: [makeCheck('named', [0, 100], 1)], outOf: 5000 });
      expect(scoreAttempt(rubric, makeAttempt([excused], { bonus: 100 }))).toMatchObject({
        complete: true,
        lost: 100,
        possible: start ?? 0,
        raw: start === null ? 0 : 9900,
        total: 5000,
        provisional: null,
        score: null,
      });
    },
  );

  it('gives no score where it is 0', () => {
    expect(totalsOf({ worth: 0 })).toMatchObject({
      possible: 0,
      raw: 0,
      total: 0,
      provisional: null,
      score: null,
    });
    expect(totalsOf({}, { basis: 'start', start: 0 })).toMatchObject({
      possible: 0,
      provisional: null,
      score: null,
    });
  });
});

describe('the raw score', () => {
  it('never falls below the floor, rounded up to a hundredth', () => {
    expect(totalsOf({ worth: 1001, lost: 400 }, { floor: 50 })).toMatchObject({ raw: 601, score: 601 });
    expect(totalsOf({ worth: 1001, lost: 501 }, { floor: 50 })).toMatchObject({ raw: 501, score: 501 });
    expect(totalsOf({ worth: 1000, lost: 501 }, { floor: 50 })).toMatchObject({ raw: 500, score: 500 });
    expect(totalsOf({ worth: 1000, lost: 1000 }, { floor: 100 })).toMatchObject({ raw: 1000, score: 1000 });
  });

  it('is never negative, though more may be lost than is possible', () => {
    expect(totalsOf({ worth: 100, lost: 500 })).toMatchObject({ lost: 500, raw: 0, score: 0 });
  });
});

describe('the scale', () => {
  it('turns what is possible into the total asked for, rounded once', () => {
    // 26 of 27 points on 100: 96.296…
    const scaled = (roundTo: number) => scoreOf({ worth: 2700, lost: 100 }, { outOf: 10_000, roundTo });
    expect([1, 10, 50, 100].map(scaled)).toEqual([9630, 9630, 9650, 9600]);
  });

  it('adds a bonus in points of the total, not of what is possible', () => {
    expect(scoreOf({ worth: 2700, lost: 1350 }, { outOf: 10_000 }, { bonus: 200 })).toBe(5200);
  });

  it('may be to a total of 0', () => {
    expect(scoreOf({}, { outOf: 0 }, { bonus: 100 })).toBe(0);
  });
});

describe('rounding', () => {
  it.each([
    [9949, 100, 9900],
    [9950, 100, 10_000],
    [9951, 100, 10_000],
    [9924, 50, 9900],
    [9925, 50, 9950],
    [9984, 10, 9980],
    [9985, 10, 9990],
    [9985, 1, 9985],
    [49, 100, 0],
    [50, 100, 100],
  ])('takes %i to a multiple of %i half up: %i', (raw, roundTo, score) => {
    expect(scoreOf({ lost: 10_000 - raw }, { roundTo })).toBe(score);
  });

  it('of a half that only the exact fraction shows goes up', () => {
    // 1/8 of 100 points is 12.5 points; lateness of 1 percent makes it 12.375.
    expect(scoreOf({ worth: 8, lost: 7 }, { outOf: 10_000, roundTo: 100 })).toBe(1300);
    const late = { perDay: 1, max: 1 };
    expect(scoreOf({ worth: 8, lost: 7 }, { outOf: 10_000, roundTo: 50, late }, { daysLate: 1 })).toBe(1250);
    expect(scoreOf({ worth: 8, lost: 7 }, { outOf: 100, roundTo: 1 })).toBe(13);
  });
});

describe('the ceiling', () => {
  it('holds the bonus back', () => {
    expect(scoreOf({}, { ceiling: 102 }, { bonus: 150 })).toBe(10_150);
    expect(scoreOf({}, { ceiling: 102 }, { bonus: 200 })).toBe(10_200);
    expect(scoreOf({}, { ceiling: 102 }, { bonus: 201 })).toBe(10_200);
    expect(scoreOf({}, { ceiling: 100 }, { bonus: 1 })).toBe(10_000);
    expect(scoreOf({}, { ceiling: 200 }, { bonus: 10_000 })).toBe(20_000);
  });

  it('is not passed by rounding: the greatest multiple not above it counts', () => {
    expect(scoreOf({ worth: 4500 }, { ceiling: 101, roundTo: 100 }, { bonus: 100 })).toBe(4500);
    expect(scoreOf({ worth: 2750 }, { ceiling: 100, roundTo: 100 })).toBe(2700);
    expect(scoreOf({ worth: 2750 }, { ceiling: 102, roundTo: 100 }, { bonus: 100 })).toBe(2800);
    expect(scoreOf({ worth: 99 }, { ceiling: 100, roundTo: 100 })).toBe(0);
  });

  it('is a fraction of a hundredth where the percent makes it one', () => {
    // 101 percent of 50 hundredths is 50.5; rounded half up that would be 51, above it.
    expect(scoreOf({ worth: 50 }, { ceiling: 101 }, { bonus: 1 })).toBe(50);
  });
});

describe('lateness', () => {
  const late = { perDay: 10, max: 25 };

  it.each([
    [0, 10_000],
    [1, 9000],
    [2, 8000],
    [3, 7500],
    [1000, 7500],
    [Number.MAX_SAFE_INTEGER, 7500],
  ])('of %i days leaves %i', (daysLate, score) => {
    expect(scoreOf({}, { late }, { daysLate })).toBe(score);
  });

  it('is recorded and costs nothing without a rule', () => {
    expect(scoreOf({}, { late: null }, { daysLate: 5 })).toBe(10_000);
  });

  it('is taken off the bonus too, before the ceiling', () => {
    expect(scoreOf({}, { late }, { daysLate: 1, bonus: 1000 })).toBe(9900);
    expect(scoreOf({}, { late, ceiling: 100 }, { daysLate: 1, bonus: 2000 })).toBe(10_000);
  });

  it('may take the score below the floor, and to nothing', () => {
    expect(totalsOf({ lost: 9000 }, { floor: 50, late }, { daysLate: 2 })).toMatchObject({
      raw: 5000,
      score: 4000,
    });
    expect(scoreOf({}, { late: { perDay: 100, max: 100 } }, { daysLate: 1, bonus: 50 })).toBe(0);
  });
});

describe('the result as it stands', () => {
  it('is the score once nothing is unread, and no score before', () => {
    const rubric = makeRubric({ lines: [makeLine({ quantity: 2 })] });
    const one = scoreAttempt(rubric, makeAttempt([makePiece('shelf', 1)]));
    expect(one).toMatchObject({ complete: false, provisional: 1800, score: null });
    const both = scoreAttempt(rubric, makeAttempt([makePiece('shelf', 1), makePiece('shelf', 2)]));
    expect(both).toMatchObject({ complete: true, provisional: 1800, score: 1800 });
  });
});

describe('the largest amounts allowed', () => {
  const full = { worth: 100_000, line: { quantity: 200 } };
  const largest: Partial<Rubric> = { ceiling: 200, late: { perDay: 1, max: 1 } };

  it('are exact without a total of their own: the scale cancels', () => {
    expect(totalsOf(full, { ...largest, outOf: null }, { bonus: 99_999, daysLate: 1 })).toMatchObject({
      possible: 20_000_000,
      // (20 000 000 + 99 999) × 0.99 = 19 898 999.01
      score: 19_898_999,
    });
  });

  it('are exact with a total of their own', () => {
    // (19 999 999 / 20 000 000 × 1 000 000 + 99 999) × 0.99 = 1 088 998.9605
    const lines = [
      makeLine({ worth: 100_000, quantity: 200, missing: 0 }),
      makeLine({ id: 'rail', worth: 0, missing: 1 }),
    ];
    const pieces: Piece[] = [
      ...Array.from({ length: 200 }, (_, at): Piece => ({ ...makePiece('shelf', at + 1), state: 'missing' })),
      { ...makePiece('rail', 1), state: 'missing' },
    ];
    const rubric = makeRubric({ ...largest, lines, outOf: 1_000_000 });
    const sheet = scoreAttempt(rubric, makeAttempt(pieces, { bonus: 99_999, daysLate: 1 }));
    expect(sheet).toMatchObject({ possible: 20_000_000, lost: 1, score: 1_088_999 });
  });
});
