import { type Length, parseLength, type Unit } from '@/lib/length';
import type { Task } from '@/lib/practicals/task';
import type { Check, Line, Rubric, SizeRule } from '@/lib/scoring';
import type { CutListLine, RubricForm } from '@/lib/scoring/rubric-form';

/** A length as a person types it; a test that mistypes one fails at once. */
export function ticksOf(text: string, unit: Unit = 'in'): Length {
  const parsed = parseLength(text, unit);
  if (!parsed.ok) throw new Error(`${text}: ${parsed.reason}`);
  return parsed.ticks;
}

type Row = [id: string, quantity: number, size: string];

/** Parts of nine pieces, 27 sizes, in inches. */
export const NINE_PIECES: Row[] = [
  ['base', 1, '1/2 x 3 1/2 x 7'],
  ['end', 2, '1/2 x 3 1/2 x 4'],
  ['side', 2, '1/2 x 2 x 7'],
  ['divider', 4, '1/2 x 2 x 3 1/2'],
];

export const SIX_STICKS_MM: Row[] = [
  ['stem', 2, '16 x 16 x 220'],
  ['wedge', 2, '10 x 16 x 80'],
];

const EDGES: Record<Unit, string[]> = { in: ['1/32', '1/16', '3/32'], mm: ['0.5', '1', '2'] };
const MARGIN: Record<Unit, string> = { in: '0.002', mm: '0.05' };
const GROSS: Record<Unit, string> = { in: '1/4', mm: '6' };

/** The default bands: three free distances at 0, 1 and 2 points, 3 beyond. */
export function defaultRule(unit: Unit = 'in'): SizeRule {
  const bands = EDGES[unit].map((edge, index) => ({ within: ticksOf(edge, unit), lose: index * 100 }));
  return { over: bands, under: bands, beyondOver: 300, beyondUnder: 300, cap: null };
}

const CHECKS: Check[] = [
  {
    id: 'square',
    label: 'square',
    levels: [
      { label: 'square', lose: 0 },
      { label: 'out of square', lose: 100 },
    ],
    assume: 0,
  },
  {
    id: 'surface',
    label: 'surface',
    levels: [
      { label: 'clean', lose: 0 },
      { label: 'torn', lose: 100 },
    ],
    assume: 0,
  },
];

const WORK_CHECKS: Check[] = [
  {
    id: 'labelled',
    label: 'name and period on pieces',
    levels: [
      { label: 'there', lose: 0 },
      { label: 'not there', lose: 100 },
    ],
    assume: null,
  },
];

function cutList(rows: readonly Row[], unit: Unit): CutListLine[] {
  return rows.map(([id, quantity, size]) => {
    const [thickness = '', width = '', length = ''] = size.split(' x ');
    const target = {
      thickness: ticksOf(thickness, unit),
      width: ticksOf(width, unit),
      length: ticksOf(length, unit),
    };
    return { id, label: id, quantity, target };
  });
}

/** A rubric of the product's defaults for a cut list. */
export function defaultRubric(rows: readonly Row[] = NINE_PIECES, unit: Unit = 'in'): Rubric {
  const rule = defaultRule(unit);
  return {
    unit,
    basis: 'worth',
    start: null,
    outOf: 10_000,
    floor: 0,
    roundTo: 100,
    readTo: null,
    margin: ticksOf(MARGIN[unit], unit),
    grossLimit: ticksOf(GROSS[unit], unit),
    lines: cutList(rows, unit).map(
      (line): Line => ({
        ...line,
        worth: 900,
        missing: 900,
        sizes: { thickness: rule, width: rule, length: rule },
        checks: CHECKS,
        swap: true,
        set: 'each',
      }),
    ),
    workChecks: WORK_CHECKS,
    late: null,
    ceiling: 102,
  };
}

/** The same as a teacher authors it. */
export function defaultForm(unit: Unit = 'in'): RubricForm {
  const rule = defaultRule(unit);
  return {
    format: 1,
    unit,
    basis: 'worth',
    start: null,
    outOf: 10_000,
    floor: 0,
    roundTo: 100,
    readTo: null,
    margin: ticksOf(MARGIN[unit], unit),
    grossLimit: ticksOf(GROSS[unit], unit),
    ceiling: 102,
    presets: [],
    defaults: {
      worth: 900,
      missing: null,
      sizes: { thickness: rule, width: rule, length: rule },
      checks: CHECKS,
      swap: true,
      set: 'each',
    },
    exceptions: {},
    workChecks: WORK_CHECKS,
    policies: {
      late: null,
      redo: { kind: 'higher', capPercent: 90 },
      prediction: {
        agreeWithin: ticksOf(EDGES[unit][0] ?? '1/32', unit),
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

/** The task of that cut list. */
export function defaultTask(rows: readonly Row[] = NINE_PIECES, unit: Unit = 'in'): Task {
  return {
    title: 'Nine parts',
    unit,
    instructions: 'Cut the parts to size.',
    material: 'alder',
    blank: {
      thickness: ticksOf(unit === 'in' ? '5/8' : '24', unit),
      width: ticksOf(unit === 'in' ? '6' : '105', unit),
      length: ticksOf(unit === 'in' ? '30' : '900', unit),
    },
    kerf: ticksOf(unit === 'in' ? '1/8' : '3', unit),
    cutList: { lines: cutList(rows, unit) },
    lineNotes: {},
  };
}
