import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import {
  fitAttempt,
  holdPoints,
  leftOut,
  pricerOf,
  priceUnder,
  sheetUnder,
} from '@/lib/data/pricing/price-work';
import { PriceBook, priceVersion } from '@/lib/data/pricing/pricing';
import { storedAttempt } from '@/lib/data/pricing/stored-attempt';
import { type Attempt, attemptSchema, projectAttempt, type Rubric } from '@/lib/scoring';
import { defaultForm } from '@/tests/support/rubrics';
import { attemptArb, caseArb, rubricArb } from '@/tests/support/scoring-arbitraries';
import { makeAttempt, makeCheck, makeLine, makePiece, makeRubric } from '@/tests/support/scoring-examples';
import { scoreByOracle } from '@/tests/support/scoring-oracle';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const policy = defaultForm().policies.prediction;
const versionOf = (rubric: Rubric, number = 1) => ({ versionId: `v${number}`, number, rubric, policy });

/** A record made under one rubric, priced by others: most of it is not asked for there. */
const foreignArb = fc.tuple(rubricArb, rubricArb, rubricArb).chain(([one, two, three]) =>
  fc.record({
    rubrics: fc.constant([one, two, three] as const),
    attempt: fc.oneof(attemptArb(one), attemptArb(two), attemptArb(three)),
  }),
);

/** The record as the oracle takes it: what the rubric does not have is left out, one thing after the other. */
function keepKnown(rubric: Rubric, attempt: Attempt): Attempt {
  const levels = (recorded: Record<string, number>, checks: Rubric['workChecks']) =>
    Object.fromEntries(
      checks.flatMap(({ id, levels: known }) => {
        const level = Object.hasOwn(recorded, id) ? recorded[id] : undefined;
        return level !== undefined && level < known.length ? [[id, level]] : [];
      }),
    );
  const lines = new Map(rubric.lines.map((line) => [line.id, line]));
  const pieces = attempt.pieces.flatMap((piece) => {
    const line = lines.get(piece.lineId);
    return line && piece.ordinal <= line.quantity
      ? [{ ...piece, checks: levels(piece.checks, line.checks) }]
      : [];
  });
  const adjust = Object.entries(attempt.adjust ?? {}).filter(([lineId]) => lines.has(lineId));
  return {
    ...attempt,
    pieces,
    work: levels(attempt.work, rubric.workChecks),
    adjust: Object.fromEntries(adjust),
  };
}

describe('a work under a version', () => {
  it('is priced as an independent re-scoring prices it, with what is not asked for left out', () => {
    fc.assert(
      fc.property(foreignArb, ({ rubrics: [rubric], attempt }) => {
        const bench = { ...attempt, bonus: 0 };
        const expected = scoreByOracle(rubric, keepKnown(rubric, bench));
        const version = priceVersion(versionOf(rubric), null);
        expect(priceUnder(version, { bench, own: null })).toEqual({
          score: expected.score,
          provisional: expected.provisional,
          total: expected.total,
          judgement: null,
        });
        expect(sheetUnder(version, bench)).toEqual(expected);
      }),
      { numRuns: 500 },
    );
  });

  it('keeps all it is asked for, and names what it is not', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, attempt }) => {
        const version = priceVersion(versionOf(rubric), null);
        expect(fitAttempt(version, attempt)).toEqual(attempt);
        expect(leftOut(version, attempt)).toEqual([]);
      }),
      { numRuns: 300 },
    );
    fc.assert(
      fc.property(foreignArb, ({ rubrics: [rubric], attempt }) => {
        const version = priceVersion(versionOf(rubric), null);
        expect(leftOut(version, attempt)).toEqual(projectAttempt(rubric, attempt).dropped);
      }),
      { numRuns: 300 },
    );
  });
});

