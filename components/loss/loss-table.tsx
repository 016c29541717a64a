import { Cell, HeadCell, RowHead, Table, TableBody, TableFoot, TableHead } from '@/components/table/table';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import type { ScoreExplanation } from '@/lib/practicals/explain-score';
import type { Points, Rubric } from '@/lib/scoring';
import { LossCause, LossSizes } from './loss-cause';
import { heldWords, restWords } from './loss-words';

interface LossTableProps {
  rubric: Rubric;
  explanation: ScoreExplanation;
  heading: string;
  /** The version that gave more, where a score is held. */
  heldFrom?: number | undefined;
}

/** Every lost point in a row of its own: target, reading, band, points and their share; they add up to the score. */
export function LossTable({ rubric, explanation, heading, heldFrom }: LossTableProps) {
  const { rows, possible, total } = explanation;
  const one = possible === total;
  return (
    <section>
      <Heading className="border-b-outline border-ink pb-1">{heading}</Heading>
      {rows.length === 0 ? <p className="py-3">Not a point is lost.</p> : null}
      <Table caption={heading}>
        <TableHead>
          <tr>
            <HeadCell>what</HeadCell>
            <HeadCell align="right">target</HeadCell>
            <HeadCell align="right">read</HeadCell>
            <HeadCell align="right">loses</HeadCell>
            {one ? null : <HeadCell align="right">of {pointsAsText(total)}</HeadCell>}
          </tr>
        </TableHead>
        <TableBody>
          {rows.map((row) => (
            <tr key={`${row.kind}/${row.lineId}/${row.ordinal}/${row.what}`}>
              <RowHead>
                <LossCause rubric={rubric} row={row} />
              </RowHead>
              <LossSizes rubric={rubric} row={row} />
              <Cell align="right">
                <strong>{pointsAsText(row.points)}</strong>
              </Cell>
              {one ? null : <Cell align="right">{pointsAsText(row.ofTotal)}</Cell>}
            </tr>
          ))}
        </TableBody>
        <Sums rubric={rubric} explanation={explanation} heldFrom={heldFrom} />
      </Table>
    </section>
  );
}

function Sums({ rubric, explanation, heldFrom }: Omit<LossTableProps, 'heading'>) {
  const { lost, kept, possible, total, bonus, held, rest, score, floorGives, floorGivesOfTotal } =
    explanation;
  const one = possible === total;
  return (
    <TableFoot className="[&_tr+tr]:border-t [&_tr+tr]:border-hair">
      <Sum label="lost" points={lost.points} ofTotal={lost.ofTotal} one={one} />
      {floorGives > 0 ? (
        <Sum
          label="given back: the score has a floor"
          points={floorGives}
          ofTotal={floorGivesOfTotal}
          one={one}
        />
      ) : null}
      <Sum
        label={`kept of ${pointsAsText(possible)}`}
        points={kept.points}
        ofTotal={kept.ofTotal}
        one={one}
      />
      {bonus > 0 ? (
        <Sum label="for how well you measured" points={null} ofTotal={bonus} one={one} plus />
      ) : null}
      {rest !== 0 ? (
        <Sum label={restWords(rubric, rest)} points={null} ofTotal={rest} one={one} plus />
      ) : null}
      {held > 0 ? <Sum label={heldWords(heldFrom)} points={null} ofTotal={held} one={one} plus /> : null}
      {score === null ? null : <Sum label="score" points={null} ofTotal={score} one={one} strong />}
    </TableFoot>
  );
}

interface SumProps {
  label: string;
  points: Points | null;
  ofTotal: Points;
  /** There is one scale: what would stand in the second column stands in the first. */
  one: boolean;
  plus?: boolean;
  strong?: boolean;
}

function Sum({ label, points, ofTotal, one, plus = false, strong = false }: SumProps) {
  const weight = strong ? 'font-[680]' : '';
  const sign = plus && ofTotal > 0 ? '+' : '';
  return (
    <tr className={weight}>
      <RowHead colSpan={3} className={weight}>
        {label}
      </RowHead>
      <Cell align="right">
        {one ? `${sign}${pointsAsText(ofTotal)}` : points === null ? '' : pointsAsText(points)}
      </Cell>
      {one ? null : (
        <Cell align="right">
          {sign}
          {pointsAsText(ofTotal)}
        </Cell>
      )}
    </tr>
  );
}
