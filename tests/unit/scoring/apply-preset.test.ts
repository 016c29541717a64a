import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Unit } from '@/lib/length';
import {
  AXES,
  applyPreset,
  bandsFromRate,
  compileRubric,
  defaultRubricForm,
  PRESET_IDS,
  type PresetId,
  type RubricForm,
  rubricFormSchema,
  type SizeRule,
  scoreAttempt,
} from '@/lib/scoring';
import { sizeRuleArb } from '../../support/scoring-arbitraries';
import { makeAttempt, makePiece, makeRule, sixtyFourths } from '../../support/scoring-examples';

const target = { thickness: sixtyFourths(48), width: sixtyFourths(96), length: sixtyFourths(256) };
const cutList = { lines: [{ id: 'base', label: 'Base', quantity: 1, target }] };

/** What a base loses that is off in length by so many 64ths. */
function loseAt(form: RubricForm, off: number): number | undefined {
  const piece = makePiece('base', 1, { length: target.length + sixtyFourths(off) });
  return scoreAttempt(compileRubric(form, cutList), makeAttempt([piece])).pieces[0]?.sizes?.length.lose;
}

function withRule(rule: SizeRule): RubricForm {
  const form = defaultRubricForm('in');
  form.defaults.sizes = { thickness: rule, width: rule, length: rule };
  return form;
}

const prices = (form: RubricForm) => [-9, -5, -3, -1, 0, 1, 3, 5, 9].map((off) => loseAt(form, off));

describe('a preset', () => {
  it('gives the example of its description', () => {
    expect(applyPreset(defaultRubricForm('in'), 'start-from-100').start).toBe(10_000);
  });

  it.each<[PresetId, (number | undefined)[]]>([
    ['undersize-doubles', [600, 400, 200, 0, 0, 0, 100, 200, 300]],
    ['oversize-doubles', [300, 200, 100, 0, 0, 0, 200, 400, 600]],
    ['rate-per-step', [300, 200, 100, 0, 0, 0, 100, 200, 300]],
    ['start-from-100', [300, 200, 100, 0, 0, 0, 100, 200, 300]],
  ])('prices deviations as it says: %s', (preset, expected) => {
    expect(prices(applyPreset(defaultRubricForm('in'), preset))).toEqual(expected);
  });

  const anyForm: fc.Arbitrary<RubricForm> = fc
    .record({
      unit: fc.constantFrom<Unit>('in', 'mm'),
      rule: sizeRuleArb(1_000_000),
      own: sizeRuleArb(1_000_000),
      presets: fc.shuffledSubarray([...PRESET_IDS]),
    })
    .map(({ unit, rule, own, presets }) => {
      const form = defaultRubricForm(unit);
      form.defaults.sizes.length = rule;
      return { ...form, presets, exceptions: { base: { worth: 700, sizes: { width: own } } } };
    });

  it.each(PRESET_IDS)(
    'makes a form that may be stored, leaves its own alone, and changes nothing twice: %s',
    (preset) => {
      fc.assert(
        fc.property(anyForm, (form) => {
          const before = structuredClone(form);
          const once = applyPreset(form, preset);
          expect(form).toEqual(before);
          expect(rubricFormSchema.parse(once)).toEqual(once);
          expect(once.presets.filter((each) => each === preset)).toHaveLength(1);
          expect(applyPreset(once, preset)).toEqual(once);
        }),
        { numRuns: 60 },
      );
    },
  );
});

