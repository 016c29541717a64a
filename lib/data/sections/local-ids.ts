/** An ID that the product makes where none is given: W and a running number of four digits, once in a school. */
const MADE_ID = /^W(\d{4,9})$/;

/** How the rule is said to people. */
export const MADE_ID_RULE =
  'Where no ID is given, one is made: W and the next free number of your school, such as W0001.';

/**
 * The next `count` IDs, in order, after the highest number that the school has used.
 * @example madeIds(['W0007', '00417'], 2) // ['W0008', 'W0009']
 */
export function madeIds(taken: readonly string[], count: number): string[] {
  const numbers = taken.map((id) => Number(MADE_ID.exec(id)?.[1] ?? 0));
  const highest = numbers.reduce((a, b) => Math.max(a, b), 0);
  return Array.from({ length: count }, (_, index) => `W${String(highest + 1 + index).padStart(4, '0')}`);
}