describe('holding', () => {
  it('never lets a score drop below its share under a held version, but for the ceiling', () => {
    fc.assert(
      fc.property(foreignArb, ({ rubrics: [now, one, two], attempt }) => {
        const bench = { ...attempt, bonus: 0 };
        const work = { bench, own: null };
        const pricing = new PriceBook([versionOf(now), versionOf(one, 2), versionOf(two, 3)]).pricing('v1', [
          'v2',
          'v3',
        ]);
        const priced = priceUnder(pricing, work);
        const held = holdPoints(pricing, priced, pricerOf(work));
        if (priced.score === null) return;
        const most = Math.floor((priced.total * now.ceiling) / (100 * now.roundTo)) * now.roundTo;
        const score = priced.score + held.points;
        for (const rubric of [one, two]) {
          const before = scoreByOracle(rubric, keepKnown(rubric, bench));
          if (before.score === null) continue;
          expect(score === most || score * before.total >= before.score * priced.total).toBe(true);
        }
      }),
      { numRuns: 500 },
    );
  });

  const dear = makeRubric({ lines: [makeLine({ id: 'rail' })] });
  const cheap = makeRubric({
    lines: [{ ...makeLine({ id: 'rail' }), checks: [makeCheck('square', [0, 100])] }],
  });

  it('gives nothing for a version under which the work is not read to the end', () => {
    const unread = makeRubric({ lines: [makeLine({ id: 'rail' }), makeLine({ id: 'shelf' })] });
    const book = new PriceBook([versionOf(dear), versionOf(unread, 2), versionOf(cheap, 3)]);
    const work = { bench: makeAttempt([makePiece('rail', 1, { length: { kind: 'spoiled' } })]), own: null };
    for (const id of ['v2', 'v3']) {
      const pricing = book.pricing('v1', [id]);
      expect(holdPoints(pricing, priceUnder(pricing, work), pricerOf(work))).toEqual({
        points: 0,
        version: null,
      });
    }
  });

  it('makes the same pricing once, and another one for a modified rubric', () => {
    const book = new PriceBook([versionOf(dear), versionOf(cheap, 2)]);
    const modification = { format: 1 as const, widen: { num: 2, den: 1 }, excused: [], checks: [] };
    const modified = book.pricing('v1', ['v2'], { accommodationId: 'a', modification });
    expect(book.pricing('v1', ['v2'])).toBe(book.pricing('v1', ['v2']));
    expect(book.pricing('v1', ['v2'], { accommodationId: 'a', modification })).toBe(modified);
    expect(modified.rubric).not.toEqual(dear);
    expect(modified.published).toBe(dear);
    expect(modified.held[0]?.modification).toBe(modification);
    expect(() => book.pricing('v9', [])).toThrow('v9');
  });
});

describe('an attempt out of storage', () => {
  it('comes back as the schema would have it', () => {
    fc.assert(
      fc.property(caseArb, ({ attempt }) => {
        const stored: unknown = JSON.parse(JSON.stringify(attempt));
        expect(storedAttempt(stored)).toEqual(attemptSchema.parse(stored));
      }),
      { numRuns: 300 },
    );
  });

  const good = makeAttempt([makePiece('rail', 1, {}, { square: 0 })]);
  it.each([
    ['nothing', null],
    ['a list', []],
    ['a piece without a number', { ...good, pieces: [{ ...makePiece('rail', 1), ordinal: 0 }] }],
    ['an unknown state', { ...good, pieces: [{ ...makePiece('rail', 1), state: 'lost' }] }],
    [
      'a reading of nothing',
      { ...good, pieces: [makePiece('rail', 1, { length: { kind: 'value', ticks: 0 } })] },
    ],
    [
      'an unknown reading',
      { ...good, pieces: [{ ...makePiece('rail', 1), sizes: { length: { kind: 'seen' } } }] },
    ],
    ['half a level', { ...good, work: { named: 0.5 } }],
    ['negative days', { ...good, daysLate: -1 }],
  ])('is refused when it is %s', (_, stored) => {
    expect(() => storedAttempt(stored)).toThrow();
  });

  it('may hold more pieces than one rubric has, of several versions', () => {
    const pieces = Array.from({ length: 3 }, (_, line) =>
      Array.from({ length: 200 }, (__, at) => makePiece('rail', at + 1)).map((piece) => ({
        ...piece,
        lineId: `rail-${line}`,
      })),
    ).flat();
    expect(storedAttempt({ ...good, pieces }).pieces).toHaveLength(600);
  });
});
