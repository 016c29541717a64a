import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { PredictionPolicy, Rubric, Share } from '@/lib/scoring';

const shareText = ({ num, den }: Share) => `${num} of ${den}`;

/** What measuring well can bring, as the judgement will ask it. */
export function PredictionRule({ rubric, policy }: { rubric: Rubric; policy: PredictionPolicy }) {
  const { agreeWithin, agreeShare, caughtShare, valueShare, full, closeWithin, close } = policy;
  if (full === 0 && close === 0)
    return 'Measure your pieces yourself and lock the readings before the bench. It brings no points here.';
  return (
    <>
      Measure your pieces yourself and lock the readings before the bench.{' '}
      <strong>{pointsAsText(full)} on top</strong> if at least {shareText(agreeShare)} sizes agree with the
      bench within <LengthText ticks={agreeWithin} unit={rubric.unit} withUnit />, at least{' '}
      {shareText(caughtShare)} that lose points lose them by your reading too, and at least{' '}
      {shareText(valueShare)} are read by number.{' '}
      {close > 0 ? (
        <>
          <strong>{pointsAsText(close)} on top</strong> if you miss that but leave no size unread and the two
          totals are no more than {pointsAsText(closeWithin)} apart.
        </>
      ) : null}{' '}
      It is how well you measure that counts here, not how good the pieces are.
    </>
  );
}
