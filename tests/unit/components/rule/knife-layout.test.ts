import { describe, expect, it } from 'vitest';
import { type KnifeEdge, layOutKnives } from '@/components/rule/knife-layout';
import { layOutRule, numberFits } from '@/components/rule/rule-layout';
import { TICKS_PER_INCH } from '@/lib/length';

const G = TICKS_PER_INCH / 32;
const scale = { unit: 'in', target: 7 * TICKS_PER_INCH, graduation: G, span: 6 } as const;
const edges = (turns: number[]): KnifeEdge[] =>
  (['under', 'over'] as const).flatMap((side) => turns.map((turn) => ({ side, within: turn * G })));

/** Tabs that cover each other, or that a neighbour's blade runs through. */
function covered({ knives }: ReturnType<typeof layOutKnives>): number {
  let count = 0;
  for (const [index, one] of knives.entries()) {
    for (const other of knives.slice(index + 1)) {
      const beside = one.tab.x + one.tab.width <= other.tab.x || other.tab.x + other.tab.width <= one.tab.x;
      const apart = one.tab.y + one.tab.height <= other.tab.y || other.tab.y + other.tab.height <= one.tab.y;
      if (!beside && !apart) count += 1;
    }
  }
  return count;
}

describe('knives on the rule', () => {
  it('stand in one row where there is room, each on its line and outwards of it', () => {
    const { knives, layout } = layOutKnives('wide', scale, edges([1, 2, 3]));
    expect(new Set(knives.map(({ tab }) => tab.y)).size).toBe(1);
    for (const { edge, x, tab } of knives) {
      expect(edge.side === 'under' ? tab.x + tab.width : tab.x).toBe(x);
      expect(Math.abs(x - layout.centre) / layout.pitch).toBeCloseTo(edge.within / G, 6);
    }
  });

  it.each(['card', 'phone'] as const)(
    'stand in tiers on a %s, the inner ones higher, none over another',
    (variant) => {
      const laid = layOutKnives(variant, scale, edges([1, 2, 3]));
      expect(covered(laid)).toBe(0);
      const over = laid.knives.filter(({ edge }) => edge.side === 'over').map(({ tab }) => tab.y);
      expect(over).toEqual([...over].sort((a, b) => a - b));
      expect(Math.min(...over)).toBeGreaterThanOrEqual(0);
      expect(laid.layout.edge).toBeGreaterThan(layOutKnives(variant, scale, edges([1])).layout.edge);
    },
  );

  it('take no more than four tiers, however many there are', () => {
    const { knives } = layOutKnives('phone', { ...scale, span: 13 }, edges([1, 2, 3, 4, 5, 6, 7, 8]));
    expect(new Set(knives.map(({ tab }) => tab.y)).size).toBe(4);
  });
});

describe('a number on the rule', () => {
  it('is left out where it would run over the end of the paper', () => {
    const narrow = { ...scale, span: 6, graduation: TICKS_PER_INCH / 32 };
    const layout = layOutRule('phone', narrow);
    const parts = { sign: '', whole: '6', num: 13, den: 16 } as const;
    expect(numberFits(parts, layout.centre, layout)).toBe(true);
    expect(numberFits(parts, layout.centre - 6 * layout.pitch, layout)).toBe(false);
  });
});
