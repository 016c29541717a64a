import type { Metadata } from 'next';
import Link from 'next/link';
import { DeskPage } from '@/components/shell/desk-page';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Refusal } from '@/components/ui/refusal';
import { ROLE_NAMES } from '@/lib/auth/roles';
import { type LogEntryView, readLog } from '@/lib/data/school/read-log';
import { pageActor, pageValue } from '@/lib/transport/page';
import { sayMoment } from '../_components/day';
import { Pages } from '../_components/pages';
import { type SearchParams, saidIn } from '../_components/search-params';
import { sayAction, sayDetails } from './_components/action-words';
import { LogFilter } from './_components/log-filter';

export const metadata: Metadata = { title: 'Access log' };

export default async function LogPage({ searchParams }: { searchParams: SearchParams }) {
  const said = await saidIn(searchParams);
  const read = await readLog(await pageActor(), said);
  if (!read.ok && read.problem.code === 'invalid') {
    return (
      <DeskPage title="Access log">
        <Refusal
          title={read.problem.message}
          action={<LinkButton href="/school/log">show all of it</LinkButton>}
        />
      </DeskPage>
    );
  }
  const { entries, total, page, pageCount, choices, timeZone } = pageValue(read);
  const about = said.aboutPersonId ? entries.find((entry) => entry.about)?.about?.name : undefined;
  return (
    <DeskPage
      title="Access log"
      note={`${total === 1 ? 'one entry' : `${total} entries`}${about ? ` about ${about}` : ''}, ${timeZone.replaceAll('_', ' ')} time`}
    >
      <LogFilter said={said} choices={choices} />
      {entries.length === 0 ? (
        <EmptyState title="No entries">
          Every change, and every look that staff take at somebody else’s record, is written here. Widen the
          days or choose less.
        </EmptyState>
      ) : (
        <LogTable entries={entries} timeZone={timeZone} />
      )}
      <Pages
        page={page}
        pageCount={pageCount}
        hrefOf={(to) => `/school/log?${new URLSearchParams({ ...said, page: String(to) })}`}
      />
    </DeskPage>
  );
}

function LogTable({ entries, timeZone }: { entries: LogEntryView[]; timeZone: string }) {
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
        {entries.map(({ id, at, actor, action, about, details }) => (
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
            <Cell className="max-w-[22rem] text-label break-words text-ink-2">{sayDetails(details)}</Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
