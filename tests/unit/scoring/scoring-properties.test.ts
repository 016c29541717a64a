import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { Length } from '@/lib/length';
import { type Attempt, attemptSchema, type Rubric, rescore, rubricSchema, scoreAttempt } from '@/lib/scoring';
import { boundsCaseArb, caseArb, casesArb, sizeRuleArb } from '../../support/scoring-arbitraries';
import { makeAttempt, makeLine, makePiece, makeRubric } from '../../support/scoring-examples';
import { scoreByOracle } from '../../support/scoring-oracle';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const runs = (numRuns: number) => ({ numRuns });

/** Refuses a −0 anywhere in a result: JSON would turn it into 0 and the two would no longer be equal. */
function hasNegativeZero(value: unknown): boolean {
  if (typeof value === 'object' && value !== null) return Object.values(value).some(hasNegativeZero);
  return Object.is(value, -0);
}

function freezeDeep<T>(value: T): T {
  if (typeof value === 'object' && value !== null) {
    Object.values(value).forEach(freezeDeep);
    Object.freeze(value);
  }
  return value;
}

describe('a score sheet', () => {
  it('equals the one that plain fractions give', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        expect(scoreAttempt(rubric, attempt)).toEqual(scoreByOracle(rubric, attempt));
      }),
      runs(1500),
    );
  });

  it('equals the one that plain fractions give where amounts are the largest allowed', () => {
    fc.assert(
      fc.property(boundsCaseArb, ({ rubric, attempt }) => {
        const { pieces: _, ...sheet } = scoreAttempt(rubric, attempt);
        expect(scoreByOracle(rubric, attempt)).toMatchObject(sheet);
      }),
      runs(150),
    );
  });

  it('never holds a negative zero', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => !hasNegativeZero(scoreAttempt(rubric, attempt))),
      runs(500),
    );
  });

  it('is the same whatever order the pieces were recorded in', () => {
    const arb = caseArb.chain(({ rubric, attempt }) =>
      fc.record({
        rubric: fc.constant(rubric),
        attempt: fc.constant(attempt),
        pieces: fc.shuffledSubarray(attempt.pieces, { minLength: attempt.pieces.length }),
      }),
    );
    fc.assert(
      fc.property(arb, ({ rubric, attempt, pieces }) => {
        expect(scoreAttempt(rubric, { ...attempt, pieces })).toEqual(scoreAttempt(rubric, attempt));
      }),
      runs(300),
    );
  });

  it('is the same whichever unit lengths are shown in', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const inches = scoreAttempt({ ...rubric, unit: 'in' }, attempt);
        expect(scoreAttempt({ ...rubric, unit: 'mm' }, attempt)).toEqual(inches);
      }),
      runs(300),
    );
  });

  it('leaves the rubric and the attempt as they were', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const before = structuredClone({ rubric, attempt });
        freezeDeep(rubric);
        freezeDeep(attempt);
        scoreAttempt(rubric, attempt);
        rescore(rubric, [attempt, attempt]);
        expect(structuredClone({ rubric, attempt })).toEqual(before);
      }),
      runs(200),
    );
  });
});

describe('the totals', () => {
  it('never let the raw score fall below the floor or rise above what is possible', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const { raw, possible } = scoreAttempt(rubric, attempt);
        expect(raw * 100).toBeGreaterThanOrEqual(possible * rubric.floor);
        expect(raw).toBeLessThanOrEqual(possible);
      }),
      runs(500),
    );
  });

  it('never let the score rise above the ceiling, and keep it on the grid asked for', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const { provisional, total } = scoreAttempt(rubric, attempt);
        if (provisional === null) return;
        expect(provisional * 100).toBeLessThanOrEqual(total * rubric.ceiling);
        expect(provisional % rubric.roundTo).toBe(0);
        expect(provisional).toBeGreaterThanOrEqual(0);
      }),
      runs(500),
    );
  });

  it('make a score of every complete sheet that has something to score, and of no other', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const { score, provisional, complete, unread } = scoreAttempt(rubric, attempt);
        expect(complete).toBe(unread.length === 0);
        expect(score).toBe(complete ? provisional : null);
      }),
      runs(300),
    );
  });
});

