import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH } from '@/lib/length';
import { bandsFromRate, priceCurve, sizeRuleSchema } from '@/lib/scoring';

describe('bands from a rate', () => {
  const rate = { free: 10, step: 5, lose: 100, cap: 300 };

  it('give the example of their description', () => {
    expect(bandsFromRate(rate).over.length).toBe(3);
  });

  it('charge each begun step past the free distance, both sides alike, up to the cap', () => {
    const side = [
      { within: 10, lose: 0 },
      { within: 15, lose: 100 },
      { within: 20, lose: 200 },
    ];
    expect(bandsFromRate(rate)).toEqual({
      over: side,
      under: side,
      beyondOver: 300,
      beyondUnder: 300,
      cap: 300,
    });
  });

  it('end with what is left where the cap is no multiple of the price', () => {
    const { over, beyondOver } = bandsFromRate({ ...rate, cap: 250 });
    expect([over.at(-1), beyondOver]).toEqual([{ within: 20, lose: 200 }, 250]);
  });

  it('have a free band alone where the first step reaches the cap, or nothing is charged', () => {
    expect(bandsFromRate({ ...rate, cap: 100 }).over).toEqual([{ within: 10, lose: 0 }]);
    expect(bandsFromRate({ ...rate, cap: 0 })).toMatchObject({
      over: [{ within: 10, lose: 0 }],
      beyondOver: 0,
    });
  });

  it('are 20 a side at most', () => {
    expect(bandsFromRate({ ...rate, cap: 2000 }).under).toHaveLength(20);
    expect(() => bandsFromRate({ ...rate, cap: 2001 })).toThrow(RangeError);
  });

  it.each([
    ['no cap, so that the bands never end', { cap: null }],
    ['a free distance below 0', { free: -1 }],
    ['no step', { step: 0 }],
    ['a step backwards', { step: -5 }],
    ['no price', { lose: 0 }],
    ['a cap below 0', { cap: -1 }],
    ['part of a tick', { step: 0.5 }],
    ['part of a hundredth', { lose: 33.3 }],
    ['a distance that is no number', { free: Number.NaN }],
    ['a band past 10 m', { free: MAX_LENGTH - 9 }],
  ])('refuse %s', (_, changes) => {
    expect(() => bandsFromRate({ ...rate, ...changes })).toThrow(RangeError);
  });

  it('may reach exactly 10 m', () => {
    expect(bandsFromRate({ ...rate, free: MAX_LENGTH - 10 }).over.at(-1)?.within).toBe(MAX_LENGTH);
  });

  it('are a rule that scoring accepts, and charge what counting the begun steps gives', () => {
    const rateArb = fc
      .record({
        free: fc.integer({ min: 0, max: 50 }),
        step: fc.integer({ min: 1, max: 9 }),
        lose: fc.integer({ min: 1, max: 300 }),
        steps: fc.integer({ min: 1, max: 20 }),
        short: fc.nat(),
      })
      .map(({ steps, short, ...rest }) => ({ ...rest, cap: steps * rest.lose - (short % rest.lose) }));
    fc.assert(
      fc.property(rateArb, fc.integer({ min: 0, max: 300 }), (any, distance) => {
        const rule = bandsFromRate(any);
        expect(sizeRuleSchema.safeParse(rule).success).toBe(true);
        let begun = 0;
        while (any.free + begun * any.step < distance) begun += 1;
        const expected = Math.min(any.cap, begun * any.lose);
        const charged = [distance, 0 - distance].map(
          (at) => priceCurve(rule, { margin: 0 }).find(({ from, to }) => from <= at && at <= to)?.lose,
        );
        expect(charged).toEqual([expected, expected]);
      }),
      { numRuns: 1000 },
    );
  });
});
