import { type LengthFormat, spellLength } from './format-length';
import type { Length } from './types';

/**
 * Writes a deviation as `formatLength` writes a length, with the sign always shown: `+1/32`, `−1/16` (U+2212).
 * What rounds to zero is written as `formatLength` writes it, without a sign.
 *
 * @throws RangeError where `formatLength` does.
 * @example formatDeviation(-15_875_000, { unit: 'in', denominator: 32 }) // '−1/16'
 */
export function formatDeviation(ticks: Length, format: LengthFormat): string {
  return spellLength(ticks, format, { more: '+', less: '\u2212' });
}
