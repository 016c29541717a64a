import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { RosterRowView } from '@/lib/data/sections/roster-preview';
import { sayName } from '../../../_components/words';
import { count, type RowGroups } from './row-groups';

/** The rows that ask nothing: who comes in, and, folded away, who is there already. */
export function PlainRows({ groups: { coming, unchanged, conflicts, problems } }: { groups: RowGroups }) {
  const alone = conflicts.length + problems.length === 0;
  return (
    <>
      {coming.length > 0 ? (
        <RowTable
          rows={coming}
          caption={count(coming.length, 'one student comes in', 'students come in')}
          showCaption={!alone}
        />
      ) : null}
      {unchanged.length > 0 ? (
        <details>
          <summary className="py-2 marker:text-ink-2">
            <span className="link font-[620]">
              {count(unchanged.length, 'one is', 'are')} on the roster already
            </span>
          </summary>
          <RowTable rows={unchanged} caption="on the roster already" />
        </details>
      ) : null}
    </>
  );
}

interface RowTableProps {
  rows: readonly RosterRowView[];
  caption: string;
  showCaption?: boolean;
}

function RowTable({ rows, caption, showCaption }: RowTableProps) {
  return (
    <Table caption={caption} showCaption={showCaption} className="max-w-[64rem]">
      <TableHead>
        <tr>
          <HeadCell align="right" className="w-12">
            line
          </HeadCell>
          <HeadCell className="md:w-72">student</HeadCell>
          <HeadCell>ID</HeadCell>
          <HeadCell>what it does</HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {rows.map((row) => (
          <tr key={row.line}>
            <Cell align="right" className="text-ink-2">
              {row.line}
            </Cell>
            <RowHead>{sayName(row)}</RowHead>
            <Cell className="break-all">{row.localId || row.known?.localId || <Made />}</Cell>
            <Cell className="text-ink-2">{sayEffect(row)}</Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

function Made() {
  return <span className="text-label text-ink-2">is made</span>;
}

function sayEffect({ kind }: RosterRowView): string {
  switch (kind) {
    case 'new':
      return 'new in the school';
    case 'joins':
      return 'in the school already, joins';
    case 'returns':
      return 'was here before, comes back';
    default:
      return 'stays as it is';
  }
}
