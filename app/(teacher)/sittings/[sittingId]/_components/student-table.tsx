import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { SittingStudentView, SittingView } from '@/lib/data/sittings/read-sitting';
import { count, rosterName } from '../../../_components/names';
import { ChangeAttempt } from './change-attempt';
import { ProgressSign } from './progress-sign';

/** Everyone of a sitting: how far the bench has come, what was decided about them, and the way to change it. */
export function StudentTable({ sitting }: { sitting: SittingView }) {
  return (
    <Table caption="students of this sitting">
      <TableHead>
        <tr>
          <HeadCell>student</HeadCell>
          <HeadCell>at the bench</HeadCell>
          <HeadCell className="max-sm:hidden">own prediction</HeadCell>
          <HeadCell className="max-sm:hidden">late</HeadCell>
          <HeadCell>
            <span className="sr-only">change</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {sitting.students.map((student) => (
          <StudentRow key={student.attemptId} sitting={sitting} student={student} />
        ))}
      </TableBody>
    </Table>
  );
}

function StudentRow({ sitting, student }: { sitting: SittingView; student: SittingStudentView }) {
  const { attemptNumber, daysLate, locked, current } = student;
  return (
    <tr className={current ? undefined : 'text-ink-2'}>
      <RowHead>
        {rosterName(student)}
        {attemptNumber > 1 ? <span className="ml-2 font-[480]">attempt {attemptNumber}</span> : null}
        {daysLate > 0 ? (
          <span className="block text-label font-[480] text-ink-2 sm:hidden">{sayLate(daysLate)}</span>
        ) : null}
      </RowHead>
      <Cell>
        <ProgressSign student={student} />
      </Cell>
      <Cell className="max-sm:hidden">{locked ? 'locked' : <span className="text-ink-2">none</span>}</Cell>
      <Cell className="max-sm:hidden">{daysLate > 0 ? sayLate(daysLate) : ''}</Cell>
      <Cell align="right">
        {current ? (
          <ChangeAttempt sittingId={sitting.sittingId} student={student} />
        ) : (
          <span className="text-label">earlier attempt</span>
        )}
      </Cell>
    </tr>
  );
}

function sayLate(days: number): string {
  return `${count(days, 'day', 'days')} late`;
}
