import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { type Attempt, AXES, type Rubric, rubricSchema, scoreAttempt } from '@/lib/scoring';
import { excusedAxes, type Modification, modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { caseArb } from '../../support/scoring-arbitraries';
import { scoreByOracle } from '../../support/scoring-oracle';

vi.setConfig({ testTimeout: 60_000 });

const widenArb = fc
  .integer({ min: 1, max: 1000 })
  .chain((den) =>
    fc.oneof(fc.constant(den), fc.integer({ min: den, max: 10 * den })).map((num) => ({ num, den })),
  );

function excusedArb({ lines }: Rubric): fc.Arbitrary<Modification['excused']> {
  const lineId = fc.constantFrom(...lines.map(({ id }) => id), 'not-there');
  const axis = fc.constantFrom(...AXES);
  return fc.array(
    fc.oneof(
      fc.record({ lineId, axis: fc.constant(null) }),
      fc.record({ lineId, axis }),
      fc.record({ lineId: fc.constant(null), axis: fc.constantFrom('width' as const, 'length' as const) }),
    ),
    { maxLength: 3 },
  );
}

const checksArb: fc.Arbitrary<Modification['checks']> = fc.uniqueArray(
  fc.record({
    label: fc.constantFrom('check square', 'check constructor', 'CHECK surface', 'not there'),
    lose: fc.option(fc.array(fc.integer({ min: 0, max: 500 }), { maxLength: 3 }).map((more) => [0, ...more])),
  }),
  { maxLength: 3, selector: ({ label }) => label },
);

/** A modification; `parts` tells which of its parts are other than nothing. */
function modifiedArb(parts: { widen?: true; excused?: true; checks?: true }) {
  return caseArb.chain(({ rubric, attempt }) =>
    fc.record({
      rubric: fc.constant(rubric),
      attempt: fc.constant(attempt),
      modification: fc.record<Modification>({
        format: fc.constant(1),
        widen: parts.widen ? widenArb : fc.constant({ num: 7, den: 7 }),
        excused: parts.excused ? excusedArb(rubric) : fc.constant([]),
        checks: parts.checks ? checksArb : fc.constant([]),
      }),
    }),
  );
}

const ALL = { widen: true, excused: true, checks: true } as const;

interface Case {
  rubric: Rubric;
  attempt: Attempt;
  modification: Modification;
}

function price({ rubric, attempt, modification }: Case) {
  return {
    plain: scoreAttempt(rubric, attempt),
    modified: scoreAttempt(modifyRubric(rubric, modification), modifyAttempt(rubric, attempt, modification)),
  };
}

function freezeDeep<T>(value: T): T {
  if (typeof value === 'object' && value !== null) {
    Object.values(value).forEach(freezeDeep);
    Object.freeze(value);
  }
  return value;
}

describe('a modified rubric', () => {
  it('is a rubric, and prices the modified attempt as plain fractions do', () => {
    fc.assert(
      fc.property(modifiedArb(ALL), ({ rubric, attempt, modification }) => {
        expect(modificationSchema.safeParse(modification).success).toBe(true);
        const prices = modifyRubric(rubric, modification);
        expect(rubricSchema.safeParse(prices).success).toBe(true);
        const counted = modifyAttempt(rubric, attempt, modification);
        expect(scoreAttempt(prices, counted)).toEqual(scoreByOracle(prices, counted));
      }),
      { numRuns: 500 },
    );
  });

  it('never costs more for being wider: no piece, no set, no score', () => {
    fc.assert(
      fc.property(modifiedArb({ widen: true }), (given) => {
        const { plain, modified } = price(given);
        modified.pieces.forEach((piece, at) => {
          expect(piece.lose).toBeLessThanOrEqual(plain.pieces[at]?.lose ?? -1);
          expect(piece.gross && !plain.pieces[at]?.gross).toBe(false);
        });
        expect(modified.lost).toBeLessThanOrEqual(plain.lost);
        expect(modified.provisional ?? 0).toBeGreaterThanOrEqual(plain.provisional ?? 0);
        expect(modified.unread).toEqual(plain.unread);
      }),
      { numRuns: 800 },
    );
  });

  it('never takes more points of any piece for what is excused, exchanged readings and sets included', () => {
    fc.assert(
      fc.property(modifiedArb({ widen: true, excused: true }), (given) => {
        const { plain, modified } = price(given);
        modified.pieces.forEach((piece, at) => {
          expect(piece.lose).toBeLessThanOrEqual(plain.pieces[at]?.lose ?? -1);
        });
        expect(modified.lost).toBeLessThanOrEqual(plain.lost);
      }),
      { numRuns: 800 },
    );
  });

  it('keeps the total: the same as without it, or that of the whole cut list where lines are excused', () => {
    fc.assert(
      fc.property(modifiedArb(ALL), (given) => {
        const { plain, modified } = price(given);
        const { rubric, modification } = given;
        const whole = rubric.lines.some(({ id }) => excusedAxes(id, modification).length === 3);
        const sum = rubric.lines.reduce((before, { worth, quantity }) => before + worth * quantity, 0);
        const ofAll = rubric.outOf ?? (rubric.basis === 'start' ? rubric.start : sum);
        if (!whole) expect(modified.total).toBe(plain.total);
        else if (sum <= 1_000_000) expect(modified.total).toBe(ofAll);
      }),
      { numRuns: 500 },
    );
  });

  it('that modifies nothing gives the very same sheet', () => {
    fc.assert(
      fc.property(modifiedArb({}), (given) => {
        const { plain, modified } = price(given);
        expect(modified).toEqual(plain);
        expect(modifyRubric(given.rubric, given.modification)).toEqual(given.rubric);
      }),
      { numRuns: 500 },
    );
  });

  it('leaves nothing unread of excused lines', () => {
    fc.assert(
      fc.property(modifiedArb({ excused: true }), (given) => {
        const { modified } = price(given);
        for (const { lineId, what } of modified.unread) {
          if (lineId === '') continue;
          const axes = excusedAxes(lineId, given.modification);
          expect(axes.length === 3 || axes.some((axis) => axis === what)).toBe(false);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('leaves rubric, attempt and modification as they were', () => {
    fc.assert(
      fc.property(modifiedArb(ALL), (given) => {
        const before = structuredClone(given);
        price(freezeDeep(given));
        expect(structuredClone(given)).toEqual(before);
      }),
      { numRuns: 200 },
    );
  });
});
