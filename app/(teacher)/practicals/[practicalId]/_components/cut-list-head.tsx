import { classNames } from '@/components/ui/class-names';
import type { Unit } from '@/lib/length';
import { ROW } from './cut-list-layout';

const HEAD = 'text-left text-label leading-4 font-[480] text-ink-2';
const GROUP = 'text-left text-label font-[640]';

/** The heads of the columns; they stay in sight above a long list. */
export function CutListHead({ unit }: { unit: Unit }) {
  return (
    <thead className="sticky top-0 z-[5] hidden border-b-outline border-ink bg-sheet pb-1.5 lg:block">
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
        <th scope="col" className={classNames(HEAD, 'col-start-2 px-1')}>
          part
        </th>
        {['pieces', 'thickness', 'width', 'length'].map((column) => (
          <th key={column} scope="col" className={classNames(HEAD, 'px-1')}>
            {column}
          </th>
        ))}
        <th scope="col" className="sr-only">
          note
        </th>
        {['worth', 'missing', 'checks'].map((column) => (
          <th key={column} scope="col" className={classNames(HEAD, 'px-1')}>
            {column}
          </th>
        ))}
        {['thickness', 'width', 'length'].map((axis) => (
          <th key={axis} scope="col" className={classNames(HEAD, 'narrow px-1')}>
            <span className="sr-only">price of </span>
            {axis}
          </th>
        ))}
      </tr>
    </thead>
  );
}
