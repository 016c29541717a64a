import { formatLength, type Length, type Unit } from '@/lib/length';

/** 254 is 2 × 127: of inches in decimals, only multiples of 127 ticks come to an end. */
const ENDS_IN_INCHES = 127;
/** One tick shows in so many decimals of a millimetre; 127 of them in so many of an inch. */
const DECIMALS = 7;

/**
 * A length written in the unit it is not measured in, for information: inches in millimetres, millimetres in inches,
 * by 1 in = 25.4 mm exactly (NIST SP 811, appendix B; the international inch of 1959). Where the decimals come to an
 * end, all that are needed stand there and `exact` is true: always so in millimetres. Otherwise it is rounded to
 * 0.0001 in, ties away from zero, with all four decimals. `ticks` is whole, `unit` the one it is measured in; nothing
 * is stored or priced by the result.
 *
 * @example
 * inOtherUnit((TICKS_PER_INCH * 3) / 4, 'in') // { text: '19.05', unit: 'mm', exact: true }
 */
export function inOtherUnit(ticks: Length, unit: Unit): { text: string; unit: Unit; exact: boolean } {
  if (unit === 'in') {
    return {
      text: shorten(formatLength(ticks, { unit: 'mm', decimals: DECIMALS })),
      unit: 'mm',
      exact: true,
    };
  }
  if (ticks % ENDS_IN_INCHES === 0) {
    return {
      text: shorten(formatLength(ticks, { unit: 'in', decimals: DECIMALS })),
      unit: 'in',
      exact: true,
    };
  }
  return { text: formatLength(ticks, { unit: 'in', decimals: 4 }), unit: 'in', exact: false };
}

function shorten(decimal: string): string {
  return decimal.includes('.') ? decimal.replace(/\.?0+$/, '') : decimal;
}
