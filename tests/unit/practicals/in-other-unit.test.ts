import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH, parseLength, TICKS_PER_INCH, type Unit } from '@/lib/length';
import { inOtherUnit } from '@/lib/practicals/in-other-unit';
import { ticksOf } from '@/tests/support/rubrics';

/**
 * 1 in = 25.4 mm exactly: NIST Special Publication 811, appendix B.8 (inch to metre, 2.54 E-02, exact), as agreed by
 * the national laboratories in 1959. Fractions are the oracle; no decimal of the product's is used to make one.
 */
const MM_PER_INCH = new Fraction(254, 10);

/** The length in the other unit as a fraction. */
function otherOf(ticks: number, unit: Unit): Fraction {
  const mm = new Fraction(ticks).div(10_000_000);
  return unit === 'in' ? mm : mm.div(MM_PER_INCH);
}

const endsInDecimals = (value: Fraction): boolean => {
  let rest = value.d;
  for (const prime of [2n, 5n]) while (rest % prime === 0n) rest /= prime;
  return rest === 1n;
};

const ticksArb = fc.oneof(
  fc.integer({ min: 0, max: MAX_LENGTH }),
  fc.integer({ min: 0, max: 78_000_000 }).map((count) => count * 127),
  fc.integer({ min: 0, max: 50_000 }).map((count) => (count * TICKS_PER_INCH) / 128),
);

describe('a length in the other unit', () => {
  it.each([
    ['3/4', 'in', '19.05', true],
    ['1', 'in', '25.4', true],
    ['1/64', 'in', '0.396875', true],
    ['1/128', 'in', '0.1984375', true],
    ['0.002', 'in', '0.0508', true],
    ['0', 'in', '0', true],
    ['25.4', 'mm', '1', true],
    ['12.7', 'mm', '0.5', true],
    ['0.3175', 'mm', '0.0125', true],
    // 35/25.4 = 1.377952…, 10/25.4 = 0.393700…, 560/25.4 = 22.047244…
    ['35', 'mm', '1.3780', false],
    ['10', 'mm', '0.3937', false],
    ['560', 'mm', '22.0472', false],
  ] as const)('%s %s is %s (exactly: %s)', (typed, unit, text, exact) => {
    const other = unit === 'in' ? 'mm' : 'in';
    expect(inOtherUnit(ticksOf(typed, unit), unit)).toEqual({ text, unit: other, exact });
  });

  it('says that it is exact when it is, and only then', () => {
    fc.assert(
      fc.property(ticksArb, fc.constantFrom('in' as const, 'mm' as const), (ticks, unit) => {
        const { exact, text } = inOtherUnit(ticks, unit);
        const value = otherOf(ticks, unit);
        expect(exact).toBe(endsInDecimals(value));
        expect(new Fraction(text).equals(value)).toBe(exact);
      }),
      { numRuns: 2000 },
    );
  });

  it('is otherwise the nearest ten-thousandth, and never further off than half of one', () => {
    fc.assert(
      fc.property(ticksArb, (ticks) => {
        const { exact, text } = inOtherUnit(ticks, 'mm');
        if (exact) return;
        expect(text).toMatch(/^\d+\.\d{4}$/);
        const off = new Fraction(text).sub(otherOf(ticks, 'mm')).abs();
        expect(off.compare(new Fraction(1, 20_000))).toBeLessThanOrEqual(0);
      }),
      { numRuns: 2000 },
    );
  });

  it('comes back to the very same length where it is exact', () => {
    fc.assert(
      fc.property(ticksArb, fc.constantFrom('in' as const, 'mm' as const), (ticks, unit) => {
        const other = inOtherUnit(ticks, unit);
        if (other.exact) expect(parseLength(other.text, other.unit)).toMatchObject({ ok: true, ticks });
      }),
      { numRuns: 1000 },
    );
  });
});
