import { TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import { bandsFromRate, type Rate } from './bands-from-rate';
import type { LineDefaults, PresetId, RubricForm } from './rubric-form';
import { AXES, type Axis, type Band, type SizeRule } from './types';

const MOST_POINTS = 100_000;

type Sizes = Partial<Record<Axis, SizeRule>>;

/** The side that a preset makes dear. */
const DEAR_SIDE = { 'undersize-doubles': 'under', 'oversize-doubles': 'over' } as const;

export interface PresetOptions {
  /** For `rate-per-step`; without it one point per begun 1/32 in or 0.5 mm past the first, 3 at most. */
  rate?: Rate;
}

/**
 * The form as a preset makes it, with the preset recorded in it.
 * - `undersize-doubles`, `oversize-doubles`: every size rule, in the defaults and in exceptions, gets the other side's
 *   bands at twice the price. One takes the other's place; applied again it changes nothing. A cap stays as it is.
 * - `start-from-100`: losses come off 100 points, which are not scaled.
 * - `rate-per-step`: the size rules of all lines become bands by `options.rate`; exceptions stay as they are.
 * Lengths in ticks, points in hundredths; exact. The form is not changed.
 *
 * @throws RangeError when a doubled price would pass 1 000 points, or the rate cannot be priced in 20 bands.
 * @example applyPreset(defaultRubricForm('in'), 'start-from-100').start // 10_000
 */
export function applyPreset(form: RubricForm, preset: PresetId, options: PresetOptions = {}): RubricForm {
  const next = structuredClone(form);
  next.presets = withPreset(form.presets, preset);
  if (preset === 'start-from-100') return { ...next, basis: 'start', start: 10_000, outOf: null };
  if (preset === 'rate-per-step') {
    const rate = options.rate ?? usualRate(form.unit);
    return { ...next, defaults: { ...next.defaults, sizes: eachAxis(() => bandsFromRate(rate)) } };
  }
  const dear = DEAR_SIDE[preset];
  next.defaults.sizes = eachAxis((axis) => doubleSide(form.defaults.sizes[axis], dear));
  for (const exception of Object.values(next.exceptions)) {
    if (exception.sizes) exception.sizes = doubleSome(exception.sizes, dear);
  }
  return next;
}

/** Both doublings at once would be neither, and a rate charges both sides alike: the later one holds. */
function withPreset(presets: readonly PresetId[], preset: PresetId): PresetId[] {
  const ended = preset === 'start-from-100' ? [] : Object.keys(DEAR_SIDE);
  return [...presets.filter((each) => each !== preset && !ended.includes(each)), preset];
}

function usualRate(unit: Unit): Rate {
  const step = unit === 'in' ? TICKS_PER_INCH / 32 : TICKS_PER_MM / 2;
  return { free: step, step, lose: 100, cap: 300 };
}

function eachAxis(make: (axis: Axis) => SizeRule): LineDefaults['sizes'] {
  return { thickness: make('thickness'), width: make('width'), length: make('length') };
}

function doubleSome(sizes: Sizes, dear: 'over' | 'under'): Sizes {
  const doubled: Sizes = {};
  for (const axis of AXES) {
    const rule = sizes[axis];
    if (rule) doubled[axis] = doubleSide(rule, dear);
  }
  return doubled;
}

interface Side {
  bands: readonly Band[];
  beyond: number;
}

function doubleSide(rule: SizeRule, dear: 'over' | 'under'): SizeRule {
  const over: Side = { bands: rule.over, beyond: rule.beyondOver };
  const under: Side = { bands: rule.under, beyond: rule.beyondUnder };
  const [other, side] = dear === 'under' ? [over, under] : [under, over];
  // Where the other side was doubled before, the price to double is the one that it was made from.
  const base = isTwice(other, side) ? side : other;
  const twice = { bands: base.bands.map(doubleBand), beyond: doublePrice(base.beyond) };
  const [newOver, newUnder] = dear === 'under' ? [base, twice] : [twice, base];
  return {
    over: newOver.bands.map((band) => ({ ...band })),
    under: newUnder.bands.map((band) => ({ ...band })),
    beyondOver: newOver.beyond,
    beyondUnder: newUnder.beyond,
    cap: rule.cap,
  };
}

/** Whether one side is the other at twice the price, and not both for nothing. */
function isTwice(dear: Side, cheap: Side): boolean {
  return (
    dear.beyond === 2 * cheap.beyond &&
    dear.bands.length === cheap.bands.length &&
    dear.bands.every(({ within, lose }, at) => {
      const band = cheap.bands[at];
      return band !== undefined && within === band.within && lose === 2 * band.lose;
    })
  );
}

function doubleBand({ within, lose }: Band): Band {
  return { within, lose: doublePrice(lose) };
}

function doublePrice(price: number): number {
  if (2 * price > MOST_POINTS) throw new RangeError('doubled, a price would be more than 1 000 points');
  return 2 * price;
}
