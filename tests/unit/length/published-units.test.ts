import { describe, expect, it } from 'vitest';
import { formatLength, MAX_LENGTH, parseLength, TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';

const ticksOf = (text: string) => {
  const parsed = parseLength(text, 'in');
  return parsed.ok ? parsed.ticks : Number.NaN;
};

/** Source: the 1959 agreement of the national laboratories; NIST SP 811 App. B.8 and HB 44 App. C (clauses from memory). */
describe('the international inch', () => {
  it.each([
    ['1 in', '25.4 mm'],
    ['1/64 in', '0.396875 mm'],
    ['1/32 in', '0.79375 mm'],
    ['1/16 in', '1.5875 mm'],
    ['3/4 in', '19.05 mm'],
  ])('%s is %s, tick for tick', (inches, millimetres) => {
    expect(ticksOf(inches)).toBe(ticksOf(millimetres));
    expect(Number.isInteger(ticksOf(inches))).toBe(true);
  });

  it('makes every graduation of a shop instrument a whole number of ticks', () => {
    expect(TICKS_PER_INCH).toBe(254_000_000);
    expect(TICKS_PER_MM).toBe(10_000_000);
    expect(MAX_LENGTH).toBe(100_000_000_000);
    expect(ticksOf('1/128 in')).toBe(1_984_375);
    expect(ticksOf('0.0001 in')).toBe(25_400);
  });
});

/** Source: the US survey inch and foot in GNU units 2.22 and UCUM `[in_us]`. */
describe('the survey inch', () => {
  it.each([
    ['1 in', 25.4000508001016],
    ["1'", 304.800609601219],
  ])('is not what %s means', (text, surveyMillimetres) => {
    const surveyTicks = Math.round(surveyMillimetres * TICKS_PER_MM);
    expect(surveyTicks - ticksOf(text)).toBeGreaterThan(500);
  });
});

/** Rational arithmetic. The error is what the fraction is longer than the length, in millimetres. */
describe('the nearest ruler fraction of a metric length', () => {
  it.each([
    ['18 mm', 64, '45/64', '-0.140625 mm'],
    ['12 mm', 64, '15/32', '-0.09375 mm'],
    ['1 mm', 64, '3/64', '0.190625 mm'],
    ['100 mm', 64, '3 15/16', '0.0125 mm'],
    ['305 mm', 64, '12 1/64', '0.196875 mm'],
    ['18 mm', 16, '11/16', '-0.5375 mm'],
    ['25 mm', 16, '1', '0.4 mm'],
  ] as const)('%s to 1/%i is %s', (text, denominator, fraction, error) => {
    expect(formatLength(ticksOf(text), { unit: 'in', denominator })).toBe(fraction);
    expect(ticksOf(fraction) - ticksOf(text)).toBe(ticksOf(error));
  });

  it('of 0.7578125 in, halfway between 48/64 and 49/64, is 49/64: a tie goes away from zero, not to even', () => {
    // NIST SP 811 B.7.1 (from memory) rounds such a tie to even; this product's rule is away from zero.
    expect(formatLength(ticksOf('0.7578125'), { unit: 'in', denominator: 64 })).toBe('49/64');
    expect(formatLength(ticksOf('-0.7578125'), { unit: 'in', denominator: 64 })).toBe('-49/64');
  });
});

/** Common practice of the trade; the values by rational arithmetic. */
describe('three and a half inches', () => {
  it.each(['3 1/2', '3-1/2', '7/2', '3.5', '3½', '3 1/2"'])('written %j is 224/64', (text) => {
    expect(ticksOf(text)).toBe((224 * TICKS_PER_INCH) / 64);
  });

  it.each(['1/0', '3/', '1//2', '-'])('is not taken from %j', (text) => {
    expect(parseLength(text, 'in').ok).toBe(false);
  });
});
