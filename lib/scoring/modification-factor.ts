import { Fraction } from 'fraction.js';
import type { Modification } from './modification';

export type ParsedFactor = { ok: true; widen: Modification['widen'] } | { ok: false; reason: string };

const LONGEST_TEXT = 32;
const LARGEST_PART = 10_000n;
const FACTOR =
  /^(?:[x×] ?)?(?:(?:(?<whole>\d{1,4})(?: ?- ?| ))?(?<above>\d{1,4}) ?\/ ?(?<below>\d{1,4})|(?<decimal>\d{1,4}(?:\.\d{1,4})?|\.\d{1,4}))(?<mark> ?(?:%|[x×]))?$/;

/** One spelling for every sign: / for fractions, a point for decimals, one space. */
function normalizeText(text: string): string {
  return text
    .replace(/[\u00bc-\u00be\u2150-\u215e]/g, (sign) => ` ${sign.normalize('NFKC')} `)
    .replace(/[\u2044\u2215]/g, '/')
    .replaceAll(',', '.')
    .replace(/\s+/g, ' ')
    .trim()
    .toLowerCase();
}

/**
 * Reads by how much bands are made wider, as people write it: `1.5`, `1,5`, `2`, `1 1/2`, `1½`, `3/2`, `150 %`,
 * `1.5x`. Gives the factor as a fraction in lowest terms, exact and never rounded. Refuses, with a reason for whoever
 * typed: what it cannot read whole, less than 1, more than 10, a fraction finer than ten-thousandths.
 *
 * @example parseFactor('1 1/2') // { ok: true, widen: { num: 3, den: 2 } }
 */
export function parseFactor(text: string): ParsedFactor {
  const normal = normalizeText(text);
  if (normal === '') return refuse('Type how many times as wide, such as 1.5, 1 1/2 or 150 %.');
  const groups = text.length > LONGEST_TEXT ? undefined : FACTOR.exec(normal)?.groups;
  if (!groups) return refuse('This cannot be read as a factor. Type it like 1.5, 1 1/2 or 150 %.');
  const { whole = '0', above, below, decimal, mark } = groups;
  if (below !== undefined && Number(below) === 0) {
    return refuse('The number below the line of a fraction cannot be 0.');
  }
  const number =
    decimal === undefined ? new Fraction(`${above}/${below}`).add(whole) : new Fraction(`0${decimal}`);
  const factor = mark?.trim() === '%' ? number.div(100) : number;
  if (factor.lt(1)) return refuse('Bands can only be made wider: 1 or more, or 100 % or more.');
  if (factor.gt(10)) return refuse('Bands can be made at most 10 times as wide.');
  if (factor.n > LARGEST_PART) return refuse('Give the factor with fewer decimals.');
  return { ok: true, widen: { num: Number(factor.n), den: Number(factor.d) } };
}

/**
 * The factor as one types it: a short decimal where there is one, a mixed number otherwise.
 *
 * @example formatFactor({ num: 4, den: 3 }) // '1 1/3'
 */
export function formatFactor({ num, den }: Modification['widen']): string {
  const factor = new Fraction(num, den);
  const text = factor.toString(4);
  return /^\d+(?:\.\d{1,4})?$/.test(text) && new Fraction(text).equals(factor)
    ? text
    : factor.toFraction(true);
}

function refuse(reason: string): ParsedFactor {
  return { ok: false, reason };
}
