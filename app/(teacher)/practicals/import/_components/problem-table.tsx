import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { Refusal } from '@/components/ui/refusal';
import type { ShownProblem } from '../actions';

const MOST_SHOWN = 100;

interface ProblemTableProps {
  problems: readonly ShownProblem[];
  fileName: string | null;
}

/** Everything in a file that cannot be used, each with its line, its place and what is wrong with it. */
export function ProblemTable({ problems, fileName }: ProblemTableProps) {
  const more = problems.length - MOST_SHOWN;
  return (
    <Refusal
      title={`${problems.length === 1 ? 'One place' : `${problems.length} places`} in ${fileName ?? 'what you pasted'} cannot be used.`}
      className="[&>div]:max-w-none"
    >
      <p className="mb-3 max-w-[62ch]">
        Nothing was made, and nothing you typed is lost. Put these right, then make the practical again.
      </p>
      <Table caption="what cannot be used" className="max-w-[80rem]">
        <TableHead>
          <tr>
            <HeadCell className="w-24">line, column</HeadCell>
            <HeadCell className="md:w-[32%]">place</HeadCell>
            <HeadCell>what is wrong</HeadCell>
          </tr>
        </TableHead>
        <TableBody fives>
          {problems.slice(0, MOST_SHOWN).map(({ line, column, place, path, reason, excerpt }) => (
            <tr key={`${line} ${column} ${path} ${reason}`}>
              <RowHead className="whitespace-nowrap font-[480]">
                {line}, {column}
              </RowHead>
              <Cell>
                {place}
                {path ? (
                  <code className="block font-text text-small break-all text-ink-2">{path}</code>
                ) : null}
              </Cell>
              <Cell>
                {reason}
                <code className="block font-text text-small break-all text-ink-2">{excerpt}</code>
              </Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
      {more > 0 ? <p className="mt-2 text-label">and {more} more</p> : null}
    </Refusal>
  );
}
