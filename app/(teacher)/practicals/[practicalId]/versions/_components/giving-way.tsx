import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { DraftDifference } from '@/lib/practicals/field-names';

const MOST_SHOWN = 12;

/** Field by field what the draft says now and what it would say. */
export function GivingWay({ differences, number }: { differences: DraftDifference[]; number: number }) {
  const more = differences.length - MOST_SHOWN;
  return (
    <div>
      <Table caption="what of the draft gives way">
        <TableHead>
          <tr>
            <HeadCell>field</HeadCell>
            <HeadCell>draft</HeadCell>
            <HeadCell>version {number}</HeadCell>
          </tr>
        </TableHead>
        <TableBody>
          {differences.slice(0, MOST_SHOWN).map(({ path, name, here, there }) => (
            <tr key={path}>
              <RowHead className="text-label font-[480]">{name}</RowHead>
              <Cell className="max-w-48 text-label break-words">{shorten(here)}</Cell>
              <Cell className="max-w-48 text-label break-words">{shorten(there)}</Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
      {more > 0 ? (
        <p className="mt-2 text-label">{`and ${more} more ${more === 1 ? 'field' : 'fields'}`}</p>
      ) : null}
    </div>
  );
}

function shorten(text: string): string {
  if (text === '') return 'empty';
  return text.length > 120 ? `${text.slice(0, 119)}…` : text;
}
