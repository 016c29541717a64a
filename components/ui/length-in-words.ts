import type { Length, Unit } from '@/lib/length';
import { type LengthStyle, lengthParts } from './length-parts';

const UNDER_TWENTY =
  'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen'.split(
    ' ',
  );
const TENS = ['', '', 'twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'];
const PARTS: Record<number, [one: string, several: string]> = {
  2: ['half', 'halves'],
  4: ['quarter', 'quarters'],
  8: ['eighth', 'eighths'],
  16: ['sixteenth', 'sixteenths'],
  32: ['thirty-second', 'thirty-seconds'],
  64: ['sixty-fourth', 'sixty-fourths'],
  128: ['hundred-twenty-eighth', 'hundred-twenty-eighths'],
};

function cardinal(n: number): string {
  if (n < 20) return UNDER_TWENTY[n] ?? String(n);
  if (n < 100) {
    const tens = TENS[Math.floor(n / 10)] ?? '';
    return n % 10 === 0 ? tens : `${tens}-${cardinal(n % 10)}`;
  }
  if (n >= 1000) return String(n);
  const hundreds = `${cardinal(Math.floor(n / 100))} hundred`;
  return n % 100 === 0 ? hundreds : `${hundreds} ${cardinal(n % 100)}`;
}

function fractionInWords(num: number, den: number): string {
  const names = PARTS[den];
  if (!names) return `${cardinal(num)} over ${cardinal(den)}`;
  return `${cardinal(num)} ${num === 1 ? names[0] : names[1]}`;
}

function unitName(unit: Unit, one: boolean): string {
  if (unit === 'in') return one ? 'inch' : 'inches';
  return one ? 'millimetre' : 'millimetres';
}

/** A length as it is said: "one and three eighths inches", "one half inch", "19.05 millimetres". */
export function lengthInWords(ticks: Length, unit: Unit, style: LengthStyle = {}): string {
  const { whole, num, den } = lengthParts(Math.abs(ticks), unit, style);
  const minus = ticks < 0 ? 'minus ' : '';
  if (num === null || den === null) {
    const said = whole.includes('.') ? whole : cardinal(Number(whole));
    return `${minus}${said} ${unitName(unit, whole === '1')}`;
  }
  const fraction = fractionInWords(num, den);
  if (whole !== '') return `${minus}${cardinal(Number(whole))} and ${fraction} inches`;
  return den === 2 ? `${minus}${fraction} inch` : `${minus}${fraction} of an inch`;
}

/** A deviation as it is said: "one sixteenth of an inch under", "on target". */
export function deviationInWords(ticks: Length, unit: Unit, style: LengthStyle = {}): string {
  if (ticks === 0) return 'on target';
  return `${lengthInWords(Math.abs(ticks), unit, style)} ${ticks > 0 ? 'over' : 'under'}`;
}
