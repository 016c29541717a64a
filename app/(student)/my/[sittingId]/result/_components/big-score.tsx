import { pointsAsText } from '@/components/ui/points-text';
import type { Points } from '@/lib/scoring';

/** The score as large as the title allows. */
export function BigScore({ score, total }: { score: Points; total: Points }) {
  return (
    <p className="tnum shrink-0 text-score leading-none font-[680]">
      <span data-testid="score">{pointsAsText(score)}</span>
      <span className="sr-only"> of {pointsAsText(total)}</span>
    </p>
  );
}
