'use client';

import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { AllLinesRow } from './all-lines-row';
import { ROW } from './cut-list-layout';
import { CutListRow } from './cut-list-row';
import { useEditor } from './editor-context';
import { RowNotes } from './row-notes';
import type { Sheet } from './use-sheet';

const HEAD = 'text-left text-label leading-4 font-[480] text-ink-2';
const GROUP = 'text-left text-label font-[640]';

/** The cut list and its prices, typed like a sheet. */
export function CutList({ sheet }: { sheet: Sheet }) {
  const { unit, errorsAt } = useEditor();
  return (
    <section aria-label="cut list and prices">
      <table className="block w-full">
        <caption className="sr-only">
          Cut list. Enter goes down a column, and adds a line below the last; Alt with an arrow key moves a
          line; rows of a spreadsheet can be pasted.
        </caption>
        <thead className="hidden border-b-outline border-ink pb-1.5 lg:block">
          <tr aria-hidden className={ROW}>
            <td className={classNames(GROUP, 'col-span-3 col-start-4')}>
              target, {unit === 'in' ? 'inches' : 'millimetres'}
            </td>
            <td className={classNames(GROUP, 'col-span-3')}>points</td>
            <td className={classNames(GROUP, 'col-span-3')}>price of error</td>
          </tr>
          <tr className={ROW}>
            <th scope="col" className="sr-only">
              line
            </th>
            <th scope="col" className={classNames(HEAD, 'col-start-2')}>
              part
            </th>
            {['pieces', 'thickness', 'width', 'length', 'worth', 'missing', 'checks'].map((column) => (
              <th key={column} scope="col" className={HEAD}>
                {column}
              </th>
            ))}
            {['thickness', 'width', 'length'].map((axis) => (
              <th key={axis} scope="col" className={classNames(HEAD, 'narrow')}>
                <span className="sr-only">price of </span>
                {axis}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="block">
          <AllLinesRow />
          <RowNotes base="all" fields={['worth', 'missing']} />
          {sheet.lines.map((line, index) => (
            <CutListRow key={line.id} {...{ line, index, sheet }} />
          ))}
        </tbody>
      </table>
      {errorsAt('lines').map((error) => (
        <p key={error} role="alert" className="mt-2 text-label font-[580] text-refuse">
          {error}
        </p>
      ))}
      <div className="mt-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button onClick={sheet.addLine}>add a line</Button>
        {sheet.removed ? (
          <p className="text-label">
            {sheet.removed.line.label || 'A line'} is removed.{' '}
            <Button kind="quiet" size="small" className="px-1" onClick={sheet.undoRemove}>
              undo
            </Button>
          </p>
        ) : null}
        <p role="status" className="text-label text-ink-2">
          {sheet.said}
        </p>
      </div>
    </section>
  );
}
