import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { type Attempt, projectAttempt, scoreAttempt } from '@/lib/scoring';
import { attemptArb, caseArb, rubricArb } from '../../support/scoring-arbitraries';
import { makeAttempt, makeCheck, makeLine, makePiece, makeRubric } from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

describe('an attempt fitted to another rubric', () => {
  const rubric = makeRubric({
    lines: [makeLine({ id: 'rail', quantity: 2, checks: [makeCheck('square', [0, 100])] })],
    workChecks: [makeCheck('named', [0, 100])],
  });

  it('loses a line that the rubric does not have, and says so', () => {
    const attempt = makeAttempt([makePiece('rail', 1), makePiece('shelf', 1)]);
    expect(projectAttempt(rubric, attempt)).toEqual({
      attempt: makeAttempt([makePiece('rail', 1)]),
      dropped: [{ lineId: 'shelf', ordinal: 1, what: 'piece' }],
    });
  });

  it('loses pieces, checks, levels and offsets that the rubric does not have, each of them listed', () => {
    const attempt: Attempt = {
      pieces: [
        makePiece('rail', 3),
        makePiece('rail', 2, { length: 5 }, { square: 1, grain: 0 }),
        { ...makePiece('rail', 1, {}, { square: 2 }), state: 'missing' },
        makePiece('constructor', 1),
      ],
      work: { named: 2, cleared: 0, constructor: 1 },
      bonus: 7,
      daysLate: 3,
      adjust: { rail: { width: 5 }, shelf: { width: 6 } },
    };
    expect(projectAttempt(rubric, attempt)).toEqual({
      attempt: {
        pieces: [
          makePiece('rail', 2, { length: 5 }, { square: 1 }),
          { ...makePiece('rail', 1), state: 'missing' },
        ],
        work: {},
        bonus: 7,
        daysLate: 3,
        adjust: { rail: { width: 5 } },
      },
      dropped: [
        { lineId: 'rail', ordinal: 3, what: 'piece' },
        { lineId: 'rail', ordinal: 2, what: 'grain' },
        { lineId: 'rail', ordinal: 1, what: 'square' },
        { lineId: 'constructor', ordinal: 1, what: 'piece' },
        { lineId: '', ordinal: 0, what: 'named' },
        { lineId: '', ordinal: 0, what: 'cleared' },
        { lineId: '', ordinal: 0, what: 'constructor' },
        { lineId: 'shelf', ordinal: 0, what: 'adjust' },
      ],
    });
  });

  it('stays as it was where nothing is dropped', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric: own, attempt }) => {
        expect(projectAttempt(own, attempt)).toEqual({ attempt, dropped: [] });
      }),
      { numRuns: 200 },
    );
  });

  it('can always be scored, loses what is listed and nothing else, and leaves the original alone', () => {
    const foreign = fc
      .tuple(rubricArb, rubricArb)
      .chain(([other, own]) => fc.record({ other: fc.constant(other), attempt: attemptArb(own) }));
    fc.assert(
      fc.property(foreign, ({ other, attempt }) => {
        const before = structuredClone(attempt);
        const { attempt: projected, dropped } = projectAttempt(other, attempt);
        expect(() => scoreAttempt(other, projected)).not.toThrow();
        expect(structuredClone(attempt)).toEqual(before);
        const lost = dropped.filter(({ what }) => what === 'piece').length;
        expect(projected.pieces).toHaveLength(attempt.pieces.length - lost);
      }),
      { numRuns: 300 },
    );
  });
});
