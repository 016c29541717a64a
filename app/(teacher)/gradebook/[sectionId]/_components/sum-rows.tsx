import { pointsAsText } from '@/components/ui/points-text';
import type { ExplanationView } from '@/lib/contracts/gradebook';
import { count } from '../../../_components/names';

export interface SumProps {
  explanation: ExplanationView;
  both: boolean;
}

/** What was lost and kept, the prediction, what rounding does, and the score: kept and all below it add up to it. */
export function SumRows({ explanation, both }: SumProps) {
  const { lost, kept, possible, rest, held, score, floorGives, published } = explanation;
  return (
    <tfoot>
      <Sum label="lost" points={lost.points} ofTotal={lost.ofTotal} both={both} />
      {floorGives > 0 ? (
        <Sum label="given back: no score falls lower" points={floorGives} both={both} />
      ) : null}
      <Sum
        label={`kept, of ${pointsAsText(possible)}`}
        points={kept.points}
        ofTotal={kept.ofTotal}
        both={both}
      />
      <Prediction explanation={explanation} both={both} />
      {rest === 0 ? null : <Sum label={restOf(explanation)} ofTotal={rest} both={both} signed />}
      {held ? (
        <Sum
          label={`held: version ${held.versionNumber} gave more`}
          ofTotal={held.points}
          both={both}
          signed
        />
      ) : null}
      <tr className="border-t border-ink text-text font-[700]">
        <th scope="row" colSpan={both ? 5 : 4} className="pt-1.5 text-left">
          {published ? 'score' : 'so far'}, to the nearest {nearest(explanation.roundTo)}
        </th>
        <td className="pt-1.5 pl-1 text-right">{score === null ? 'none' : pointsAsText(score)}</td>
      </tr>
    </tfoot>
  );
}

function Prediction({ explanation, both }: SumProps) {
  const { judgement, bonus, predicted } = explanation;
  if (judgement === null) {
    return predicted === null ? null : (
      <Sum
        label={`predicted ${pointsAsText(predicted)}, locked late: earns nothing`}
        both={both}
        ofTotal={0}
      />
    );
  }
  const { agree, of, caught, offBand } = judgement;
  const words = `prediction: ${agree} of ${of} agree${offBand > 0 ? `, ${caught} of ${offBand} caught` : ''}`;
  return <Sum label={words} ofTotal={bonus} both={both} signed />;
}

interface SumRowProps {
  label: string;
  points?: number;
  ofTotal?: number;
  both: boolean;
  signed?: boolean;
}

function Sum({ label, points, ofTotal, both, signed = false }: SumRowProps) {
  const text = (value: number | undefined) =>
    value === undefined ? null : `${signed && value > 0 ? '+' : ''}${pointsAsText(value)}`;
  const single = text(points ?? ofTotal);
  return (
    <tr>
      <th scope="row" colSpan={4} className="py-1 pr-1 text-left font-[520]">
        {label}
      </th>
      <td className="px-1 text-right">{both ? text(points) : single}</td>
      {both ? <td className="pl-1 text-right">{text(ofTotal)}</td> : null}
    </tr>
  );
}

function restOf({ daysLate, rest }: ExplanationView): string {
  if (daysLate > 0 && rest < -100) return `${count(daysLate, 'day', 'days')} late, and rounding`;
  return 'rounding';
}

function nearest(roundTo: number): string {
  if (roundTo === 100) return 'point';
  return roundTo === 50 ? 'half point' : roundTo === 10 ? 'tenth' : 'hundredth';
}
