import type { Points } from '@/lib/scoring';

/**
 * The simple mean of scores as tenths of a percent, rounded half up once and exactly; null when there are none. Every
 * practical counts the same, whatever it is out of.
 * @example termMean([{ score: 8600, total: 10000 }, { score: 9500, total: 10000 }]) // 905
 */
export function termMean(scores: readonly { score: Points; total: Points }[]): number | null {
  const counted = scores.filter(({ total }) => total > 0);
  if (counted.length === 0) return null;
  let sum = 0n;
  let over = 1n;
  for (const { score, total } of counted) {
    sum = sum * BigInt(total) + BigInt(score) * over;
    over *= BigInt(total);
  }
  const unit = over * BigInt(counted.length);
  return Number((sum * 2000n + unit) / (2n * unit));
}
