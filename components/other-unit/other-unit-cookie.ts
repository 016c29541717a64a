export const OTHER_UNIT_COOKIE = 'trymark-other-unit';

/** Whether a cookie asks for sizes in the other unit too; off unless it plainly does. */
export function parseOtherUnit(value: string | undefined): boolean {
  return value === 'on';
}
