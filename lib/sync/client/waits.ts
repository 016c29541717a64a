const FIRST_MS = 1_000;
const LONGEST_MS = 60_000;

/**
 * How long to wait after so many failures in a row: doubling from a second to a minute, each somewhere in its upper
 * half, so that thirty tablets do not come back at the same instant. `random` gives 0 to below 1.
 *
 * @example waitAfter(3, () => 0.5) // 3000: the third wait is 2 to 4 seconds
 */
export function waitAfter(failures: number, random: () => number): number {
  const full = Math.min(LONGEST_MS, FIRST_MS * 2 ** Math.max(0, failures - 1));
  return Math.round(full * (0.5 + random() / 2));
}
