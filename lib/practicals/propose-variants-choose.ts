import { alike, type ReachedLine } from './propose-variants-lent';
import type { Candidate } from './propose-variants-search';
import type { Stop } from './propose-variants-types';

/** Comparisons of two lines; a bound in work and not in time. */
const MOST_WORK = 600_000;

/** As many candidates as wanted whose pieces cannot be lent to each other; the cheapest that go together. */
export function chooseApart(
  candidates: readonly Candidate[],
  count: number,
): { chosen: Candidate[]; stop: Stop | null } {
  const known = new Map<number, boolean>();
  const clashes = new Map<number, number>();
  let best: number[] = [];
  let work = 0;

  function goTogether(a: number, b: number): boolean {
    work += 1;
    const key = a * candidates.length + b;
    const before = known.get(key);
    if (before !== undefined) return before;
    const others = candidates[b]?.lines ?? [];
    const clash = candidates[a]?.lines.findIndex((line) => isLent(line, others)) ?? -1;
    if (clash >= 0) clashes.set(clash, (clashes.get(clash) ?? 0) + 1);
    known.set(key, clash < 0);
    return clash < 0;
  }

  function isLent(line: ReachedLine, others: readonly ReachedLine[]): boolean {
    work += others.length;
    return others.some((other) => alike(line, other));
  }

  /** Adds to those chosen from those that go with all of them; true when there is no need to look further. */
  function extend(chosen: number[], free: readonly number[]): boolean {
    if (chosen.length > best.length) best = chosen;
    if (best.length === count || work > MOST_WORK) return true;
    for (const [place, next] of free.entries()) {
      if (chosen.length + free.length - place <= best.length) return false;
      const still = free.slice(place + 1).filter((other) => goTogether(next, other));
      if (extend([...chosen, next], still)) return true;
    }
    return false;
  }

  extend(
    [],
    candidates.map((_, index) => index),
  );
  const [most] = [...clashes].sort((a, b) => b[1] - a[1]);
  const stop: Stop = { line: most?.[0] ?? 0, why: 'taken' };
  return {
    chosen: best.flatMap((index) => candidates[index] ?? []),
    stop: best.length === count ? null : stop,
  };
}