describe('a doubled side', () => {
  it('costs twice what the other side costs, at every distance', () => {
    fc.assert(
      fc.property(sizeRuleArb(sixtyFourths(1)), fc.integer({ min: 1, max: 40 }), (rule, off) => {
        const form = withRule({ ...rule, cap: null });
        form.grossLimit = null;
        form.defaults.swap = false;
        const [under, over] = [applyPreset(form, 'undersize-doubles'), applyPreset(form, 'oversize-doubles')];
        expect(loseAt(under, -off)).toBe(2 * (loseAt(under, off) ?? Number.NaN));
        expect(loseAt(over, off)).toBe(2 * (loseAt(over, -off) ?? Number.NaN));
      }),
    );
  });

  it('is made from the other side, whatever it was before', () => {
    const uneven = makeRule({ under: [{ within: 5, lose: 0 }], beyondUnder: 50 });
    const { length } = applyPreset(withRule(uneven), 'undersize-doubles').defaults.sizes;
    expect(length).toMatchObject({ over: uneven.over, beyondOver: 300, beyondUnder: 600 });
    expect(length.under).toEqual(uneven.over.map(({ within, lose }) => ({ within, lose: 2 * lose })));
  });

  it('gives way to the other, which starts from the single price again', () => {
    const form = defaultRubricForm('in');
    const turned = applyPreset(applyPreset(form, 'undersize-doubles'), 'oversize-doubles');
    expect(turned).toEqual(applyPreset(form, 'oversize-doubles'));
    expect(turned.presets).toEqual(['oversize-doubles']);
  });

  it('is doubled in exceptions too, on the axes they name', () => {
    const form = defaultRubricForm('in');
    form.exceptions = {
      base: { sizes: { width: makeRule({ beyondOver: 400, beyondUnder: 400 }) } },
      hook: { worth: 1 },
    };
    const { exceptions } = applyPreset(form, 'oversize-doubles');
    expect(exceptions.base?.sizes?.width).toMatchObject({ beyondOver: 800, beyondUnder: 400 });
    expect(Object.keys(exceptions.base?.sizes ?? {})).toEqual(['width']);
    expect(exceptions.hook).toEqual({ worth: 1 });
  });

  it('stays within the cap of the dimension', () => {
    const capped = applyPreset(withRule(makeRule({ cap: 300 })), 'undersize-doubles');
    expect(prices(capped)).toEqual([300, 300, 200, 0, 0, 0, 100, 200, 300]);
  });

  it('is refused where a price would pass 1 000 points', () => {
    const dear = (beyondOver: number) => withRule(makeRule({ beyondOver }));
    expect(applyPreset(dear(50_000), 'undersize-doubles').defaults.sizes.length.beyondUnder).toBe(100_000);
    expect(() => applyPreset(dear(50_001), 'undersize-doubles')).toThrow(RangeError);
  });
});

describe('a start from 100', () => {
  it('takes losses off 100 points, unscaled', () => {
    const form = applyPreset(defaultRubricForm('in'), 'start-from-100');
    expect(form).toMatchObject({ basis: 'start', start: 10_000, outOf: null, presets: ['start-from-100'] });
    const piece = makePiece('base', 1, { length: target.length + sixtyFourths(3) });
    const attempt = makeAttempt([piece], { work: { 'name-and-period': 1 } });
    expect(scoreAttempt(compileRubric(form, cutList), attempt).score).toBe(9800);
  });

  it('leaves prices and the presets that made them', () => {
    const doubled = applyPreset(defaultRubricForm('in'), 'undersize-doubles');
    const form = applyPreset(doubled, 'start-from-100');
    expect(form.defaults).toEqual(doubled.defaults);
    expect(form.presets).toEqual(['undersize-doubles', 'start-from-100']);
  });
});

describe('a rate per step', () => {
  const rate = { free: sixtyFourths(1), step: sixtyFourths(1), lose: 50, cap: 200 };

  it('makes the bands of the rate asked for, on every axis, and leaves exceptions as they are', () => {
    const form = defaultRubricForm('in');
    form.exceptions = { base: { sizes: { length: makeRule() } } };
    const made = applyPreset(form, 'rate-per-step', { rate });
    for (const axis of AXES) expect(made.defaults.sizes[axis]).toEqual(bandsFromRate(rate));
    expect(made.exceptions).toEqual(form.exceptions);
  });

  it.each<[Unit, number]>([
    ['in', sixtyFourths(2)],
    ['mm', 5_000_000],
  ])('is by itself a point for each begun step of the first free distance: %s', (unit, step) => {
    const { width } = applyPreset(defaultRubricForm(unit), 'rate-per-step').defaults.sizes;
    expect(width).toEqual(bandsFromRate({ free: step, step, lose: 100, cap: 300 }));
  });

  it('ends a doubling, since it charges both sides alike', () => {
    const doubled = applyPreset(defaultRubricForm('in'), 'undersize-doubles');
    expect(applyPreset(doubled, 'rate-per-step').presets).toEqual(['rate-per-step']);
  });

  it('is refused past 20 bands', () => {
    const long = { ...rate, cap: 50 * 21 };
    expect(() => applyPreset(defaultRubricForm('in'), 'rate-per-step', { rate: long })).toThrow(RangeError);
  });
});
