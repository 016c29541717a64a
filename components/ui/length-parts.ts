import {
  formatDeviation,
  formatLength,
  type Length,
  TICKS_PER_INCH,
  TICKS_PER_MM,
  type Unit,
} from '@/lib/length';

const DENOMINATORS = [2, 4, 8, 16, 32, 64, 128] as const;

export type Denominator = (typeof DENOMINATORS)[number];

/** How a length is written: to a fraction of an inch, or to so many decimals; neither: as short as it stays exact. */
export interface LengthStyle {
  denominator?: Denominator;
  decimals?: number;
}

/** A length taken apart for setting in type. A plain number has `num` and `den` null. */
export interface LengthParts {
  sign: '' | '+' | '−';
  whole: string;
  num: number | null;
  den: number | null;
}

/** The coarsest style in which nothing is rounded; past 1/128 in and 0.001 mm it rounds to 0.0001 in or 0.001 mm. */
export function exactStyle(ticks: Length, unit: Unit): LengthStyle {
  if (unit === 'in') {
    const denominator = DENOMINATORS.find((each) => ticks % (TICKS_PER_INCH / each) === 0);
    if (denominator) return { denominator };
    return { decimals: ticks % (TICKS_PER_INCH / 1000) === 0 ? 3 : 4 };
  }
  const decimals = [0, 1, 2].find((each) => ticks % (TICKS_PER_MM / 10 ** each) === 0);
  return { decimals: decimals ?? 3 };
}

/** The length as one string, as `formatLength` writes it, or with its sign as a deviation. */
export function lengthAsText(ticks: Length, unit: Unit, style: LengthStyle = {}, signed = false): string {
  const chosen =
    style.denominator === undefined && style.decimals === undefined ? exactStyle(ticks, unit) : style;
  return signed
    ? formatDeviation(ticks, { unit, ...chosen })
    : formatLength(ticks, { unit, ...chosen }).replace('-', '−');
}

/** A deviation in short plain words: "1/32 over", "1/16 under", "on target". */
export function deviationAsText(ticks: Length, unit: Unit, style: LengthStyle = {}): string {
  if (ticks === 0) return 'on target';
  return `${lengthAsText(Math.abs(ticks), unit, style)} ${ticks > 0 ? 'over' : 'under'}`;
}

/** Takes a length apart for setting: sign, whole or decimal figure, fraction. */
export function lengthParts(ticks: Length, unit: Unit, style: LengthStyle = {}, signed = false): LengthParts {
  const text = lengthAsText(ticks, unit, style, signed);
  const match = /^([+−]?)(?:(\d[\d.]*)(?: (?=\d+\/)|$))?(?:(\d+)\/(\d+))?$/.exec(text);
  if (!match) return { sign: '', whole: text, num: null, den: null };
  const [, sign, whole = '', num, den] = match;
  return {
    sign: sign === '+' || sign === '−' ? sign : '',
    whole,
    num: num ? Number(num) : null,
    den: den ? Number(den) : null,
  };
}
