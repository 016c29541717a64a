import { describe, expect, it } from 'vitest';
import { type CellState, cellInWords } from '@/components/rule/cell-state';
import { scoreStretch } from '@/components/rule/score-rule';
import { TICKS_PER_INCH as IN } from '@/lib/length';

describe('a size cell in words', () => {
  const cases: [CellState, string][] = [
    [{ kind: 'unread' }, 'not read, target three and one half inches'],
    [{ kind: 'gauged' }, 'gauged'],
    [{ kind: 'value', deviation: -IN / 16, lose: 100 }, 'one sixteenth of an inch under, loses 1'],
    [{ kind: 'value', deviation: 0 }, 'on target'],
    [{ kind: 'spoiled', lose: 300 }, 'spoiled, loses 3'],
    [{ kind: 'held' }, 'held'],
    [{ kind: 'missing' }, 'missing'],
    [{ kind: 'excused' }, 'excused'],
    [
      { kind: 'conflict', readings: [IN / 32, 'gauged'] },
      'two readings: one thirty-second of an inch over, and gauged',
    ],
  ];

  it.each(cases)('tells every state apart: %j', (state, words) => {
    expect(cellInWords(state, 3.5 * IN, 'in')).toBe(words);
  });
});

describe('the stretch of a score rule', () => {
  it.each([
    [10_000, [8413, 9206], [75, 100]],
    [10_000, [6700, 9000], [65, 100]],
    [10_000, [10_200], [75, 102]],
    [10_000, [0], [0, 100]],
    [4500, [4100], [20, 45]],
  ])('holds the total of %d and the figures %j', (total, figures, stretch) => {
    expect(scoreStretch(total, figures)).toEqual(stretch);
  });
});
