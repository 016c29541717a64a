import type { Header } from '@tanstack/react-table';
import type { ReactNode } from 'react';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { percentsOf } from './cell-words';
import { ColumnHead } from './column-head';
import type { features, GradebookStudent } from './columns';
import { SortButton } from './sort-button';
import { scaleFrom } from './spread';

interface HeadOfProps {
  header: Header<typeof features, GradebookStudent>;
  /** The sitting's place among the sittings; out of range for the other columns. */
  index: number;
  book: GradebookView;
}

/** The head of a column, whatever it holds: a key that sorts by it. */
export function HeadOf({ header, index, book }: HeadOfProps) {
  const { column } = header;
  const sorted = column.getIsSorted();
  const sort = (label: string, children: ReactNode, align: 'left' | 'right' = 'left') => (
    <SortButton sorted={sorted} onSort={() => column.toggleSorting()} label={label} align={align}>
      {children}
    </SortButton>
  );
  const common = {
    scope: 'col',
    'aria-sort': sorted === 'asc' ? 'ascending' : sorted === 'desc' ? 'descending' : 'none',
  } as const;
  if (column.id === 'student') {
    return (
      <th {...common} className={`sticky left-0 z-[2] bg-sheet pb-1 align-bottom md:w-52 md:min-w-50`}>
        {sort('student', 'student')}
      </th>
    );
  }
  if (column.id === 'localId') {
    return (
      <th {...common} className={`px-2 pb-1 align-bottom max-md:hidden md:w-16`}>
        {sort('ID', 'ID')}
      </th>
    );
  }
  if (column.id === 'mean') {
    return (
      <th {...common} className="w-14 border-l border-ink pb-1 pl-2 align-bottom">
        {sort('term', 'term', 'right')}
      </th>
    );
  }
  return (
    <th {...common} className="h-px w-42 min-w-38 px-1.5 align-bottom font-[480] text-ink-2">
      {sort(
        book.sittings[index]?.title ?? '',
        <ColumnHead book={book} index={index} from={scaleFrom(percentsOf(book))} />,
      )}
    </th>
  );
}
