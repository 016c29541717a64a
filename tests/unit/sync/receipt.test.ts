import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { receiptOf } from '@/lib/sync/receipt';
import { ownEvent, readAll, sizeCell } from '../../support/own-readings';
import { defaultRubric, ticksOf } from '../../support/rubrics';

const rubric = defaultRubric();
const ATTEMPT = '5b1f2d3c-0000-4000-8000-000000000001';

describe('the receipt of a lock', () => {
  test('is eight symbols that are not mistaken for one another, four and four', async () => {
    expect(await receiptOf(ATTEMPT, readAll(rubric))).toMatch(
      /^[23456789ABCDEFGHJKMNPQRSTVWXYZ]{4}-[23456789ABCDEFGHJKMNPQRSTVWXYZ]{4}$/,
    );
  });

  test('is the same for the same readings, in whatever order they came', async () => {
    const events = readAll(rubric);
    const receipt = await receiptOf(ATTEMPT, events);
    await fc.assert(
      fc.asyncProperty(fc.shuffledSubarray(events, { minLength: events.length }), async (shuffled) => {
        expect(await receiptOf(ATTEMPT, shuffled)).toBe(receipt);
      }),
      { numRuns: 20 },
    );
  });

  test('is another for one changed reading, and for another attempt', async () => {
    const receipt = await receiptOf(ATTEMPT, readAll(rubric));
    const changed = readAll(rubric, { 'base 1 length': ticksOf('1/64') });
    expect(await receiptOf(ATTEMPT, changed)).not.toBe(receipt);
    expect(await receiptOf(ATTEMPT.replace(/1$/, '2'), readAll(rubric))).not.toBe(receipt);
  });

  test('follows what stands: a reading that was replaced or taken back leaves no trace, nor does a lock or the bench', async () => {
    const cell = sizeCell('base', 1, 'length');
    const first = ownEvent(cell, { kind: 'value', ticks: ticksOf('6') });
    const second = ownEvent(cell, { kind: 'value', ticks: ticksOf('7') }, { supersedes: [first.id] });
    const alone = await receiptOf(ATTEMPT, [ownEvent(cell, { kind: 'value', ticks: ticksOf('7') })]);
    expect(await receiptOf(ATTEMPT, [first, second])).toBe(alone);
    const width = ownEvent(sizeCell('base', 1, 'width'), { kind: 'cleared' });
    const lock = ownEvent(
      { lineId: '', ordinal: 0, what: '@lock' },
      { kind: 'lock', locked: true, receipt: alone },
    );
    const bench = ownEvent(cell, { kind: 'gauged' }, { side: 'bench' });
    expect(await receiptOf(ATTEMPT, [second, width, lock, bench])).toBe(alone);
  });
});
