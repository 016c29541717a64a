import { describe, expect, test } from 'vitest';
import { neighbours, ruleScale } from '@/lib/round/rule-scale';
import type { Line, Rubric } from '@/lib/scoring';
import { defaultRubric, SIX_STICKS_MM, ticksOf } from '../../support/rubrics';

function lineOf(rubric: Rubric, id: string): Line {
  const line = rubric.lines.find((each) => each.id === id);
  if (!line) throw new Error(`no line ${id}`);
  return line;
}

function withEdges(edges: string[]): { rubric: Rubric; line: Line } {
  const rubric = defaultRubric();
  const bands = edges.map((edge, index) => ({ within: ticksOf(edge), lose: index * 100 }));
  const rule = { over: bands, under: bands, beyondOver: 900, beyondUnder: 900, cap: null };
  return {
    rubric,
    line: { ...lineOf(rubric, 'end'), sizes: { thickness: rule, width: rule, length: rule } },
  };
}

describe('the rule on which a size is read', () => {
  test('eleven graduations of 1/32 round the target, each with its price', () => {
    const rubric = defaultRubric();
    const scale = ruleScale(rubric, lineOf(rubric, 'end'), 'width');
    expect(scale?.graduations.map(({ text }) => text)).toEqual([
      ...['3 11/32', '3 3/8', '3 13/32', '3 7/16', '3 15/32'],
      '3 1/2',
      ...['3 17/32', '3 9/16', '3 19/32', '3 5/8', '3 21/32'],
    ]);
    expect(scale?.graduations.map(({ lose }) => lose / 100)).toEqual([3, 3, 2, 1, 0, 0, 0, 1, 2, 3, 3]);
    expect([scale?.farUnder, scale?.farOver]).toEqual([300, 300]);
  });

  test('half millimetres on a rubric in millimetres', () => {
    const rubric = defaultRubric(SIX_STICKS_MM, 'mm');
    const scale = ruleScale(rubric, lineOf(rubric, 'stem'), 'length');
    expect(scale?.graduations.map(({ text }) => text)).toEqual([
      '217.5',
      '218',
      '218.5',
      '219',
      '219.5',
      '220',
      '220.5',
      '221',
      '221.5',
      '222',
      '222.5',
    ]);
    expect(scale?.graduations.map(({ lose }) => lose / 100)).toEqual([3, 2, 2, 1, 0, 0, 0, 1, 2, 2, 3]);
  });

  test.each([
    [['1/64', '1/32', '3/64'], '1/64'],
    [['1/16', '1/8'], '1/32'],
    [['1/16', '1/8', '3/16'], '1/16'],
  ])('edges at %j are read on a rule of %s', (edges, step) => {
    const { rubric, line } = withEdges(edges);
    expect(ruleScale(rubric, line, 'width')?.step).toBe(ticksOf(step));
  });

  test.each([
    ['edges on no graduation', ['0.01', '0.02']],
    ['more than eleven graduations', ['1/64', '1/32', '3/16']],
  ])('%s: the keypad serves', (_, edges) => {
    const { rubric, line } = withEdges(edges);
    expect(ruleScale(rubric, line, 'width')).toBeNull();
    expect(neighbours(rubric, line, 'width')).toHaveLength(9);
  });

  test('a target between graduations, and one too thin for five below it, are left to the keypad', () => {
    const { rubric, line } = withEdges(['1/32']);
    const odd = { ...line, target: { ...line.target, width: ticksOf('3.51') } };
    expect(ruleScale(rubric, odd, 'width')).toBeNull();
    const thin = { ...line, target: { ...line.target, width: ticksOf('1/8') } };
    expect(ruleScale(rubric, thin, 'width')).toBeNull();
    expect(neighbours(rubric, thin, 'width').every(({ ticks }) => ticks > 0)).toBe(true);
  });
});
