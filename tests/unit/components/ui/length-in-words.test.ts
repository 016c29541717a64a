import { describe, expect, it } from 'vitest';
import { deviationInWords, lengthInWords } from '@/components/ui/length-in-words';
import { pointsAsText } from '@/components/ui/points-text';
import { TICKS_PER_INCH as IN, TICKS_PER_MM as MM } from '@/lib/length';

describe('a length as it is said', () => {
  it.each([
    [IN + (3 * IN) / 8, 'one and three eighths inches'],
    [IN / 2, 'one half inch'],
    [(3 * IN) / 4, 'three quarters of an inch'],
    [IN / 4, 'one quarter of an inch'],
    [(17 * IN) / 32, 'seventeen thirty-seconds of an inch'],
    [22 * IN + (63 * IN) / 64, 'twenty-two and sixty-three sixty-fourths inches'],
    [IN, 'one inch'],
    [7 * IN, 'seven inches'],
    [0, 'zero inches'],
    [130 * IN, 'one hundred thirty inches'],
    [(512 * IN) / 1000, '0.512 inches'],
    [-IN / 32, 'minus one thirty-second of an inch'],
  ])('says %d ticks in inches', (ticks, words) => {
    expect(lengthInWords(ticks, 'in')).toBe(words);
  });

  it.each([
    [MM, 'one millimetre'],
    [180 * MM, 'one hundred eighty millimetres'],
    [19.05 * MM, '19.05 millimetres'],
  ])('says %d ticks in millimetres', (ticks, words) => {
    expect(lengthInWords(ticks, 'mm')).toBe(words);
  });

  it('says on which side a deviation lies', () => {
    expect(deviationInWords(-IN / 16, 'in')).toBe('one sixteenth of an inch under');
    expect(deviationInWords(0.5 * MM, 'mm')).toBe('0.5 millimetres over');
    expect(deviationInWords(0, 'in')).toBe('on target');
  });
});

describe('points as they are written', () => {
  it.each([
    [0, '0'],
    [100, '1'],
    [150, '1.5'],
    [222, '2.22'],
    [10_000, '100'],
    [-530, '−5.3'],
  ])('writes %d hundredths', (points, text) => {
    expect(pointsAsText(points)).toBe(text);
  });
});
