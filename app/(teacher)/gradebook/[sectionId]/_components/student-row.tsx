import { memo, type ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { sayDay } from '@/components/ui/days';
import type { GradebookCell, GradebookView } from '@/lib/contracts/gradebook';
import { rosterName } from '../../../_components/names';
import { cellSaid, tenthsAsText } from './cell-words';
import type { GradebookStudent } from './columns';
import { GradeCell } from './grade-cell';
import type { Selection } from './gradebook-table';
import { placeOf, walkCells } from './walk-cells';

interface StudentRowProps {
  student: GradebookStudent;
  book: GradebookView;
  full: number;
  selection: Selection | null;
  onSelect: (selection: Selection) => void;
  /** The row's place from the top, for the arrow keys. */
  at: number;
}

export const StudentRow = memo(function StudentRow(props: StudentRowProps) {
  const { student, book, full, selection, onSelect, at } = props;
  const name = rosterName(student);
  const since = lateStart(student, book);
  return (
    <tr className="h-11 md:h-6">
      <th
        scope="row"
        className="sticky left-0 z-[1] max-w-28 bg-sheet pr-2 text-left text-label leading-4 font-[520] md:max-w-56 md:truncate md:text-text md:leading-[1.3125rem] md:whitespace-nowrap"
      >
        {name}
        {student.leftOn ? <Aside>left {sayDay(student.leftOn, student.leftOn)}</Aside> : null}
        {since && !student.leftOn ? <Aside>since {sayDay(since, since)}</Aside> : null}
      </th>
      <td className="px-2 text-label text-ink-2 max-md:hidden">{student.localId}</td>
      {book.sittings.map(({ sittingId, title }, index) => (
        <SittingCell
          key={sittingId}
          cell={student.cells[index] ?? null}
          full={full}
          place={placeOf(at, index)}
          said={`${name}, ${title}`}
          isSelected={selection?.studentId === student.studentId && selection.sittingId === sittingId}
          onSelect={() => onSelect({ studentId: student.studentId, sittingId })}
        />
      ))}
      <td className="border-l border-ink pl-2 text-right font-[660]">
        {student.mean === null ? <span className="sr-only">none yet</span> : tenthsAsText(student.mean)}
      </td>
    </tr>
  );
});

interface SittingCellProps {
  cell: GradebookCell | null;
  full: number;
  place: string;
  /** Whose cell of which practical. */
  said: string;
  isSelected: boolean;
  onSelect: () => void;
}

function SittingCell({ cell, full, place, said, isSelected, onSelect }: SittingCellProps) {
  return (
    <td className="relative border-l border-rule p-0">
      {cell ? (
        <button
          type="button"
          data-place={place}
          onKeyDown={walkCells}
          aria-label={cellSaid(said, cell)}
          aria-pressed={isSelected}
          onClick={onSelect}
          className={classNames(
            'block h-full min-h-11 w-full px-1 hover:bg-act-wash md:min-h-6',
            isSelected && 'outline-3 -outline-offset-2 outline-act',
          )}
        >
          <GradeCell cell={cell} full={full} />
        </button>
      ) : (
        <GradeCell cell={null} full={full} />
      )}
    </td>
  );
}

function Aside({ children }: { children: ReactNode }) {
  return (
    <span className="text-small font-[480] max-md:block md:ml-2 font-stretch-[88%] text-ink-2">
      {children}
    </span>
  );
}

/** The day somebody joined, when that was after the section's first practical was given. */
function lateStart({ joinedOn }: GradebookStudent, { sittings }: GradebookView): string | null {
  const first = sittings[0]?.openedAt.slice(0, 10);
  return joinedOn && first && joinedOn > first ? joinedOn : null;
}
