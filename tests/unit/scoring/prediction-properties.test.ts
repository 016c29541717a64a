import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { type Attempt, judgePrediction, type PredictionPolicy, type Reading, rescore } from '@/lib/scoring';
import { GAUGED, policy, SPOILED, shelf, shelves, width } from '../../support/prediction-examples';
import { judgeByOracle } from '../../support/prediction-oracle';
import { attemptArb, rubricArb } from '../../support/scoring-arbitraries';
import { makeAttempt, makePiece, sixtyFourths, value } from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

describe('generated predictions', () => {
  const share = fc
    .tuple(fc.integer({ min: 1, max: 12 }), fc.integer({ min: 0, max: 6 }))
    .map(([num, more]) => ({ num, den: num + more }));
  const policyArb: fc.Arbitrary<PredictionPolicy> = fc.record({
    agreeWithin: fc.oneof(fc.constantFrom(0, 1, 2, 5), fc.integer({ min: 0, max: sixtyFourths(8) })),
    agreeShare: share,
    caughtShare: share,
    valueShare: share,
    full: fc.constant(200),
    closeWithin: fc.constantFrom(0, 100, 3000, 100_000),
    close: fc.constant(100),
  });
  const caseArb = rubricArb.chain((rubric) =>
    fc.record({
      rubric: fc.constant(rubric),
      student: attemptArb(rubric),
      teacher: attemptArb(rubric),
      policy: policyArb,
    }),
  );
  /** The student's pieces are the teacher's in another order, a few sizes changed: pairings near each other. */
  const jumbledArb = fc
    .tuple(
      fc.array(fc.tuple(fc.integer({ min: -5, max: 5 }), fc.integer({ min: -5, max: 5 })), {
        minLength: 1,
        maxLength: 5,
      }),
      fc.infiniteStream(fc.constantFrom<Reading | 'same' | 'near'>('same', 'same', 'near', GAUGED, SPOILED)),
      fc.infiniteStream(fc.nat()),
    )
    .map(([offs, changes, keys]) => {
      const teacher = offs.map(([a, b], index) => shelf(index + 1, { length: a, thickness: b }));
      const order = teacher
        .map((piece) => ({ piece, key: keys.next().value }))
        .toSorted((a, b) => a.key - b.key);
      const student = order.map(({ piece }, index) => {
        const change = changes.next().value;
        const sizes = { ...piece.sizes };
        if (change === 'near') sizes.width = value(width + sixtyFourths(1));
        else if (change !== 'same') sizes.length = change;
        return { ...piece, ordinal: index + 1, sizes };
      });
      return { teacher, student };
    });

  it('are judged as a trial of every pairing judges them', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        expect(judgePrediction(rubric, student, teacher, asked)).toEqual(
          judgeByOracle(rubric, student, teacher, asked),
        );
      }),
      { numRuns: 600 },
    );
  });

  it('of jumbled equal parts are judged as a trial of every pairing judges them', () => {
    fc.assert(
      fc.property(jumbledArb, fc.integer({ min: 0, max: 4 }), ({ teacher, student }, steps) => {
        const rubric = shelves(5);
        const asked = { ...policy, agreeWithin: sixtyFourths(steps) };
        const [own, bench]: Attempt[] = [makeAttempt(student), makeAttempt(teacher)];
        if (!own || !bench) return;
        expect(judgePrediction(rubric, own, bench, asked)).toEqual(judgeByOracle(rubric, own, bench, asked));
      }),
      { numRuns: 400 },
    );
  });

  it('of one’s own readings agree throughout where the teacher read the same', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, teacher, policy: asked }) => {
        const judged = judgePrediction(rubric, teacher, teacher, asked);
        expect(judged.agree).toBe(judged.of);
        expect(judged.caught).toBe(judged.offBand);
        expect(judged.gap ?? 0).toBe(0);
      }),
      { numRuns: 300 },
    );
  });

  it('count no more than there is, and pay only what the policy pays', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        const { of, agree, offBand, caught, bonus, because } = judgePrediction(
          rubric,
          student,
          teacher,
          asked,
        );
        expect(agree).toBeLessThanOrEqual(of);
        expect(offBand).toBeLessThanOrEqual(of);
        expect(caught).toBeLessThanOrEqual(offBand);
        expect(bonus).toBe(because === 'full' ? 200 : because === 'close' ? 100 : 0);
      }),
      { numRuns: 200 },
    );
  });

  it('that copy the targets never win the full bonus where the teacher found a loss', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, teacher, policy: asked }) => {
        const pieces = rubric.lines.flatMap((line) =>
          Array.from({ length: line.quantity }, (_, index) => makePiece(line.id, index + 1, line.target)),
        );
        const judged = judgePrediction(rubric, makeAttempt(pieces), teacher, asked);
        fc.pre(judged.offBand > 0);
        expect(judged.because).not.toBe('full');
      }),
      { numRuns: 200 },
    );
  });

  it('have the gap that rescoring both gives', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        const bare = [student, teacher].map((attempt) => ({ ...attempt, bonus: 0, daysLate: 0 }));
        const [own, bench] = rescore(rubric, bare).map(({ provisional }) => provisional);
        const gap = typeof own === 'number' && typeof bench === 'number' ? Math.abs(own - bench) : null;
        expect(judgePrediction(rubric, student, teacher, asked).gap).toBe(gap);
      }),
      { numRuns: 200 },
    );
  });
});
