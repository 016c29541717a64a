import { formatLength, type Length, TICKS_PER_INCH, type Unit } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import type { Share } from '@/lib/scoring/rubric-form';

const FINEST = 128;

/** Written so that reading it gives the very same ticks: a ruler fraction, else a decimal, else millimetres. */
export function lengthAsTyped(ticks: Length, unit: Unit): string {
  if (unit === 'in') {
    if ((ticks * FINEST) % TICKS_PER_INCH === 0) return formatLength(ticks, { unit, denominator: FINEST });
    if ((ticks * 10_000) % TICKS_PER_INCH === 0) return shorten(formatLength(ticks, { unit, decimals: 4 }));
    return `${shorten(formatLength(ticks, { unit: 'mm', decimals: 7 }))} mm`;
  }
  return shorten(formatLength(ticks, { unit, decimals: 7 }));
}

/** Hundredths as a decimal: 150 gives `1.5`. */
export function pointsAsTyped(points: Points): string {
  const whole = Math.trunc(points / 100);
  const hundredths = points % 100;
  return hundredths === 0 ? String(whole) : shorten(`${whole}.${String(hundredths).padStart(2, '0')}`);
}

/** `90%` where the share is a whole percent, else `2/3`. */
export function shareAsTyped({ num, den }: Share): string {
  return (num * 100) % den === 0 ? `${(num * 100) / den}%` : `${num}/${den}`;
}

function shorten(decimal: string): string {
  return decimal.includes('.') ? decimal.replace(/\.?0+$/, '') : decimal;
}
