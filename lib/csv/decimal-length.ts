import { type Length, TICKS_PER_INCH, type Unit } from '@/lib/length';
import { scaledAsDecimal } from './write-csv';

const PLACES = 10;

/**
 * A length or deviation as a decimal for a file: exact wherever it is a finite decimal of at most ten places, and
 * otherwise the nearest one of ten places (a tie away from zero), which still names the very tick. ASCII minus.
 * @example decimalLength(-7937500, 'in') // '-0.03125'
 */
export function decimalLength(ticks: Length, unit: Unit): string {
  // A millimetre has 10^7 ticks, so that its decimals are the ticks themselves.
  if (unit === 'mm') return scaledAsDecimal(ticks, 7);
  const magnitude =
    (BigInt(Math.abs(ticks)) * 10n ** BigInt(PLACES) * 2n + BigInt(TICKS_PER_INCH)) /
    (2n * BigInt(TICKS_PER_INCH));
  const digits = magnitude.toString().padStart(PLACES + 1, '0');
  const fraction = digits.slice(-PLACES).replace(/0+$/, '');
  const text = `${digits.slice(0, -PLACES)}${fraction === '' ? '' : `.${fraction}`}`;
  return ticks < 0 && text !== '0' ? `-${text}` : text;
}
