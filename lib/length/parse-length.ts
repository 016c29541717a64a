import { Fraction } from 'fraction.js';
import { type Length, MAX_LENGTH, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from './types';

export type ParsedLength = { ok: true; ticks: Length; unit: Unit } | { ok: false; reason: string };

const LONGEST_TEXT = 64;
const DECIMAL = String.raw`\d*\.\d+`;
const FRACTION = String.raw`\d+ ?/ ?\d+`;
const NUMBER = `(?:(?:(?<whole>\\d+)(?: ?- ?| ))?(?<fraction>${FRACTION})|(?<decimal>${DECIMAL}|\\d+))`;
const FEET = String.raw`(?:(?<feet>\d+) ?'(?: ?- ?| )?)?`;
const MARK = String.raw`(?: ?(?<mark>"|in\.|inches|inch|in|mm))?`;
const WITH_INCHES = new RegExp(`^(?<sign>[+-])? ?${FEET}${NUMBER}${MARK}$`);
const FEET_ALONE = /^(?<sign>[+-])? ?(?<feet>\d+) ?'$/;

/** What a person most likely meant, asked in this order once the text fits no accepted form. */
const REASONS: [RegExp, string][] = [
  [/^[+-]? ?$/, 'There is no number in it.'],
  [/[.][\d ]*[.]/, 'It has two decimal signs. Leave out any thousands sign.'],
  [/\d[.](?!\d)/, 'A decimal sign needs a digit after it.'],
  [/\d[.]?\d* ?e[+-]?\d/, 'Powers of ten are not read. Write the number out.'],
  [/[.]\d+ ?'/, 'Decimal feet are not read. Write feet and inches, such as 1\' 6".'],
  [/\/[\d ]*'/, 'Parts of a foot are not read. Write feet and inches, such as 1\' 6".'],
  [/[.]\d+[ -]+\d+ ?\//, 'Write a decimal or a fraction, not both.'],
  [/[.]\d+ ?\/|\/ ?\d*[.]/, 'A fraction takes whole numbers above and below the line.'],
  [/\/ ?(?!\d)|(?<!\d) ?\//, 'A fraction needs a number above and one below the line.'],
  [
    /(?:^|[^a-z])(?:ft|feet|foot|cm|m|yd)(?![a-z])/,
    "Only inches, millimetres and feet with a ' mark are read.",
  ],
];
const EXAMPLES: Record<Unit, string> = { in: '1 3/8, 1.375 or 35 mm', mm: '35, 35.5 or 1 3/8 in' };
const FIRST_EXAMPLE: Record<Unit, string> = { in: '1 3/8 or 35 mm', mm: '35 or 1 3/8 in' };

function notALength(unit: Unit): string {
  return `It cannot be read as a length. Type it like ${EXAMPLES[unit]}.`;
}

/** One spelling for every sign: ' and " for feet and inches, - for dashes, / for fractions, one space. */
function normalizeText(text: string): string {
  return text
    .replace(/[\u00bc-\u00be\u2150-\u215e\u2189]/g, (sign) => ` ${sign.normalize('NFKC')} `)
    .replace(/[\u2018\u2019\u201b\u2032\u02b9]/g, "'")
    .replace(/[\u201c\u201d\u201f\u2033\u02ba]|''/g, '"')
    .replace(/[\u2010-\u2013\u2212]/g, '-')
    .replace(/[\u2044\u2215]/g, '/')
    .replaceAll(',', '.')
    .replace(/\s+/g, ' ')
    .trim()
    .toLowerCase();
}

function readFraction(text: string): Fraction | undefined {
  const [above = '', below = ''] = text.split('/');
  const denominator = BigInt(below.trim());
  return denominator === 0n ? undefined : new Fraction(BigInt(above.trim())).div(new Fraction(denominator));
}

function readDecimal(text: string): Fraction {
  const [whole = '', decimals = ''] = text.split('.');
  return new Fraction(BigInt(whole + decimals)).div(new Fraction(10n ** BigInt(decimals.length)));
}

/** The number of inches or millimetres written, without sign and feet; undefined for a zero denominator. */
function readNumber(groups: Record<string, string | undefined>): Fraction | undefined {
  if (groups.fraction === undefined) return readDecimal(groups.decimal ?? '0');
  const part = readFraction(groups.fraction);
  return part?.add(readDecimal(groups.whole ?? '0'));
}

function refuse(reason: string): ParsedLength {
  return { ok: false, reason };
}

function toTicks(value: Fraction, negative: boolean, unit: Unit): ParsedLength {
  const ticks = value.mul(unit === 'in' ? TICKS_PER_INCH : TICKS_PER_MM);
  if (ticks.gt(MAX_LENGTH)) return refuse('It is longer than 10 m.');
  if (ticks.d !== 1n)
    return refuse('No rule or caliper reads that. Give a ruler fraction such as 5/16, or fewer decimals.');
  const magnitude = Number(ticks.n);
  return { ok: true, ticks: negative && magnitude > 0 ? -magnitude : magnitude, unit };
}

/**
 * Reads a length as people and instruments type it: `1 3/8`, `1-3/8`, `11/8`, `1.375`, `1,375`, `1½`, `3/4"`,
 * `19.05 mm`, `1' 2-1/2"`, with an optional sign. A comma is a decimal sign; a dash inside a mixed number never
 * subtracts; a unit in the text wins over `unit`, and a foot mark is such a unit.
 *
 * Gives whole ticks, exact and never rounded, and the unit that was read. Refuses with a reason for the person
 * who typed: anything it cannot read whole, more than 64 characters, a value that is not a whole number of
 * ticks, more than 10 m. A negative length is read; whether it is allowed is the caller's rule. Never −0.
 *
 * The inch is 25.4 mm exactly (international inch, 1959).
 *
 * @example parseLength('1-3/8"', 'mm') // { ok: true, ticks: 349_250_000, unit: 'in' }
 */
export function parseLength(text: string, unit: Unit): ParsedLength {
  if (text.length > LONGEST_TEXT) return refuse(`It is longer than ${LONGEST_TEXT} characters.`);
  const normal = normalizeText(text);
  if (normal === '') return refuse(`Type a length, such as ${FIRST_EXAMPLE[unit]}.`);
  const groups = (FEET_ALONE.exec(normal) ?? WITH_INCHES.exec(normal))?.groups;
  if (!groups) return refuse(REASONS.find(([pattern]) => pattern.test(normal))?.[1] ?? notALength(unit));

  const { feet, mark, sign } = groups;
  if (feet !== undefined && mark === 'mm') return refuse('Feet go with inches, not with millimetres.');
  const number = readNumber(groups);
  if (!number) return refuse('The number below the line of a fraction cannot be 0.');
  const written: Unit | undefined = mark === 'mm' ? 'mm' : (mark ?? feet) !== undefined ? 'in' : undefined;
  return toTicks(number.add(readDecimal(feet ?? '0').mul(12)), sign === '-', written ?? unit);
}
