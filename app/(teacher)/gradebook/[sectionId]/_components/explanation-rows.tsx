import type { ReactNode } from 'react';
import { DeviationStrip } from '@/components/rule/deviation-strip';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { ExplanationView } from '@/lib/contracts/gradebook';
import { count } from '../../../_components/names';

/** The points that fill half a strip in a row: the dearest size of most rubrics. */
const FULL = 400;

type LossRow = ExplanationView['rows'][number];

/** One row a lost point: target, reading, strip, points, and the same of the total. Both columns add up. */
export function ExplanationRows({ explanation }: { explanation: ExplanationView }) {
  const { rows, total, possible } = explanation;
  const both = total !== possible;
  return (
    <table className="tnum w-full border-collapse text-label">
      <caption className="sr-only">where the points went</caption>
      <thead>
        <tr className="border-b border-hair text-small text-ink-2">
          <th scope="col" className="py-1.5 pr-1 text-left font-[480]">
            size
          </th>
          <th scope="col" className="px-1 text-right font-[480]">
            target
          </th>
          <th scope="col" className="px-1 text-right font-[480]">
            reading
          </th>
          <th scope="col" className="px-1">
            <span className="sr-only">under or over</span>
          </th>
          <th scope="col" className="px-1 text-right font-[480]">
            points
          </th>
          {both ? (
            <th scope="col" className="pl-1 text-right font-[480]">
              of {pointsAsText(total)}
            </th>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <Row
            key={`${row.kind}-${row.piece}-${row.what}-${index.toString()}`}
            row={row}
            unit={explanation.unit}
            both={both}
          />
        ))}
        <FreeRows explanation={explanation} both={both} />
      </tbody>
      <SumRows explanation={explanation} both={both} />
    </table>
  );
}

function Row({ row, unit, both }: { row: LossRow; unit: 'in' | 'mm'; both: boolean }) {
  const under = row.deviation !== null && row.deviation < 0;
  return (
    <tr className="border-b border-hair">
      <th scope="row" className="py-1.5 pr-1 text-left font-[520]">
        {nameOf(row)}
      </th>
      <td className="px-1 text-right">
        {row.target === null ? null : <LengthText ticks={row.target} unit={unit} />}
      </td>
      <td className="px-1 text-right font-[660]">
        {row.reading === null ? row.word : <LengthText ticks={row.reading} unit={unit} />}
      </td>
      <td className="w-14 px-0">
        {row.deviation === null ? null : (
          <DeviationStrip
            under={under ? row.points : 0}
            over={under ? 0 : row.points}
            full={FULL}
            className="w-14"
          />
        )}
      </td>
      <td className="px-1 text-right">{pointsAsText(row.points)}</td>
      {both ? <td className="pl-1 text-right">{pointsAsText(row.ofTotal)}</td> : null}
    </tr>
  );
}

const WHOLE: Partial<Record<LossRow['kind'], string>> = {
  missing: 'missing',
  held: 'held',
  gross: 'not that part',
  capped: 'no more than its worth',
  set: 'as the worst of its set',
};

function nameOf({ kind, piece, what }: LossRow): ReactNode {
  const word = WHOLE[kind] ?? what;
  return piece === '' ? (
    word
  ) : (
    <>
      {piece} <span className="font-[480] text-ink-2">{word}</span>
    </>
  );
}

interface SumProps {
  explanation: ExplanationView;
  both: boolean;
}

/** What cost nothing, in a line or two. */
function FreeRows({ explanation: { free, goodChecks, unread, unit }, both }: SumProps) {
  const quiet = (key: string, children: ReactNode) => (
    <tr key={key} className="border-b border-hair text-ink-2">
      <th scope="row" colSpan={4} className="py-1.5 pr-1 text-left font-[480]">
        {children}
      </th>
      <td className="px-1 text-right">0</td>
      {both ? <td className="pl-1 text-right">0</td> : null}
    </tr>
  );
  return (
    <>
      {free.sizes > 0
        ? quiet(
            'free',
            <>
              {count(free.sizes, 'other size', 'other sizes')}
              {free.within === null ? (
                ' in the free band'
              ) : (
                <>
                  , all within <LengthText ticks={free.within} unit={unit} withUnit={false} />
                </>
              )}
            </>,
          )
        : null}
      {goodChecks.length > 0 ? quiet('checks', `${goodChecks.join(', ')}: good`) : null}
      {unread > 0 ? quiet('unread', `${count(unread, 'entry', 'entries')} not read yet`) : null}
    </>
  );
}

function SumRows({ explanation, both }: SumProps) {
  const { lost, kept, possible, rest, score, floorGives, published } = explanation;
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
