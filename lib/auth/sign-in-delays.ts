/** Failures in a row after which an account opens again only by a reset (SP 800-63B allows at most 100). */
export const MAX_FAILURES = 100;

const FREE_FAILURES = 3;
const FIRST_WAIT_S = 5;
const LONGEST_WAIT_S = 900;

/** Seconds to wait after so many failures in a row: none for three, then 5, 10, 20 … up to a quarter of an hour. */
export function waitAfter(failures: number): number {
  if (failures <= FREE_FAILURES) return 0;
  return Math.min(LONGEST_WAIT_S, FIRST_WAIT_S * 2 ** (failures - FREE_FAILURES - 1));
}

/** A wait as people say it: `20 seconds`, `3 minutes`; rounded up. */
export function sayWait(seconds: number): string {
  if (seconds < 60) return seconds === 1 ? '1 second' : `${seconds} seconds`;
  const minutes = Math.ceil(seconds / 60);
  return minutes === 1 ? '1 minute' : `${minutes} minutes`;
}
