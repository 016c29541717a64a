import { type Length, parseLength, type Unit } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import type { Share } from '@/lib/scoring/rubric-form';

/** Messages by dotted path, as forms and verbs hand them on. */
export type DraftErrors = Record<string, string[]>;

const POINTS = /^(?:(?<whole>\d{1,6})(?: ?- ?| )?)?(?:(?<num>\d{1,4}) ?\/ ?(?<den>\d{1,4}))?$/;
const DECIMAL = /^\d{0,6}[.,]\d{1,2}$/;
const FRACTIONS: Record<string, string> = { '½': ' 1/2', '¼': ' 1/4', '¾': ' 3/4' };

/** Points typed as `9`, `1.5`, `1,5`, `1 1/2` or `½`, in hundredths; null for anything else. */
export function readPoints(text: string): Points | null {
  const plain = text.replace(/[½¼¾]/g, (sign) => FRACTIONS[sign] ?? sign).trim();
  if (DECIMAL.test(plain)) {
    const [whole = '', decimals = ''] = plain.split(/[.,]/);
    return Number(whole) * 100 + Number(decimals.padEnd(2, '0'));
  }
  const groups = POINTS.exec(plain)?.groups;
  if (!groups || plain === '') return null;
  const whole = Number(groups.whole ?? 0) * 100;
  if (groups.num === undefined) return whole;
  const part = (Number(groups.num) * 100) / Number(groups.den);
  return Number.isInteger(part) ? whole + part : null;
}

/** A share typed as `90%` or `2/3`, in lowest terms; null for anything else. */
export function readShare(text: string): Share | null {
  const percent = /^(\d{1,3}) ?%?$/.exec(text.trim());
  const fraction = /^(\d{1,4}) ?\/ ?(\d{1,4})$/.exec(text.trim());
  const [num, den] = percent
    ? [Number(percent[1]), 100]
    : fraction
      ? [Number(fraction[1]), Number(fraction[2])]
      : [0, 1];
  if (num <= 0 || den <= 0 || num > den) return null;
  const divisor = greatestDivisor(num, den);
  return { num: num / divisor, den: den / divisor };
}

const QUANTITY = /^(?:[x×] ?)?(\d{1,6})(?:[.,]0+)?(?: ?(?:[x×]|pcs?\.?|pieces?|ea\.?|off))?$/i;

/** A number of pieces typed as `2`, `x2`, `2 pcs` or as a spreadsheet gives it, `2.00`; null for anything else. */
export function readQuantity(text: string): number | null {
  const digits = QUANTITY.exec(text.trim())?.[1];
  return digits === undefined ? null : Number(digits);
}

const MONTH = '(?:jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)[a-z]*';
const DATE = new RegExp(
  `^(?:\\d{1,2}[-/ .]?)?${MONTH}[-/ .]?\\d{0,4}$|^\\d{4}-\\d\\d-\\d\\d|^\\d{1,2}/\\d{1,2}/\\d{2,4}$`,
  'i',
);
const MADE_A_DATE =
  'A spreadsheet made a date of this size. Type it again, or set that column to text and paste anew.';

function greatestDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestDivisor(b, a % b);
}

/**
 * Reads typed fields and collects what is wrong with each. A field that cannot be read gives a stand-in, so that
 * the rest is read too; whoever uses it looks at `errors` before using any value.
 */
export class FieldReader {
  readonly errors: DraftErrors = {};

  constructor(readonly unit: Unit) {}

  refuse(path: string, message: string): void {
    this.errors[path] = [...(this.errors[path] ?? []), message];
  }

  hasErrorAt(path: string): boolean {
    return Object.keys(this.errors).some((each) => each === path || each.startsWith(`${path}.`));
  }

  /** A length of more than 0. */
  size(path: string, text: string): Length {
    const ticks = this.length(path, text);
    if (ticks > 0) return ticks;
    if (!this.errors[path]) this.refuse(path, 'A size is more than 0.');
    return 1;
  }

  /** A length of 0 or more. */
  distance(path: string, text: string): Length {
    const ticks = this.length(path, text);
    if (ticks < 0) this.refuse(path, 'This is a distance: leave out the minus.');
    return Math.max(0, ticks);
  }

  points(path: string, text: string, most = 100_000): Points {
    const points = readPoints(text);
    if (points === null) {
      this.refuse(
        path,
        text.trim() === ''
          ? 'Type points, such as 3 or 1.5.'
          : 'Points are a number such as 3 or 1.25, with two decimals at most.',
      );
      return 0;
    }
    if (points > most) this.refuse(path, `This is more than ${most / 100} points.`);
    return Math.min(points, most);
  }

  whole(path: string, text: string, [least, most]: [least: number, most: number], what: string): number {
    const plain = text.trim().replace(/ ?%$/, '');
    const value = /^\d{1,6}$/.test(plain) ? Number(plain) : Number.NaN;
    if (value >= least && value <= most) return value;
    this.refuse(path, `${what} is a whole number from ${least} to ${most}.`);
    return least;
  }

  quantity(path: string, text: string, most: number): number {
    const quantity = readQuantity(text);
    if (quantity !== null && quantity >= 1 && quantity <= most) return quantity;
    this.refuse(path, `The number of pieces is a whole number from 1 to ${most}.`);
    return 1;
  }

  share(path: string, text: string): Share {
    const share = readShare(text);
    if (!share) this.refuse(path, 'Type a share above none, up to the whole: 90% or 2/3.');
    return share ?? { num: 1, den: 1 };
  }

  /** Null for an empty field. */
  optional<T>(text: string, read: () => T): T | null {
    return text.trim() === '' ? null : read();
  }

  text(path: string, text: string, most: number, empty: string | null): string {
    const trimmed = text.trim();
    if (trimmed === '' && empty !== null) this.refuse(path, empty);
    if (trimmed.length > most) this.refuse(path, `Use at most ${most} characters.`);
    return trimmed;
  }

  private length(path: string, text: string): Length {
    const read = parseLength(text, this.unit);
    if (read.ok) return read.ticks;
    this.refuse(path, DATE.test(text.trim()) ? MADE_A_DATE : read.reason);
    return 0;
  }
}
