'use client';

import { type Row, useTable } from '@tanstack/react-table';
import { useMemo, useState } from 'react';
import { Table, TableBody, TableHead } from '@/components/table/table';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { isShown, type Shown } from './cell-words';
import { BEFORE_SITTINGS, columnsFor, features, type GradebookStudent } from './columns';
import { FilterBar } from './filter-bar';
import { HeadOf } from './head-of';
import { fullStrip } from './spread';
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
  const full = useMemo(() => fullStrip(book), [book]);
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
      <Table caption="students by practicals" className="w-auto">
        <TableHead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header, at) => (
                <HeadOf key={header.id} header={header} index={at - BEFORE_SITTINGS} book={book} />
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