describe('one dimension', () => {
  const target: Length = 190_500_000;

  function loseAt(
    rule: Parameters<typeof makeLine>[0]['rule'],
    policy: Partial<Rubric>,
    deviation: Length,
  ): number {
    const line = makeLine({ id: 'shelf', rule, swap: false, worth: 100_000 });
    const piece = makePiece('shelf', 1, { length: target + deviation });
    line.target.length = target;
    const sheet = scoreAttempt(makeRubric({ ...policy, lines: [line] }), makeAttempt([piece]));
    return sheet.pieces[0]?.sizes?.length.lose ?? Number.NaN;
  }

  it('never loses less for more deviation on the same side', () => {
    const scale = 100_000;
    const distance = fc.integer({ min: 0, max: 20 * scale });
    const arb = fc.record({
      rule: sizeRuleArb(scale),
      margin: fc.constantFrom(0, 1, scale),
      readTo: fc.option(fc.constantFrom(1, scale, 3 * scale)),
      a: distance,
      b: distance,
      side: fc.constantFrom(-1, 1),
    });
    fc.assert(
      fc.property(arb, ({ rule, margin, readTo, a, b, side }) => {
        const near = loseAt(rule, { margin, readTo }, side * Math.min(a, b));
        const far = loseAt(rule, { margin, readTo }, side * Math.max(a, b));
        expect(far).toBeGreaterThanOrEqual(near);
      }),
      runs(500),
    );
  });
});

describe('scoring many at once', () => {
  it('gives for each attempt what it gives alone, in the order given', () => {
    fc.assert(
      fc.property(casesArb({ minLength: 0, maxLength: 6 }), ({ rubric, attempts }) => {
        const alone = attempts.map((attempt) => {
          const { raw, lost, provisional, score, complete } = scoreAttempt(rubric, attempt);
          return { raw, lost, provisional, score, complete };
        });
        expect(rescore(rubric, attempts)).toEqual(alone);
      }),
      runs(300),
    );
  });
});

describe('the generated cases', () => {
  it('are rubrics and attempts that the schemas accept unchanged', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        expect(rubricSchema.parse(rubric)).toEqual(rubric);
        expect(attemptSchema.parse(attempt)).toEqual(attempt);
      }),
      runs(300),
    );
  });

  it('reach every rule that scoring has', () => {
    const reached = new Set<string>();
    const note = (rubric: Rubric, attempt: Attempt) => {
      const sheet = scoreAttempt(rubric, attempt);
      if (sheet.provisional === null) reached.add('no score');
      if (sheet.possible === 0) reached.add('nothing possible');
      if (sheet.raw > Math.max(0, sheet.possible - sheet.lost)) reached.add('floor');
      if (sheet.provisional !== null && sheet.provisional * 100 === sheet.total * rubric.ceiling) {
        reached.add('ceiling');
      }
      for (const { state, gross, swapped, uncapped, lose, sizes } of sheet.pieces) {
        reached.add(state);
        if (gross) reached.add('gross');
        if (swapped) reached.add('swapped');
        if (gross && swapped) reached.add('gross though swapped');
        if (lose < uncapped) reached.add('capped by worth');
        if (!gross && lose > uncapped) reached.add('worst of the set');
        for (const size of Object.values(sizes ?? {})) reached.add(`band ${size.band}`);
      }
    };
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => note(rubric, attempt)),
      { numRuns: 1000, seed: 20_261_201 },
    );
    expect([...reached]).toEqual(
      expect.arrayContaining([
        ...['no score', 'nothing possible', 'floor', 'ceiling', 'gross', 'swapped', 'gross though swapped'],
        ...['capped by worth', 'worst of the set', 'present', 'missing', 'held', 'excused', 'unread'],
        ...[0, 1, 2, 'beyond', 'gauged', 'spoiled', 'excused', 'unread'].map((band) => `band ${band}`),
      ]),
    );
  });
});
