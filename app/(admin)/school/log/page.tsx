import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Refusal } from '@/components/ui/refusal';
import { readLog } from '@/lib/data/school/read-log';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Pages } from '../_components/pages';
import { type SearchParams, saidIn } from '../_components/search-params';
import { LogFilter } from './_components/log-filter';
import { LogTable } from './_components/log-table';

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
