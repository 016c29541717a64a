import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { isOneScale } from '@/lib/practicals/both-scales';
import { pieceLabel } from '@/lib/practicals/task';
import type { TriedResult } from '@/lib/practicals/try-piece';
import type { Axis, Line, Rubric } from '@/lib/scoring';

interface TriedSentenceProps {
  rubric: Rubric;
  line: Line;
  axis: Axis;
  result: TriedResult;
}

/** "Reads 6 15/16: this length loses 1; end 1 loses 3 of 9, 4.76 of 100." */
export function TriedSentence({ rubric, line, axis, result }: TriedSentenceProps) {
  const { piece, lost, sheet } = result;
  const size = piece.sizes?.[axis];
  if (!size || size.reading === null) return null;
  const loses = size.lose === 0 ? 'nothing' : pointsAsText(size.lose);
  return (
    <>
      Reads <LengthText ticks={size.reading} unit={rubric.unit} withUnit={rubric.unit === 'mm'} />: this{' '}
      {axis} loses {loses}; {pieceLabel(line, 1)}
      {piece.gross ? ' is gross and' : ''} loses {lost.points === 0 ? 'nothing' : pointsAsText(lost.points)}{' '}
      of {pointsAsText(line.worth)}
      {isOneScale(rubric) || lost.points === 0
        ? ''
        : `, ${pointsAsText(lost.ofTotal)} of ${pointsAsText(sheet.total)}`}
      .
    </>
  );
}
