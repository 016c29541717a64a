import { LossTable } from '@/components/loss/loss-table';
import { ScoreRule } from '@/components/rule/score-rule';
import { pointsAsText } from '@/components/ui/points-text';
import type { OwnResultView } from '@/lib/data/own/read-result';
import { largestDisagreements, pairReadings } from '@/lib/practicals/compare-readings';
import { explainScore } from '@/lib/practicals/explain-score';
import { lengthPattern } from '@/lib/practicals/length-pattern';
import type { ScoreSheet } from '@/lib/scoring';
import { AllReadings } from './all-readings';
import { Disagreements } from './disagreements';
import { JudgementWords } from './judgement-words';
import { PatternNote } from './pattern-note';
import { WherePointsWent } from './where-points-went';

const MOST_DISAGREEMENTS = 3;

/** A measured result: the score beside the prediction, what they disagree about, and where every point went. */
export function MeasuredResult({ result, sheet }: { result: OwnResultView; sheet: ScoreSheet }) {
  const { rubric, policies, ownSheet, bonus, held, judgement, predicted } = result;
  const explanation = explainScore(rubric, sheet, bonus, held?.points);
  const own = ownSheet && predicted !== null ? explainScore(rubric, ownSheet, 0).kept.ofTotal : null;
  const pairs = pairReadings(rubric, ownSheet, sheet, policies.prediction.agreeWithin);
  const pattern = lengthPattern(rubric, sheet);
  return (
    <>
      <section aria-label="score">
        <p className="text-label text-ink-2">
          {pointsAsText(explanation.kept.ofTotal)} of {pointsAsText(sheet.total)}
          {bonus > 0 ? `, and ${pointsAsText(bonus)} for how well you measured` : ''}
          {held ? `, and ${pointsAsText(held.points)} held from version ${held.versionNumber}` : ''}
          {predicted === null ? '' : `; you predicted ${pointsAsText(predicted)}`}
        </p>
        <ScoreRule bench={explanation.kept.ofTotal} own={own} total={sheet.total} className="mt-1" />
        <JudgementWords judgement={judgement} policy={policies.prediction} rubric={rubric} />
      </section>
      {pattern ? <PatternNote pattern={pattern} rubric={rubric} /> : null}
      {ownSheet ? (
        <Disagreements
          rubric={rubric}
          pairs={largestDisagreements(pairs, MOST_DISAGREEMENTS)}
          compared={pairs.filter(({ apart }) => apart !== null).length}
        />
      ) : null}
      <WherePointsWent sheet={sheet} />
      <LossTable
        rubric={rubric}
        explanation={explanation}
        heading="Every lost point"
        heldFrom={held?.versionNumber}
      />
      {ownSheet ? <AllReadings rubric={rubric} pairs={pairs} /> : null}
    </>
  );
}
