import { describe, expect, test } from 'vitest';
import { lengthPattern } from '@/lib/practicals/length-pattern';
import { type Attempt, type Rubric, scoreAttempt } from '@/lib/scoring';
import { defaultRubric, ticksOf } from '../../support/rubrics';

const STICKS: [string, number, string][] = [['stick', 7, '1/2 x 1 x 7']];
const rubric = defaultRubric(STICKS);

/** Sticks whose lengths are off by so much; null: gauged. */
function sticks(lengths: readonly (string | null)[], by: Rubric = rubric) {
  const attempt: Attempt = {
    pieces: lengths.map((off, index) => ({
      lineId: 'stick',
      ordinal: index + 1,
      state: 'present',
      sizes: {
        length: off === null ? { kind: 'gauged' } : { kind: 'value', ticks: ticksOf('7') + offTicks(off) },
      },
      checks: {},
    })),
    work: {},
    bonus: 0,
    daysLate: 0,
  };
  return lengthPattern(by, scoreAttempt(by, attempt));
}

function offTicks(text: string): number {
  return text.startsWith('-') ? -ticksOf(text.slice(1)) : text === '0' ? 0 : ticksOf(text);
}

describe('how lengths lean', () => {
  test('three short by a sixteenth say so, and by how much at least', () => {
    expect(sticks(['-1/16', '-3/32', '-1/16'])).toEqual({
      of: 3,
      short: 3,
      long: 0,
      leans: 'short',
      byAtLeast: ticksOf('1/16'),
    });
  });

  test('two say nothing, nor do two and any number that were gauged', () => {
    expect(sticks(['-1/16', '-1/16'])).toBeNull();
    expect(sticks(['-1/16', '-1/16', null, null, null])).toBeNull();
  });

  test('exactly four of five lean; three of four do not', () => {
    expect(sticks(['-1/16', '-1/16', '-1/16', '-1/16', '1/16'])?.leans).toBe('short');
    expect(sticks(['-1/16', '-1/16', '-1/16', '0'])?.leans).toBeNull();
  });

  test('long lengths lean the other way', () => {
    expect(sticks(['1/32', '1/32', '1/16', '0', '1/32'])).toMatchObject({
      leans: 'long',
      long: 4,
      byAtLeast: ticksOf('1/32'),
    });
  });

  test('what lies within the reading margin is off to no side', () => {
    expect(sticks(['-0.002', '-0.002', '-0.002'])).toMatchObject({ short: 0, leans: null });
    expect(sticks(['-0.0021', '-0.0021', '-0.0021'])).toMatchObject({
      short: 3,
      leans: 'short',
      byAtLeast: null,
    });
  });

  test('the least is told in whole 64ths, rounded down', () => {
    expect(sticks(['-0.05', '-0.06', '-0.07'])?.byAtLeast).toBe(ticksOf('3/64'));
  });

  test('a piece that is not that part has no say', () => {
    expect(sticks(['-1/16', '-1/16', '-1'])).toBeNull();
  });
});
