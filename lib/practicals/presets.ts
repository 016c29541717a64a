import type { Unit } from '@/lib/length';
import {
  AXES,
  applyPreset,
  type Band,
  defaultRubricForm,
  type PresetId,
  type RubricForm,
  type SizeRule,
} from '@/lib/scoring';

/** One price as a preset makes it; the same rule as for a whole form. Null when a price would pass 1 000 points. */
export function doubleSide(rule: SizeRule, dear: 'over' | 'under', unit: Unit): SizeRule | null {
  const form = defaultRubricForm(unit);
  const sizes = { thickness: rule, width: rule, length: rule };
  const preset = dear === 'over' ? 'oversize-doubles' : 'undersize-doubles';
  try {
    return applyPreset({ ...form, defaults: { ...form.defaults, sizes } }, preset).defaults.sizes.length;
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

/** Whether one side has the other's bands at twice the price, and any price at all. */
export function isDoubled(rule: SizeRule, dear: 'over' | 'under'): boolean {
  const [of, by] = dear === 'over' ? [rule.over, rule.under] : [rule.under, rule.over];
  const [beyondOf, beyondBy] =
    dear === 'over' ? [rule.beyondOver, rule.beyondUnder] : [rule.beyondUnder, rule.beyondOver];
  const alike =
    of.length === by.length &&
    of.every((band, index) => band.within === by[index]?.within && band.lose === 2 * by[index].lose);
  return alike && beyondOf === 2 * beyondBy && beyondOf > 0;
}

/** Whether each band is one more step wide and one more price dear than the one before it, on both sides. */
export function isRatePerStep(rule: SizeRule): boolean {
  return [rule.over, rule.under].every((bands) => bands.length > 1 && isEven(bands));
}

function isEven(bands: readonly Band[]): boolean {
  const [first, second] = bands;
  if (!first || !second) return false;
  const step = second.within - first.within;
  return bands.every(
    (band, index) => band.within === first.within + index * step && band.lose === index * second.lose,
  );
}

/** Whether the form still is what the preset made of it, in any of its prices. */
export function presetHolds(preset: PresetId, form: RubricForm): boolean {
  const rules = [form.defaults.sizes, ...Object.values(form.exceptions).map(({ sizes }) => sizes ?? {})];
  const every = rules.flatMap((sizes) => AXES.flatMap((axis) => sizes[axis] ?? []));
  switch (preset) {
    case 'undersize-doubles':
      return every.some((rule) => isDoubled(rule, 'under'));
    case 'oversize-doubles':
      return every.some((rule) => isDoubled(rule, 'over'));
    case 'rate-per-step':
      return every.some(isRatePerStep);
    case 'start-from-100':
      return form.basis === 'start' && form.start === 10_000;
  }
}
