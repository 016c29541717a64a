import { type LengthParts, lengthParts } from '@/components/ui/length-parts';
import { graduationsOf, placeOf, type RuleScale } from './rule-scale';

export type RuleVariant = 'bench' | 'wide' | 'card' | 'phone';

interface Cut {
  width: number;
  /** Room above the edge: the piece at the bench, pointers and tabs elsewhere. */
  head: number;
  body: number;
  tickScale: number;
  number: { size: number; baseline: number; stacked: boolean };
  step: { size: number; baseline: number } | null;
  price: { size: number; perPoint: number; limit: number };
}

const BENCH_COLUMN = 88;

const CUTS: Record<RuleVariant, Cut> = {
  bench: {
    width: 13 * BENCH_COLUMN,
    head: 36,
    body: 206,
    tickScale: 0.74,
    number: { size: 46, baseline: 89, stacked: true },
    step: { size: 27, baseline: 129 },
    price: { size: 22, perPoint: 15, limit: 45 },
  },
  wide: {
    width: 1144,
    head: 64,
    body: 206,
    tickScale: 0.9,
    number: { size: 27, baseline: 82, stacked: false },
    step: { size: 20, baseline: 108 },
    price: { size: 21, perPoint: 16, limit: 64 },
  },
  card: {
    width: 700,
    head: 46,
    body: 174,
    tickScale: 0.72,
    number: { size: 22, baseline: 66, stacked: false },
    step: { size: 17, baseline: 89 },
    price: { size: 18, perPoint: 14, limit: 54 },
  },
  phone: {
    width: 358,
    head: 32,
    body: 116,
    tickScale: 0.5,
    number: { size: 20, baseline: 52, stacked: false },
    step: null,
    price: { size: 15, perPoint: 10, limit: 34 },
  },
};

/** In the editor the knives carry the deviations, and the numbers take their room. */
const KNIFE_CUTS: Record<RuleVariant, Partial<Cut>> = {
  bench: {},
  wide: { number: { size: 30, baseline: 88, stacked: false }, step: null },
  card: { number: { size: 24, baseline: 70, stacked: false }, step: null, body: 168 },
  phone: { body: 140, price: { size: 16, perPoint: 12, limit: 44 } },
};

/** Where everything on one rule face stands, in the px of its own drawing. */
export interface RuleLayout extends Cut {
  height: number;
  edge: number;
  foot: number;
  centre: number;
  pitch: number;
  /** The stretch that is to scale; at the bench a `far` column lies beyond each end. */
  left: number;
  right: number;
  far: boolean;
  /** Band edges are drawn as knives through the face, so numbers need a clear ground. */
  knives: boolean;
  /** Every so many graduations carry a number. */
  numberEvery: number;
}

const DIGIT = 0.477;
const POINT = 0.24;
const FRACTION_DIGITS = 0.6;

/** About how wide a number is in the narrow cut of the face, in parts of its size. */
export function numberWidth(text: string, stacked: boolean): number {
  const [first = '', second] = text.split(' ');
  const fraction = second ?? (first.includes('/') ? first : null);
  const whole = fraction === first ? '' : first;
  const plain = [...whole].reduce((sum, sign) => sum + (sign === '.' ? POINT : DIGIT), 0);
  if (!fraction) return plain;
  const [num = '', den = ''] = fraction.split('/');
  if (stacked) return plain + 0.1 + 0.7 * DIGIT * Math.max(num.length, den.length);
  return plain + 0.1 + FRACTION_DIGITS * DIGIT * (num.length + den.length) + 0.16;
}

function widthOfParts({ whole, num, den }: LengthParts, stacked: boolean): number {
  const fraction = num === null ? '' : `${num}/${den}`;
  return numberWidth([whole, fraction].filter(Boolean).join(' '), stacked);
}

function widestNumber(scale: RuleScale, stacked: boolean): number {
  const widths = graduationsOf(scale).map(({ ticks }) =>
    widthOfParts(lengthParts(ticks, scale.unit), stacked),
  );
  return Math.max(DIGIT, ...widths);
}

/** Whether a number set at x stays on the paper: beside the outermost tick there may be too little of it. */
export function numberFits(parts: LengthParts, x: number, { width, number }: RuleLayout): boolean {
  const half = (widthOfParts(parts, number.stacked) * number.size) / 2;
  return x - half >= 0 && x + half <= width;
}

/**
 * Lays out a rule face. Numbers that would not fit their column are set smaller at the bench, thinned out elsewhere.
 * `knifeHead` is the room that the knives of the rubric editor take above the edge; null where there are none.
 */
export function layOutRule(
  variant: RuleVariant,
  scale: RuleScale,
  knifeHead: number | null = null,
): RuleLayout {
  const knives = knifeHead !== null;
  const cut = knives ? { ...CUTS[variant], ...KNIFE_CUTS[variant], head: knifeHead } : CUTS[variant];
  const columns = 2 * scale.span + 1;
  const far = variant === 'bench';
  const width = far ? (columns + 2) * BENCH_COLUMN : cut.width;
  const pitch = far ? BENCH_COLUMN : width / columns;
  const widest = widestNumber(scale, cut.number.stacked);
  const size = far ? Math.min(cut.number.size, (pitch - 16) / widest) : cut.number.size;
  const numberEvery = far ? 1 : ([1, 2, 4, 8].find((every) => every * pitch >= widest * size + 12) ?? 16);
  const centre = width / 2;
  const half = (columns * pitch) / 2;
  return {
    ...cut,
    width,
    height: cut.head + cut.body,
    edge: cut.head,
    foot: cut.head + cut.body,
    centre,
    pitch,
    left: centre - half,
    right: centre + half,
    far,
    knives,
    number: { ...cut.number, size },
    numberEvery,
  };
}

/** Where a deviation stands on the face; what lies past the shown stretch is held at its end. */
export function placeOnFace(deviation: number, scale: RuleScale, layout: RuleLayout): number {
  const x = placeOf(deviation, scale, layout.centre, layout.pitch);
  return Math.min(layout.right, Math.max(layout.left, x));
}
