import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { pointsAsText } from '@/components/ui/points-text';
import type { MovedAttempt, MovePreview } from '@/lib/contracts/moves';
import type { Points } from '@/lib/scoring';
import { attemptName, dropsFirst, signedPoints } from './move-words';

/** Everyone of the sitting in figures, drops first. */
export function MoveTable({ preview: { students, from, to, lose } }: { preview: MovePreview }) {
  const both = from.total !== to.total;
  const scale = (total: Points) => (both ? ` of ${pointsAsText(total)}` : '');
  return (
    <Table caption="who moves, in figures" className="text-label">
      <TableHead>
        <tr>
          <HeadCell>student</HeadCell>
          <HeadCell align="right" className="md:whitespace-nowrap">
            version {from.number}
            {scale(from.total)}
          </HeadCell>
          <HeadCell align="right" className="md:whitespace-nowrap">
            version {to.number}
            {scale(to.total)}
          </HeadCell>
          <HeadCell align="right">change</HeadCell>
          {lose > 0 ? (
            <HeadCell align="right" className="whitespace-nowrap">
              if held
            </HeadCell>
          ) : null}
        </tr>
      </TableHead>
      <TableBody fives>
        {dropsFirst(students).map((attempt) => (
          <Row key={attempt.attemptId} attempt={attempt} heldShown={lose > 0} />
        ))}
      </TableBody>
    </Table>
  );
}

function Row({ attempt, heldShown }: { attempt: MovedAttempt; heldShown: boolean }) {
  const { before, after, change, held } = attempt;
  const name = <RowHead className="py-1.5 md:whitespace-nowrap">{attemptName(attempt)}</RowHead>;
  if (before === null && after === null) {
    return (
      <tr>
        {name}
        <Cell colSpan={heldShown ? 4 : 3} align="right" className="py-1.5 text-ink-2">
          no number under either
        </Cell>
      </tr>
    );
  }
  const moves = change !== null && change !== 0;
  return (
    <tr>
      {name}
      <Figure points={before} />
      <Figure points={after} />
      <Cell align="right" className={moves ? 'py-1.5 font-[660]' : 'py-1.5 text-ink-2'}>
        {change === null ? '' : change === 0 ? 'stays' : signedPoints(change)}
      </Cell>
      {heldShown ? <Figure points={held} quiet={change === null || change >= 0} /> : null}
    </tr>
  );
}

function Figure({ points, quiet = false }: { points: Points | null; quiet?: boolean }) {
  return (
    <Cell align="right" className={quiet || points === null ? 'py-1.5 text-ink-2' : 'py-1.5'}>
      {points === null ? 'none' : pointsAsText(points)}
    </Cell>
  );
}
