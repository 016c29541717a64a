import { describe, expect, it } from 'vitest';
import { differingStretches } from '@/components/rule/price-differences';
import { dearest, priceAt, priceSteps, rampOf } from '@/components/rule/price-steps';
import { graduationsOf } from '@/components/rule/rule-scale';
import { ruleSummary } from '@/components/rule/rule-summary';
import {
  priceBeyond,
  risePerPoint,
  stairOutline,
  treadsByColumn,
  treadsByEdge,
} from '@/components/rule/stairs';
import { TICKS_PER_INCH as IN } from '@/lib/length';
import type { SizeRule } from '@/lib/scoring';

const MARGIN = (2 * IN) / 1000;
const bands = (...prices: number[]) => prices.map((lose, nth) => ({ within: ((nth + 1) * IN) / 32, lose }));
const plain: SizeRule = {
  over: bands(0, 100, 200),
  under: bands(0, 100, 200),
  beyondOver: 300,
  beyondUnder: 300,
  cap: null,
};
const shortCostsDouble: SizeRule = { ...plain, under: bands(0, 200, 400), beyondUnder: 600 };
const scale = { unit: 'in', target: 4 * IN, graduation: IN / 32, span: 5 } as const;

describe('the price of a deviation on the rule', () => {
  const steps = priceSteps(plain, MARGIN);

  it('changes just past the band edge and its margin', () => {
    expect(priceAt(steps, IN / 32)).toBe(0);
    expect(priceAt(steps, IN / 32 + MARGIN)).toBe(0);
    expect(priceAt(steps, IN / 32 + MARGIN + 1)).toBe(100);
    expect(priceAt(steps, -(IN / 32 + MARGIN))).toBe(0);
    expect(priceAt(steps, -(IN / 32 + MARGIN + 1))).toBe(100);
    expect(priceAt(steps, 3 * IN)).toBe(300);
    expect(priceAt(steps, -3 * IN)).toBe(300);
  });

  it('is one free step round the target, whatever the number of bands', () => {
    expect(steps.filter((step) => step.lose === 0)).toHaveLength(1);
    expect(steps.map((step) => step.lose)).toEqual([300, 200, 100, 0, 100, 200, 300]);
  });

  it('never passes the cap', () => {
    expect(dearest(priceSteps({ ...shortCostsDouble, cap: 250 }, MARGIN))).toBe(250);
  });

  it('takes one tone a point, and the darkest for more than three', () => {
    expect([0, 1, 100, 101, 200, 300, 301, 900].map(rampOf)).toEqual([0, 1, 1, 2, 2, 3, 4, 4]);
  });
});

describe('the stair on a rule face', () => {
  const frame = { left: 0, right: 1100, centre: 550, pitch: 100 };

  it('has its risers at band edge plus margin where the axis is to scale', () => {
    const treads = treadsByEdge(priceSteps(plain, MARGIN), scale, frame);
    const free = treads.find((tread) => tread.lose === 0);
    expect(free?.right).toBeCloseTo(550 + 100 * (1 + MARGIN / (IN / 32)), 6);
    expect(treads[0]?.left).toBe(0);
    expect(treads.at(-1)?.right).toBe(1100);
  });

  it('fills whole columns where only graduations can be entered', () => {
    const treads = treadsByColumn(
      priceSteps(shortCostsDouble, MARGIN),
      graduationsOf(scale),
      (step) => (step + 5) * 100,
      100,
    );
    expect(treads.map(({ left, right, lose }) => [left, right, lose])).toEqual([
      [0, 200, 600],
      [200, 300, 400],
      [300, 400, 200],
      [400, 700, 0],
      [700, 800, 100],
      [800, 900, 200],
      [900, 1100, 300],
    ]);
  });

  it('keeps its usual rise until the dearest step would pass the limit', () => {
    expect(risePerPoint(300, 16, 64)).toBe(16);
    expect(risePerPoint(800, 16, 64)).toBe(8);
    expect(risePerPoint(0, 16, 64)).toBe(16);
  });

  it('draws one line over all its treads', () => {
    const treads = [
      { left: 0, right: 10, lose: 100, side: 'under' as const },
      { left: 10, right: 20, lose: 0, side: 'over' as const },
    ];
    expect(stairOutline(treads, 100, 16)).toBe('M0 84H10V100H20');
  });

  it('tells the cheapest and the dearest price past the shown stretch', () => {
    const steps = priceSteps(plain, MARGIN);
    expect(priceBeyond(steps, 'over', (5 * IN) / 32)).toEqual([300, 300]);
    expect(priceBeyond(steps, 'under', (2 * IN) / 32)).toEqual([100, 300]);
  });
});

describe('two price lists laid over each other', () => {
  it('differ exactly where their prices do', () => {
    const lists = [priceSteps(plain, MARGIN), priceSteps(shortCostsDouble, MARGIN)];
    expect(differingStretches(lists, (5 * IN) / 32)).toEqual([
      { from: -(5 * IN) / 32, to: -(IN / 32 + MARGIN + 1) },
    ]);
  });

  it('do not differ from themselves', () => {
    expect(differingStretches([priceSteps(plain, MARGIN), priceSteps(plain, MARGIN)], IN)).toEqual([]);
  });
});

describe('a rule face in words', () => {
  it('tells both sides once where they cost the same, and what each reading loses', () => {
    const steps = priceSteps(plain, MARGIN);
    const pointers = [{ kind: 'bench', ticks: 4 * IN - IN / 16 } as const];
    expect(
      ruleSummary({ unit: 'in', target: 4 * IN, rule: plain, steps, pointers, label: 'end 2, length' }),
    ).toBe(
      'end 2, length: target four inches. Over or under: within one thirty-second of an inch loses 0, ' +
        'within one sixteenth of an inch loses 1, within three thirty-seconds of an inch loses 2, beyond loses 3. ' +
        'Bench reading one sixteenth of an inch under, loses 1.',
    );
  });

  it('tells the sides apart where they cost differently', () => {
    const steps = priceSteps(shortCostsDouble, MARGIN);
    const words = ruleSummary({ unit: 'in', target: 4 * IN, rule: shortCostsDouble, steps });
    expect(words).toContain('Under: within');
    expect(words).toContain('beyond loses 6. Over:');
  });
});
