'use client';

import { type Header, type Row, useTable } from '@tanstack/react-table';
import { type ReactNode, useMemo, useState } from 'react';
import { Table, TableBody, TableHead } from '@/components/table/table';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { isShown, percentOf, type Shown } from './cell-words';
import { ColumnHead } from './column-head';
import { columnsFor, features, type GradebookStudent } from './columns';
import { FilterBar } from './filter-bar';
import { SortButton } from './sort-button';
import { scaleFrom } from './spread';
import { StudentRow } from './student-row';

export interface Selection {
  studentId: string;
  sittingId: string;
}

interface GradebookTableProps {
  book: GradebookView;
  selection: Selection | null;
  onSelect: (selection: Selection) => void;
}

/** At least this much loss fills half a strip, so that a good class does not look like a bad one. */
const LEAST_FULL = 600;

/** Students down, practicals across. Sorted by any column, filtered by text and by what a row has. */
export function GradebookTable({ book, selection, onSelect }: GradebookTableProps) {
  const [shown, setShown] = useState<Shown>('everyone');
  const columns = useMemo(() => columnsFor(book.sittings), [book.sittings]);
  const data = useMemo(
    () => book.students.filter(({ cells }) => isShown(cells, shown)),
    [book.students, shown],
  );
  const table = useTable({
    features,
    columns,
    data,
    globalFilterFn: 'includesString',
    getRowId: studentIdOf,
  });
  const percents = book.students.flatMap(({ cells }) => cells.flatMap((cell) => percentOf(cell) ?? []));
  const losses = book.students.flatMap(({ cells }) =>
    cells.flatMap((cell) => (cell ? [cell.lost.under, cell.lost.over] : [])),
  );
  const full = Math.max(
    LEAST_FULL,
    ...losses.sort((a, b) => a - b).slice(0, Math.ceil(losses.length * 0.97)),
  );
  const rows = table.getRowModel().rows;
  return (
    <div className="relative">
      <FilterBar
        text={String(table.state.globalFilter ?? '')}
        onText={(text) => table.setGlobalFilter(text)}
        shown={shown}
        onShown={setShown}
        found={rows.length}
        of={book.students.length}
      />
      <Table caption="students by practicals" className="w-auto min-w-full">
        <TableHead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header, at) => (
                <HeadOf key={header.id} header={header} at={at} book={book} from={scaleFrom(percents)} />
              ))}
            </tr>
          ))}
        </TableHead>
        <TableBody fives>
          {rows.map((row: Row<typeof features, GradebookStudent>, at) => (
            <StudentRow
              key={row.id}
              student={row.original}
              book={book}
              full={full}
              selection={selection}
              onSelect={onSelect}
              at={at}
            />
          ))}
        </TableBody>
      </Table>
      {rows.length === 0 ? <p className="py-6">Nobody here by that name or with that word.</p> : null}
    </div>
  );
}

function studentIdOf(student: GradebookStudent): string {
  return student.studentId;
}

interface HeadOfProps {
  header: Header<typeof features, GradebookStudent>;
  at: number;
  book: GradebookView;
  from: number;
}

function HeadOf({ header, at, book, from }: HeadOfProps) {
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
  const index = at - 2;
  return (
    <th {...common} className="h-px min-w-38 px-1.5 align-bottom font-[480] text-ink-2">
      {sort(book.sittings[index]?.title ?? '', <ColumnHead book={book} index={index} from={from} />)}
    </th>
  );
}
