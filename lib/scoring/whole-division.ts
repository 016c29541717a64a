/** ⌊dividend / divisor⌋ without a rounded quotient, for whole numbers below 2^53, dividend >= 0, divisor > 0. */
export function divideDown(dividend: number, divisor: number): number {
  return (dividend - (dividend % divisor)) / divisor;
}

/** ⌈dividend / divisor⌉, as `divideDown`. */
export function divideUp(dividend: number, divisor: number): number {
  return dividend % divisor === 0 ? dividend / divisor : divideDown(dividend, divisor) + 1;
}

/** The whole number nearest to dividend / divisor, a half going up, as `divideDown`. */
export function divideHalfUp(dividend: number, divisor: number): number {
  const rest = dividend % divisor;
  return (dividend - rest) / divisor + (2 * rest >= divisor ? 1 : 0);
}
