import { combineAttempts, type Points } from '@/lib/scoring';
import type { RedoPolicy } from '@/lib/scoring/rubric-form';

/**
 * The score that counts of a student's attempts, oldest first, by the rubric's rule for redos; null when none has a
 * score. Attempts that come to different totals (a piece was excused in one of them) cannot be weighed against each
 * other: the last one with a score counts.
 */
export function countedScore(
  policy: RedoPolicy,
  attempts: readonly { score: Points | null; total: Points }[],
): { score: Points; total: Points } | null {
  const scored = attempts.filter((attempt) => attempt.score !== null);
  const last = scored.at(-1);
  if (!last || last.score === null) return null;
  const same = scored.every(({ total }) => total === last.total);
  const score = same ? combineAttempts(policy, scored) : last.score;
  return { score: score ?? last.score, total: last.total };
}

/** How the rule is said to people. */
export function redoInWords(policy: RedoPolicy): string {
  if (policy.kind === 'average') return 'the mean of the attempts counts';
  const cap = `a redo is worth at most ${policy.capPercent}%`;
  return policy.kind === 'higher' ? `the higher counts; ${cap}` : `the latest counts; ${cap}`;
}
