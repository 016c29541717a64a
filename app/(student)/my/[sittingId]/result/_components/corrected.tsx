import { LocalTime } from '@/components/ui/local-time';
import { pointsAsText } from '@/components/ui/points-text';
import type { OwnResultView } from '@/lib/data/own/read-result';

/** A later publication told another result: what it was, what it is, and since when. */
export function Corrected({ result }: { result: OwnResultView }) {
  return (
    <p className="border-l-edge border-ink pl-3">
      <strong>{whatChanged(result)}</strong> on <LocalTime at={result.publishedAt} style="day" />. Your
      teacher corrected it; what stands here is what counts.
    </p>
  );
}

function whatChanged({ before, score, total }: OwnResultView): string {
  if (!before || before.score === null || score === null) return 'Your result changed';
  const of = (points: number) => (before.total === total ? '' : ` of ${pointsAsText(points)}`);
  const [was, is] = [pointsAsText(before.score), pointsAsText(score)];
  return `Your score changed from ${was}${of(before.total)} to ${is}${of(total)}`;
}
