import { describe, expect, it } from 'vitest';
import { deviationAsText, exactStyle, lengthAsText, lengthParts } from '@/components/ui/length-parts';
import { TICKS_PER_INCH as IN, TICKS_PER_MM as MM } from '@/lib/length';

describe('taking a length apart for setting', () => {
  it.each([
    [3.5 * IN, { sign: '', whole: '3', num: 1, den: 2 }],
    [22 * IN + (17 * IN) / 32, { sign: '', whole: '22', num: 17, den: 32 }],
    [IN / 2, { sign: '', whole: '', num: 1, den: 2 }],
    [7 * IN, { sign: '', whole: '7', num: null, den: null }],
    [0, { sign: '', whole: '0', num: null, den: null }],
    [(127 * IN) / 128, { sign: '', whole: '', num: 127, den: 128 }],
    [(512 * IN) / 1000, { sign: '', whole: '0.512', num: null, den: null }],
  ])('splits %d ticks in inches into whole and fraction', (ticks, parts) => {
    expect(lengthParts(ticks, 'in')).toEqual(parts);
  });

  it.each([
    [-IN / 16, { sign: '−', whole: '', num: 1, den: 16 }],
    [(3 * IN) / 32, { sign: '+', whole: '', num: 3, den: 32 }],
    [-(IN + IN / 8), { sign: '−', whole: '1', num: 1, den: 8 }],
    [0, { sign: '', whole: '0', num: null, den: null }],
  ])('keeps the sign of a deviation of %d ticks apart', (ticks, parts) => {
    expect(lengthParts(ticks, 'in', {}, true)).toEqual(parts);
  });

  it('writes a length below zero with a minus sign, not a hyphen', () => {
    expect(lengthParts(-IN / 32, 'in')).toEqual({ sign: '−', whole: '', num: 1, den: 32 });
    expect(lengthAsText(-3 * MM, 'mm')).toBe('−3');
  });

  it.each([
    [180 * MM, '180'],
    [180.5 * MM, '180.5'],
    [19.05 * MM, '19.05'],
    [12.345 * MM, '12.345'],
  ])('writes %d ticks in millimetres as short as they stay exact', (ticks, text) => {
    expect(lengthAsText(ticks, 'mm')).toBe(text);
  });

  it('prefers the coarsest fraction, then thousandths, then ten-thousandths of an inch', () => {
    expect(exactStyle(3.5 * IN, 'in')).toEqual({ denominator: 2 });
    expect(exactStyle((11 * IN) / 32, 'in')).toEqual({ denominator: 32 });
    expect(exactStyle((21 * IN) / 1000, 'in')).toEqual({ decimals: 3 });
    expect(exactStyle((5 * IN) / 10_000, 'in')).toEqual({ decimals: 4 });
  });

  it('says a deviation in short plain words', () => {
    expect(deviationAsText(IN / 32, 'in')).toBe('1/32 over');
    expect(deviationAsText(-2.5 * MM, 'mm')).toBe('2.5 under');
    expect(deviationAsText(0, 'in')).toBe('on target');
  });
});
