import { combineUncertainties, uncertaintyOfGraduation, uncertaintyOfLimits } from '@/lib/agreement';
import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';

export interface ShopInstrument {
  id: 'rule' | 'caliper';
  label: string;
  /** Read to the nearest of these. */
  graduation: Length;
  /** It errs by no more than this either way; null: nothing but its graduation counts. */
  limit: Length | null;
  /** Standard uncertainty of a reading, in ticks. */
  uncertainty: number;
}

/** What is assumed of the two instruments of a shop; common practice, a maker's own figures may be better. */
const ASSUMED: Record<Unit, Record<ShopInstrument['id'], [graduation: Length, limit: Length | null]>> = {
  in: {
    rule: [TICKS_PER_INCH / 64, null],
    caliper: [TICKS_PER_INCH / 1000, TICKS_PER_INCH / 1000],
  },
  mm: {
    rule: [TICKS_PER_MM / 2, null],
    caliper: [TICKS_PER_MM / 100, TICKS_PER_MM / 50],
  },
};

/** How far parts made in a shop spread about their target: a standard deviation of 0.3 mm. Common practice. */
export const WORK_SPREAD: Length = (3 * TICKS_PER_MM) / 10;

/** A rule and a caliper with the standard uncertainty of one reading. */
export function shopInstruments(unit: Unit): ShopInstrument[] {
  return (['rule', 'caliper'] as const).map((id) => {
    const [graduation, limit] = ASSUMED[unit][id];
    const parts = [
      uncertaintyOfGraduation(graduation),
      ...(limit === null ? [] : [uncertaintyOfLimits(limit)]),
    ];
    return { id, label: id, graduation, limit, uncertainty: combineUncertainties(parts) };
  });
}
