import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { type Length, MAX_LENGTH } from '@/lib/length';
import { priceCurve, type Rubric, type SizeRule, scoreAttempt } from '@/lib/scoring';
import { sizeRuleArb } from '../../support/scoring-arbitraries';
import {
  makeAttempt,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  value,
} from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const TARGET = MAX_LENGTH / 2;

/** What the scoring makes of one length that is so far off. */
function scored(rule: SizeRule, margin: Length, deviation: Length) {
  const target = { thickness: 1, width: 1, length: TARGET };
  const rubric: Rubric = makeRubric({
    margin,
    lines: [makeLine({ rule, target, worth: 100_000, swap: false })],
  });
  const piece = makePiece('shelf', 1, { length: value(TARGET + deviation) });
  const size = scoreAttempt(rubric, makeAttempt([piece])).pieces[0]?.sizes?.length;
  return { band: size?.band, lose: size?.lose };
}

const marginArb = fc.constantFrom(0, 1, 3, 508_000);
const ruleArb = fc.constantFrom(1, 2, 1_000_000).chain(sizeRuleArb);

describe('a price curve', () => {
  const rule = makeRule({
    over: [
      { within: 10, lose: 0 },
      { within: 20, lose: 100 },
    ],
    under: [{ within: 5, lose: 0 }],
    beyondOver: 300,
    beyondUnder: 400,
    cap: 350,
  });

  it('gives the example of its description', () => {
    expect(priceCurve(rule, { margin: 0 }).find((step) => step.from <= 0 && step.to >= 0)?.lose).toBe(0);
  });

  it('runs from far under to far over in inclusive whole ticks, margin and cap counted in', () => {
    expect(priceCurve(rule, { margin: 2 })).toEqual([
      { from: -MAX_LENGTH, to: -8, band: 'beyond', lose: 350 },
      { from: -7, to: 12, band: 0, lose: 0 },
      { from: 13, to: 22, band: 1, lose: 100 },
      { from: 23, to: MAX_LENGTH, band: 'beyond', lose: 300 },
    ]);
  });

  it('has a free step of one tick where nothing but the exact size is free', () => {
    const exact = [{ within: 0, lose: 0 }];
    const curve = priceCurve(makeRule({ over: exact, under: exact }), { margin: 0 });
    expect(curve).toEqual([
      { from: -MAX_LENGTH, to: -1, band: 'beyond', lose: 300 },
      { from: 0, to: 0, band: 0, lose: 0 },
      { from: 1, to: MAX_LENGTH, band: 'beyond', lose: 300 },
    ]);
    expect(Object.is(curve[1]?.from, 0)).toBe(true);
  });

  it('ends at 10 m where a band reaches past it, and then has nothing beyond', () => {
    const wide = [
      { within: MAX_LENGTH - 1, lose: 0 },
      { within: MAX_LENGTH, lose: 100 },
    ];
    expect(priceCurve(makeRule({ over: wide, under: wide }), { margin: 1 })).toEqual([
      { from: -MAX_LENGTH, to: MAX_LENGTH, band: 0, lose: 0 },
    ]);
  });

  it('has no gap and no overlap', () => {
    fc.assert(
      fc.property(ruleArb, marginArb, (any, margin) => {
        const curve = priceCurve(any, { margin });
        expect(curve[0]?.from).toBe(-MAX_LENGTH);
        expect(curve.at(-1)?.to).toBe(MAX_LENGTH);
        curve.forEach((step, index) => {
          expect(step.to).toBeGreaterThanOrEqual(step.from);
          if (index > 0) expect(step.from).toBe((curve[index - 1]?.to ?? Number.NaN) + 1);
        });
      }),
      { numRuns: 500 },
    );
  });

  it('is what the scoring charges at every edge, and a tick to either side of it', () => {
    fc.assert(
      fc.property(ruleArb, marginArb, (any, margin) => {
        const curve = priceCurve(any, { margin });
        const edges = [...any.over, ...any.under].flatMap(({ within }) => [
          within + margin,
          -within - margin,
        ]);
        for (const deviation of [0, ...edges].flatMap((edge) => [edge - 1, edge, edge + 1])) {
          const step = curve.find(({ from, to }) => from <= deviation && deviation <= to);
          expect({ band: step?.band, lose: step?.lose }).toEqual(scored(any, margin, deviation));
        }
      }),
      { numRuns: 300 },
    );
  });

  it('leaves the rule as it was', () => {
    const before = structuredClone(rule);
    priceCurve(rule, { margin: 2 });
    expect(rule).toEqual(before);
  });
});
