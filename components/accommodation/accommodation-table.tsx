import type { ReactNode } from 'react';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LocalTime } from '@/components/ui/local-time';

/** A modified rubric as a row of its list. */
export interface AccommodationRow {
  accommodationId: string;
  familyName: string;
  givenName: string;
  sittingTitle: string | null;
  termName: string;
  words: readonly string[];
  madeBy: string;
  madeAt: string;
  ended: { by: string; at: string } | null;
}

interface AccommodationTableProps {
  caption: string;
  rows: readonly AccommodationRow[];
  /** What can be done with one. */
  acts: (row: AccommodationRow) => ReactNode;
}

export function AccommodationTable({ caption, rows, acts }: AccommodationTableProps) {
  return (
    <Table caption={caption}>
      <TableHead>
        <tr>
          <HeadCell>student</HeadCell>
          <HeadCell>for</HeadCell>
          <HeadCell>what is modified</HeadCell>
          <HeadCell>made</HeadCell>
          <HeadCell>
            <span className="sr-only">what can be done</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {rows.map((row) => (
          <tr key={row.accommodationId} className={row.ended ? 'text-ink-2' : undefined}>
            <RowHead className="min-w-36">{rosterNameOf(row)}</RowHead>
            <Cell className="min-w-32">{row.sittingTitle ?? `the term, ${row.termName}`}</Cell>
            <Cell className="min-w-56">
              {row.words.length === 0 ? 'nothing that this version asks for' : null}
              <ul>
                {row.words.map((word) => (
                  <li key={word}>{word}</li>
                ))}
              </ul>
            </Cell>
            <Cell className="min-w-40 text-label">
              {row.madeBy}, <LocalTime at={row.madeAt} style="day" />
              {row.ended ? (
                <span className="block">
                  ended by {row.ended.by}, <LocalTime at={row.ended.at} style="day" />
                </span>
              ) : null}
            </Cell>
            <Cell>
              <div className="flex flex-wrap justify-end gap-2">{acts(row)}</div>
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

function rosterNameOf({ familyName, givenName }: AccommodationRow): string {
  return [familyName, givenName].filter(Boolean).join(', ');
}
