import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayShortDay } from '@/components/ui/days';
import type { RosterStudentView, RosterView } from '@/lib/data/sections/read-roster';
import { sayName, saySection } from '../../_components/words';

interface LeftTableProps {
  section: RosterView;
  students: readonly RosterStudentView[];
}

/** Who was in the section, folded away; what they made is kept, and they can be brought back. */
export function LeftTable({ section, students }: LeftTableProps) {
  return (
    <details className="mt-6">
      <summary className="mb-2 py-2 marker:text-ink-2">
        <span className="link font-[620]">
          {students.length === 1 ? 'one has left' : `${students.length} have left`}
        </span>
      </summary>
      <Table caption={`who has left ${saySection(section)}, by name`} className="max-w-[58rem]">
        <TableHead>
          <tr>
            <HeadCell>student</HeadCell>
            <HeadCell>ID</HeadCell>
            <HeadCell>since</HeadCell>
            <HeadCell>left</HeadCell>
          </tr>
        </TableHead>
        <TableBody>
          {students.map((student) => (
            <tr key={student.studentId}>
              <RowHead>
                <Link className="link" href={`/periods/${section.sectionId}/students/${student.studentId}`}>
                  {sayName(student)}
                </Link>
              </RowHead>
              <Cell>{student.localId}</Cell>
              <Cell>{sayShortDay(student.joinedOn, section.today)}</Cell>
              <Cell>{student.leftOn ? sayShortDay(student.leftOn, section.today) : 'the school'}</Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
    </details>
  );
}
