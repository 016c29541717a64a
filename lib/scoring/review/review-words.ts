import { formatLength, type Length, type Unit } from '@/lib/length';
import type { Points, Rubric } from '../types';

const GRADUATIONS_PER_INCH = 128;
const TICKS_PER_GRADUATION = 1_984_375;
/** One tick shows in so many decimals of an inch, and of a millimetre. */
const DECIMALS: Record<Unit, number> = { in: 10, mm: 7 };

/** `3/64 in`, `0.002 in`, `0.5 mm`: a ruler fraction where there is one, else as many decimals as it takes. */
export function sayLength(ticks: Length, { unit }: Pick<Rubric, 'unit'>): string {
  if (unit === 'in' && ticks % TICKS_PER_GRADUATION === 0) {
    return `${formatLength(ticks, { unit, denominator: GRADUATIONS_PER_INCH })} in`;
  }
  const decimal = formatLength(ticks, { unit, decimals: DECIMALS[unit] });
  return `${decimal.replace(/\.?0+$/, '')} ${unit}`;
}

/** `9`, `2.5`, `0.01`. */
export function sayAmount(points: Points): string {
  const hundredths = `${points % 100}`.padStart(2, '0').replace(/0+$/, '');
  const whole = (points - (points % 100)) / 100;
  return hundredths === '' ? `${whole}` : `${whole}.${hundredths}`;
}

export function sayPoints(points: Points): string {
  return `${sayAmount(points)} ${points === 100 ? 'point' : 'points'}`;
}

export function sayLine({ label, id }: { label: string; id: string }): string {
  return `“${label.trim() || id}”`;
}
