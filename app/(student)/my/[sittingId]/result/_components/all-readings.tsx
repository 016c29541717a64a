import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LengthText } from '@/components/ui/fraction';
import type { ReadingPair } from '@/lib/practicals/compare-readings';
import { findPiece } from '@/lib/round/pieces';
import type { Rubric, SizeSheet } from '@/lib/scoring';

/** Reading beside reading for every size that the bench has. */
export function AllReadings({ rubric, pairs }: { rubric: Rubric; pairs: readonly ReadingPair[] }) {
  return (
    <details>
      <summary className="min-h-11 cursor-pointer border-b-outline border-ink py-2 text-heading">
        All readings side by side
      </summary>
      <Table caption="all readings">
        <TableHead>
          <tr>
            <HeadCell>size</HeadCell>
            <HeadCell align="right">target</HeadCell>
            <HeadCell align="right">yours</HeadCell>
            <HeadCell align="right">bench</HeadCell>
          </tr>
        </TableHead>
        <TableBody fives>
          {pairs.map((pair) => {
            const place = findPiece(rubric, pair);
            return (
              <tr key={`${pair.lineId}/${pair.ordinal}/${pair.axis}`}>
                <RowHead>
                  {place?.label}, {pair.axis}
                  {pair.ownOrdinal !== null && pair.ownOrdinal !== pair.ordinal ? (
                    <span className="text-label text-ink-2"> (your no. {pair.ownOrdinal})</span>
                  ) : null}
                </RowHead>
                <Cell align="right">
                  {place ? <LengthText ticks={place.line.target[pair.axis]} unit={rubric.unit} /> : null}
                </Cell>
                <Cell align="right">
                  <Read size={pair.own} rubric={rubric} unread="couldn’t read" />
                </Cell>
                <Cell align="right">
                  <Read size={pair.bench} rubric={rubric} unread="not read" />
                </Cell>
              </tr>
            );
          })}
        </TableBody>
      </Table>
    </details>
  );
}

function Read({ size, rubric, unread }: { size: SizeSheet | null; rubric: Rubric; unread: string }) {
  if (!size) return <span className="text-ink-2">no piece beside it</span>;
  if (size.used !== null) return <LengthText ticks={size.used} unit={rubric.unit} />;
  return <span className="text-ink-2">{size.band === 'unread' ? unread : size.band}</span>;
}
