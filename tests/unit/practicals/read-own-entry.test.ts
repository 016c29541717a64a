import { describe, expect, test } from 'vitest';
import { type AskedReading, readOwnEntry } from '@/lib/practicals/read-own-entry';
import { ticksOf } from '../../support/rubrics';

const target = { thickness: ticksOf('1/2'), width: ticksOf('3 1/2'), length: ticksOf('7') };
const blank = { thickness: ticksOf('5/8'), width: ticksOf('6'), length: ticksOf('22 1/2') };

function enter(text: string, asked: AskedReading | null = null, unit: 'in' | 'mm' = 'in') {
  const context = {
    line: { target },
    axis: 'length',
    unit: 'in',
    grossLimit: ticksOf('1/4'),
    margin: 0,
    blank,
  } as const;
  return readOwnEntry({ text, unit, instrument: 'rule', cell: 'base/1/length', asked, context });
}

describe('an own reading as it is typed', () => {
  test.each([
    ['6 15/16', '6 15/16'],
    [' 6-15/16 ', '6 15/16'],
    ['6,9375', '6 15/16'],
    ['6¾', '6 3/4'],
    ['6 7/8"', '6 7/8'],
  ])('“%s” is kept as typed', (text, same) => {
    expect(enter(text)).toEqual({
      does: 'keep',
      ticks: ticksOf(same),
      source: { typed: text.trim(), unit: 'in', instrument: 'rule' },
    });
  });

  test('a unit in the text wins, and is the one that is kept', () => {
    expect(enter('177.8 mm')).toMatchObject({ does: 'keep', ticks: ticksOf('7'), source: { unit: 'mm' } });
    expect(enter('177.8', null, 'mm')).toMatchObject({
      does: 'keep',
      ticks: ticksOf('7'),
      source: { unit: 'mm' },
    });
  });

  test.each(['', 'seven', '1/0', '0', '-7', '40', '1/4'])('“%s” is refused with a reason', (text) => {
    const outcome = enter(text);
    expect(outcome.does).toBe('refuse');
    expect(outcome.does === 'refuse' && outcome.reason.length).toBeGreaterThan(10);
  });

  test('a far one is asked about, kept unchanged at the second press, and asked again for another size or number', () => {
    const first = enter('6');
    expect(first).toMatchObject({ does: 'ask', ticks: ticksOf('6') });
    expect(enter('6', { cell: 'base/1/length', ticks: ticksOf('6') })).toMatchObject({
      does: 'keep',
      ticks: ticksOf('6'),
    });
    expect(enter('6', { cell: 'base/1/width', ticks: ticksOf('6') }).does).toBe('ask');
    expect(enter('5', { cell: 'base/1/length', ticks: ticksOf('6') }).does).toBe('ask');
  });
});
