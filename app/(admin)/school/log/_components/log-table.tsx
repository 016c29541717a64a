import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayMoment } from '@/components/ui/days';
import { ROLE_NAMES } from '@/lib/auth/roles';
import type { LogEntryView } from '@/lib/data/school/read-log';
import { sayAction, sayDetails } from './action-words';

export function LogTable({ entries, timeZone }: { entries: LogEntryView[]; timeZone: string }) {
  return (
    <Table caption="entries of the access log, the newest first">
      <TableHead>
        <tr>
          <HeadCell>when</HeadCell>
          <HeadCell>who</HeadCell>
          <HeadCell>what</HeadCell>
          <HeadCell>about whom</HeadCell>
          <HeadCell>details</HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {entries.map(({ id, at, actor, action, about, subjectName, details }) => (
          <tr key={id}>
            <RowHead className="whitespace-nowrap font-[480]">{sayMoment(at, timeZone)}</RowHead>
            <Cell>
              {actor ? actor.name : 'somebody not signed in'}
              {actor?.role ? <span className="text-label text-ink-2">, {ROLE_NAMES[actor.role]}</span> : null}
            </Cell>
            <Cell>{sayAction(action)}</Cell>
            <Cell>
              {about ? (
                <Link className="link" href={`/school/people/${about.personId}`}>
                  {about.name}
                </Link>
              ) : null}
            </Cell>
            <Cell className="max-w-[22rem] text-label break-words text-ink-2">
              {sayDetails(details, subjectName)}
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
