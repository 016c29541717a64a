import type { Unit } from '@/lib/length';

/** Whole eighths have keys of their own; finer fractions are built with `and` and a denominator. */
export const FRACTION_KEYS = ['1/8', '1/4', '3/8', '1/2', '5/8', '3/4', '7/8'] as const;
export const DENOMINATOR_KEYS = ['/16', '/32', '/64'] as const;

const LONGEST = 14;

/**
 * The text after a key: the text is always what the reading is parsed from, so what is seen is what is kept.
 * Null when the key makes no sense there.
 */
export function pressKey(text: string, key: string): string | null {
  if (key === 'rub') return text === '' ? null : text.slice(0, -1).trimEnd();
  if (text.length >= LONGEST) return null;
  if (/^\d$/.test(key)) return /\/\d+$/.test(text) ? null : text + key;
  if (key === '.') return /[./ ]/.test(text) ? null : `${text}.`;
  if (key === 'and') return /^\d+$/.test(text) ? `${text} ` : null;
  if (DENOMINATOR_KEYS.some((each) => each === key)) return /^(\d+ )?\d+$/.test(text) ? text + key : null;
  if (FRACTION_KEYS.some((each) => each === key)) {
    if (text === '') return key;
    return /^\d+ ?$/.test(text) ? `${text.trimEnd()} ${key}` : null;
  }
  return null;
}

export function otherUnit(unit: Unit): Unit {
  return unit === 'in' ? 'mm' : 'in';
}
