import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayShortDay } from '@/components/ui/days';
import type { RosterStudentView, RosterView } from '@/lib/data/sections/read-roster';
import { sayName, saySection } from '../../_components/words';
import { PASSPHRASE_WORDS } from './roster-words';

interface RosterTableProps {
  section: RosterView;
  students: readonly RosterStudentView[];
}

export function RosterTable({ section, students }: RosterTableProps) {
  return (
    <Table caption={`students of ${saySection(section)}, by name`} className="max-w-[58rem]">
      <TableHead>
        <tr>
          <HeadCell>student</HeadCell>
          <HeadCell>ID</HeadCell>
          <HeadCell className="max-sm:hidden">since</HeadCell>
          <HeadCell>passphrase</HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {students.map((student) => (
          <tr key={student.studentId}>
            <RowHead>
              <Link
                className="link inline-block py-0.5"
                href={`/periods/${section.sectionId}/students/${student.studentId}`}
              >
                {sayName(student)}
              </Link>
              {student.leftOn ? (
                <span className="ml-2 text-label font-[480] whitespace-nowrap">
                  leaves {sayShortDay(student.leftOn, section.today)}
                </span>
              ) : null}
            </RowHead>
            <Cell>{student.localId ?? <span className="text-label text-ink-2">no ID</span>}</Cell>
            <Cell className="max-sm:hidden">{sayShortDay(student.joinedOn, section.today)}</Cell>
            <Cell className={student.passphrase === 'none' ? 'font-[580]' : 'text-ink-2'}>
              {student.isStaff ? 'works here' : PASSPHRASE_WORDS[student.passphrase]}
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
