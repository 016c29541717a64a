import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { RosterRowView } from '@/lib/data/sections/roster-preview';
import { sayName } from '../../../_components/words';
import { count } from './row-groups';

/** Each row that cannot be used, and why. */
export function ProblemRows({ rows }: { rows: readonly RosterRowView[] }) {
  if (rows.length === 0) return null;
  return (
    <Table
      caption={count(rows.length, 'one row cannot be used', 'rows cannot be used')}
      showCaption
      className="max-w-[64rem]"
    >
      <TableHead>
        <tr>
          <HeadCell align="right" className="w-12">
            line
          </HeadCell>
          <HeadCell className="md:w-72">as written</HeadCell>
          <HeadCell>why</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {rows.map((row) => (
          <tr key={row.line}>
            <RowHead className="text-right">{row.line}</RowHead>
            <Cell>
              <span className="block">{sayName(row) || 'no name'}</span>
              <span className="block text-label break-all text-ink-2">{row.localId || 'no ID'}</span>
            </Cell>
            <Cell className="font-[580] text-refuse">
              {row.problems.map((problem) => (
                <p key={problem}>{problem}</p>
              ))}
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
