import { describe, expect, test } from 'vitest';
import { largestDisagreements, pairReadings } from '@/lib/practicals/compare-readings';
import { predictedSheet } from '@/lib/practicals/own-record';
import { recordOfAll } from '../../support/own-readings';
import { defaultRubric, ticksOf } from '../../support/rubrics';

const rubric = defaultRubric();
const sheetOf = (off: Record<string, number>) => predictedSheet(rubric, recordOfAll(rubric, off));
const thirtySecond = ticksOf('1/32');

describe('own reading beside the bench’s', () => {
  test('pieces that changed places are paired by what they measure, each with both numbers', () => {
    const own = sheetOf({ 'end 1 length': -4 * thirtySecond });
    const bench = sheetOf({ 'end 2 length': -4 * thirtySecond });
    const ends = pairReadings(rubric, own, bench, thirtySecond).filter(
      ({ lineId, axis }) => lineId === 'end' && axis === 'length',
    );
    expect(ends.map(({ ordinal, ownOrdinal, apart }) => [ordinal, ownOrdinal, apart])).toEqual([
      [1, 2, 0],
      [2, 1, 0],
    ]);
  });

  test('the three furthest apart come first, the furthest of them first; equal ones in cut-list order', () => {
    const bench = sheetOf({});
    const own = sheetOf({
      'base 1 width': thirtySecond,
      'end 1 length': -3 * thirtySecond,
      'side 1 length': 2 * thirtySecond,
      'divider 2 width': thirtySecond,
    });
    const largest = largestDisagreements(pairReadings(rubric, own, bench, thirtySecond), 3);
    expect(largest.map(({ lineId, axis, apart }) => [lineId, axis, apart])).toEqual([
      ['end', 'length', 3 * thirtySecond],
      ['side', 'length', 2 * thirtySecond],
      ['base', 'width', thirtySecond],
    ]);
  });

  test('where all agree there is nothing to show, and without own readings nothing stands beside the bench’s', () => {
    const bench = sheetOf({});
    expect(largestDisagreements(pairReadings(rubric, sheetOf({}), bench, thirtySecond), 3)).toEqual([]);
    expect(pairReadings(rubric, null, bench, thirtySecond)).toHaveLength(27);
    expect(pairReadings(rubric, null, bench, thirtySecond).every(({ own }) => own === null)).toBe(true);
  });
});
