import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { RubricForm } from './rubric-form';
import type { Check, SizeRule } from './types';

interface UnitDefaults {
  /** The edges of the bands that cost 0, 1 and 2 points. */
  bands: [Length, Length, Length];
  margin: Length;
  grossLimit: Length;
}

const DEFAULTS: Record<Unit, UnitDefaults> = {
  in: {
    bands: [TICKS_PER_INCH / 32, TICKS_PER_INCH / 16, (TICKS_PER_INCH * 3) / 32],
    margin: TICKS_PER_INCH / 500,
    grossLimit: TICKS_PER_INCH / 4,
  },
  mm: {
    bands: [TICKS_PER_MM / 2, TICKS_PER_MM, TICKS_PER_MM * 2],
    margin: TICKS_PER_MM / 20,
    grossLimit: TICKS_PER_MM * 6,
  },
};

/**
 * The form a new practical begins with: three bands of 0, 1 and 2 points and 3 beyond on each dimension, 9 points a
 * piece, 100 in all; the checks of a piece are taken as good, that of the whole work is to be recorded. Inch and metric
 * bands are each their own, neither converted. Lengths in ticks, points in hundredths. A new object each time. The
 * figures are the product's defaults, all changeable.
 *
 * @example
 * defaultRubricForm('mm').margin // 500_000 ticks: 0.05 mm
 */
export function defaultRubricForm(unit: Unit): RubricForm {
  const { bands, margin, grossLimit } = DEFAULTS[unit];
  return {
    format: 1,
    unit,
    basis: 'worth',
    start: null,
    outOf: 10_000,
    floor: 0,
    roundTo: 100,
    readTo: null,
    margin,
    grossLimit,
    ceiling: 102,
    presets: [],
    defaults: {
      worth: 900,
      missing: null,
      sizes: { thickness: sizeRule(bands), width: sizeRule(bands), length: sizeRule(bands) },
      checks: [passOrLose('square', 'square', 0), passOrLose('surface', 'surface', 0)],
      swap: true,
      set: 'each',
    },
    exceptions: {},
    workChecks: [passOrLose('name-and-period', 'name and period on pieces', null)],
    policies: {
      late: null,
      redo: { kind: 'higher', capPercent: 90 },
      prediction: {
        agreeWithin: bands[0],
        agreeShare: { num: 9, den: 10 },
        caughtShare: { num: 2, den: 3 },
        valueShare: { num: 1, den: 2 },
        full: 200,
        closeWithin: 300,
        close: 100,
      },
    },
  };
}

function sizeRule(edges: UnitDefaults['bands']): SizeRule {
  const side = () => edges.map((within, index) => ({ within, lose: index * 100 }));
  return { over: side(), under: side(), beyondOver: 300, beyondUnder: 300, cap: null };
}

function passOrLose(id: string, label: string, assume: Check['assume']): Check {
  const levels = [
    { label: 'good', lose: 0 },
    { label: 'not good', lose: 100 },
  ];
  return { id, label, levels, assume };
}
