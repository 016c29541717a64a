import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { PredictionJudgement, PredictionPolicy, Rubric } from '@/lib/scoring';

interface JudgementWordsProps {
  judgement: PredictionJudgement | null;
  policy: PredictionPolicy;
  rubric: Rubric;
}

/** How well the student measured, and why that brought what it brought. */
export function JudgementWords({ judgement, policy, rubric }: JudgementWordsProps) {
  if (!judgement) {
    return (
      <p className="mt-2 max-w-[62ch]">
        You locked no readings of your own, so nothing stands beside the bench’s.
      </p>
    );
  }
  if (judgement.because === 'nothing-to-judge') {
    return (
      <p className="mt-2 max-w-[62ch]">The bench measured nothing that your readings could be set beside.</p>
    );
  }
  const { agree, of, caught, offBand } = judgement;
  return (
    <p className="mt-2 max-w-[62ch]">
      {agree} of {of} sizes agree within <LengthText ticks={policy.agreeWithin} unit={rubric.unit} />.{' '}
      {offBand > 0
        ? `You caught ${caught} of the ${offBand} that lose points. `
        : 'None of them loses points. '}
      <Because judgement={judgement} policy={policy} />
    </p>
  );
}

function Because({ judgement, policy }: { judgement: PredictionJudgement; policy: PredictionPolicy }) {
  const { because, bonus, gap } = judgement;
  const share = ({ num, den }: { num: number; den: number }) => `${num} of ${den}`;
  switch (because) {
    case 'full':
      return `That is measured well: ${pointsAsText(bonus)} on top.`;
    case 'close':
      return `The two totals are ${pointsAsText(gap ?? 0)} apart, within ${pointsAsText(policy.closeWithin)}: ${pointsAsText(bonus)} on top.`;
    case 'too-few-agree':
      return `${share(policy.agreeShare)} have to agree, so nothing comes on top.`;
    case 'too-few-caught':
      return `${share(policy.caughtShare)} have to be caught, so nothing comes on top.`;
    case 'too-few-values':
      return `${share(policy.valueShare)} have to be read by number, so nothing comes on top.`;
    case 'nothing-to-judge':
      return null;
  }
}
