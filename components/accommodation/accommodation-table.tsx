import type { ReactNode } from 'react';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { classNames } from '@/components/ui/class-names';
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

/** On a phone the cells of a row stand below one another. */
const STACKED = 'max-md:p-0 md:min-w-36';

interface AccommodationTableProps {
  caption: string;
  rows: readonly AccommodationRow[];
  /** What can be done with one. */
  acts: (row: AccommodationRow) => ReactNode;
}

export function AccommodationTable({ caption, rows, acts }: AccommodationTableProps) {
  return (
    <Table caption={caption} className="max-md:block">
      <TableHead className="max-md:hidden">
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
      <TableBody className="max-md:block max-md:border-t-outline max-md:border-ink">
        {rows.map((row) => (
          <tr
            key={row.accommodationId}
            className={classNames('max-md:grid max-md:gap-1 max-md:py-3', row.ended && 'text-ink-2')}
          >
            <RowHead className={STACKED}>{rosterNameOf(row)}</RowHead>
            <Cell className={STACKED}>{row.sittingTitle ?? `the term, ${row.termName}`}</Cell>
            <Cell className={STACKED}>
              {row.words.length === 0 ? 'nothing that this version asks for' : null}
              <ul>
                {row.words.map((word) => (
                  <li key={word}>{word}</li>
                ))}
              </ul>
            </Cell>
            <Cell className={classNames(STACKED, 'text-label')}>
              <span className="md:hidden">made by </span>
              {row.madeBy}, <LocalTime at={row.madeAt} style="day" />
              {row.ended ? (
                <span className="block">
                  ended by {row.ended.by}, <LocalTime at={row.ended.at} style="day" />
                </span>
              ) : null}
            </Cell>
            <Cell className={STACKED}>
              <div className="flex flex-wrap gap-2 max-md:mt-2 md:justify-end">{acts(row)}</div>
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
