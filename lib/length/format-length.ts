import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from './types';

const DENOMINATORS = [2, 4, 8, 16, 32, 64, 128] as const;
const MOST_DECIMALS = 10;

export type Denominator = (typeof DENOMINATORS)[number];

export interface LengthFormat {
  unit: Unit;
  /** Ruler fractions, in inches only. */
  denominator?: Denominator | undefined;
  /** Fixed decimals, 0 to 10. */
  decimals?: number | undefined;
}

/** How many steps of 1/perUnit the length is nearest to; a tie goes away from zero, which is up here. */
function countSteps(magnitude: bigint, perUnit: bigint, ticksPerUnit: bigint): bigint {
  return (2n * magnitude * perUnit + ticksPerUnit) / (2n * ticksPerUnit);
}

function spellMixed(steps: bigint, denominator: bigint): string {
  const whole = steps / denominator;
  let above = steps % denominator;
  let below = denominator;
  while (above > 0n && above % 2n === 0n) {
    above /= 2n;
    below /= 2n;
  }
  if (above === 0n) return `${whole}`;
  return whole === 0n ? `${above}/${below}` : `${whole} ${above}/${below}`;
}

function spellDecimal(steps: bigint, decimals: number): string {
  const digits = `${steps}`.padStart(decimals + 1, '0');
  if (decimals === 0) return digits;
  return `${digits.slice(0, -decimals)}.${digits.slice(-decimals)}`;
}

/** The text without sign of the nearest length on the grid asked for, and whether that is zero. */
function spellMagnitude(magnitude: bigint, format: LengthFormat): { text: string; zero: boolean } {
  const { unit, denominator, decimals } = format;
  if ((denominator === undefined) === (decimals === undefined)) {
    throw new RangeError('Give either a denominator or a number of decimals.');
  }
  const ticksPerUnit = BigInt(unit === 'in' ? TICKS_PER_INCH : TICKS_PER_MM);
  if (denominator !== undefined) {
    if (unit !== 'in') throw new RangeError('Only inches are written as fractions.');
    if (!DENOMINATORS.includes(denominator))
      throw new RangeError(`No rule is divided into 1/${denominator}.`);
    const steps = countSteps(magnitude, BigInt(denominator), ticksPerUnit);
    return { text: spellMixed(steps, BigInt(denominator)), zero: steps === 0n };
  }
  if (decimals === undefined || !Number.isInteger(decimals) || decimals < 0 || decimals > MOST_DECIMALS) {
    throw new RangeError(`The decimals are a whole number from 0 to ${MOST_DECIMALS}.`);
  }
  const steps = countSteps(magnitude, 10n ** BigInt(decimals), ticksPerUnit);
  return { text: spellDecimal(steps, decimals), zero: steps === 0n };
}

/** As `formatLength`, with the signs that the caller writes for more and for less than zero. */
export function spellLength(
  ticks: Length,
  format: LengthFormat,
  signs: { more: string; less: string },
): string {
  if (!Number.isSafeInteger(ticks)) throw new RangeError('A length is a whole number of ticks.');
  const { text, zero } = spellMagnitude(BigInt(Math.abs(ticks)), format);
  if (zero) return text;
  return `${ticks < 0 ? signs.less : signs.more}${text}`;
}

/**
 * Writes a length for people: with `denominator` as a reduced mixed number of inches (`1 3/8`, `3/4`, `0`,
 * `-1/32`), with `decimals` as a number of fixed decimals. Rounds to the nearest of the grid asked for, a tie
 * away from zero; what rounds to zero has no sign. No unit is appended.
 *
 * For every length on the grid asked for, to 10 m, `parseLength` reads the same ticks back.
 *
 * @throws RangeError unless exactly one of `denominator` (2 to 128, inches only) and `decimals` (0 to 10) is
 * given, or when `ticks` is not whole.
 * @example formatLength(349_250_000, { unit: 'in', denominator: 64 }) // '1 3/8'
 */
export function formatLength(ticks: Length, format: LengthFormat): string {
  return spellLength(ticks, format, { more: '', less: '-' });
}
