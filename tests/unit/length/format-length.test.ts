import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatDeviation,
  formatLength,
  type LengthFormat,
  MAX_LENGTH,
  parseLength,
  TICKS_PER_INCH,
  TICKS_PER_MM,
} from '@/lib/length';

const DENOMINATORS = [2, 4, 8, 16, 32, 64, 128] as const;
const inch = (count: number) => count * TICKS_PER_INCH;

describe('a length in ruler fractions', () => {
  it.each([
    [349_250_000, 64, '1 3/8'],
    [inch(0.75), 64, '3/4'],
    [0, 64, '0'],
    [-inch(1) / 32, 32, '-1/32'],
    [inch(2), 2, '2'],
    [-inch(1.5), 8, '-1 1/2'],
    [inch(127) / 128, 128, '127/128'],
    [inch(12), 16, '12'],
    [inch(0.375), 2, '1/2'],
    [inch(0.25) - 1, 2, '0'],
    [-inch(0.25) + 1, 2, '0'],
    [inch(0.9999), 64, '1'],
  ] as const)('%i ticks to 1/%i is %s', (ticks, denominator, text) => {
    expect(formatLength(ticks, { unit: 'in', denominator })).toBe(text);
  });

  it.each([2, 4, 8, 16, 32, 64] as const)(
    'rounds a tie of 1/%i away from zero on both sides',
    (denominator) => {
      const half = inch(1) / denominator / 2;
      expect(formatLength(half, { unit: 'in', denominator })).toBe(`1/${denominator}`);
      expect(formatLength(-half, { unit: 'in', denominator })).toBe(`-1/${denominator}`);
      expect(formatLength(half - 1, { unit: 'in', denominator })).toBe('0');
    },
  );
});

describe('a length in decimals', () => {
  it.each([
    [inch(1.375), 'in', 3, '1.375'],
    [inch(1.375), 'in', 0, '1'],
    [inch(1.5), 'in', 0, '2'],
    [-inch(1.5), 'in', 0, '-2'],
    [190_500_000, 'mm', 2, '19.05'],
    [190_500_000, 'mm', 1, '19.1'],
    [-190_500_000, 'mm', 1, '-19.1'],
    [190_500_000, 'mm', 10, '19.0500000000'],
    [0, 'mm', 0, '0'],
    [0, 'mm', 2, '0.00'],
    [1, 'mm', 7, '0.0000001'],
    [-1, 'mm', 7, '-0.0000001'],
    [-49_999, 'mm', 2, '0.00'],
    [-50_000, 'mm', 2, '-0.01'],
    [127, 'in', 6, '0.000001'],
    [126, 'in', 6, '0.000000'],
    [MAX_LENGTH, 'in', 10, '393.7007874016'],
    [MAX_LENGTH, 'mm', 10, '10000.0000000000'],
  ] as const)('%i ticks in %s with %i decimals is %s', (ticks, unit, decimals, text) => {
    expect(formatLength(ticks, { unit, decimals })).toBe(text);
  });

  it('has no sign for a negative zero', () => {
    expect(formatLength(-0, { unit: 'mm', decimals: 1 })).toBe('0.0');
    expect(formatLength(-0, { unit: 'in', denominator: 8 })).toBe('0');
  });
});

describe('a deviation', () => {
  it.each([
    [inch(1) / 32, { unit: 'in', denominator: 32 }, '+1/32'],
    [-15_875_000, { unit: 'in', denominator: 32 }, '\u22121/16'],
    [inch(1.25), { unit: 'in', denominator: 4 }, '+1 1/4'],
    [5_000_000, { unit: 'mm', decimals: 2 }, '+0.50'],
    [-5_000_000, { unit: 'mm', decimals: 2 }, '\u22120.50'],
    [0, { unit: 'in', denominator: 32 }, '0'],
    [0, { unit: 'mm', decimals: 2 }, '0.00'],
    [-1, { unit: 'mm', decimals: 2 }, '0.00'],
    [1, { unit: 'in', denominator: 128 }, '0'],
  ] satisfies [number, LengthFormat, string][])('%i ticks as %o is %s', (ticks, format, text) => {
    expect(formatDeviation(ticks, format)).toBe(text);
  });

  it('is the length with a sign put before it, for every length', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -MAX_LENGTH, max: MAX_LENGTH }),
        fc.integer({ min: 0, max: 10 }),
        (ticks, decimals) => {
          const length = formatLength(Math.abs(ticks), { unit: 'mm', decimals });
          const zero = /^[0.]+$/.test(length);
          const sign = zero ? '' : ticks < 0 ? '\u2212' : '+';
          expect(formatDeviation(ticks, { unit: 'mm', decimals })).toBe(sign + length);
        },
      ),
    );
  });
});

describe('a format that cannot be', () => {
  const bad: [string, unknown][] = [
    ['neither denominator nor decimals', { unit: 'in' }],
    ['both', { unit: 'in', denominator: 16, decimals: 2 }],
    ['fractions of a millimetre', { unit: 'mm', denominator: 16 }],
    ['a denominator that is on no rule', { unit: 'in', denominator: 3 }],
    ['a denominator of 1', { unit: 'in', denominator: 1 }],
    ['a denominator of 256', { unit: 'in', denominator: 256 }],
    ['negative decimals', { unit: 'in', decimals: -1 }],
    ['eleven decimals', { unit: 'in', decimals: 11 }],
    ['decimals that are not whole', { unit: 'in', decimals: 1.5 }],
    ['decimals that are no number', { unit: 'in', decimals: Number.NaN }],
  ];

  it.each(bad)('is refused: %s', (_, format) => {
    // The bad formats are the point here; the types would not let them be written.
    const given = format as LengthFormat;
    expect(() => formatLength(0, given)).toThrow(RangeError);
    expect(() => formatDeviation(0, given)).toThrow(RangeError);
  });

  it.each([0.5, Number.NaN, Number.POSITIVE_INFINITY, 2 ** 53])('is refused for %d ticks', (ticks) => {
    expect(() => formatLength(ticks, { unit: 'mm', decimals: 1 })).toThrow(RangeError);
  });
});

describe('a formatted length', () => {
  it('is read back exactly, for every ruler fraction to 10 m', () => {
    const arb = fc.constantFrom(...DENOMINATORS).chain((denominator) =>
      fc.record({
        denominator: fc.constant(denominator),
        steps: fc.integer({ min: -393 * denominator, max: 393 * denominator }),
      }),
    );
    fc.assert(
      fc.property(arb, ({ denominator, steps }) => {
        const ticks = (steps * TICKS_PER_INCH) / denominator;
        const text = formatLength(ticks, { unit: 'in', denominator });
        expect(parseLength(text, 'in')).toEqual({ ok: true, ticks: ticks + 0, unit: 'in' });
      }),
      { numRuns: 500 },
    );
  });

  it.each([
    ['mm', TICKS_PER_MM, 7],
    ['in', TICKS_PER_INCH, 6],
  ] as const)(
    'is read back exactly, for every length in %s on a grid of decimals to 10 m',
    (unit, ticksPerUnit, finest) => {
      const arb = fc.integer({ min: 0, max: finest }).chain((decimals) => {
        const step = ticksPerUnit / 10 ** decimals;
        const most = Math.floor(MAX_LENGTH / step);
        return fc.record({
          decimals: fc.integer({ min: decimals, max: 10 }),
          ticks: fc.integer({ min: -most, max: most }).map((steps) => steps * step + 0),
        });
      });
      fc.assert(
        fc.property(arb, ({ decimals, ticks }) => {
          const text = formatLength(ticks, { unit, decimals });
          expect(parseLength(text, unit)).toEqual({ ok: true, ticks, unit });
        }),
        { numRuns: 500 },
      );
    },
  );
});
