import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listPeopleInput } from '@/lib/contracts/school';
import { listPeople } from '@/lib/data/school/list-people';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Pages } from '../_components/pages';
import { type SearchParams, saidIn } from '../_components/search-params';
import { PeopleFilter } from './_components/people-filter';
import { PeopleTable } from './_components/people-table';

export const metadata: Metadata = { title: 'People' };

const NOBODY = {
  staff: 'Invite the teachers first: each of them makes sections and brings in the roster.',
  students: 'Students come by a section’s roster, which its teacher pastes or uploads.',
  left: 'Whoever is marked as left is kept here, with all that was recorded.',
};

export default async function PeoplePage({ searchParams }: { searchParams: SearchParams }) {
  const filter = listPeopleInput.catch(listPeopleInput.parse({})).parse(await saidIn(searchParams));
  const { people, total, page, pageCount } = pageValue(await listPeople(await pageActor(), filter));
  const { shown, search } = filter;
  const invite = (
    <LinkButton kind="act" href="/school/people/invite">
      invite
    </LinkButton>
  );
  return (
    <DeskPage title="People" note={total === 1 ? 'one person' : `${total} people`} actions={invite}>
      <PeopleFilter shown={shown} search={search} />
      {people.length === 0 ? (
        <EmptyState title={search ? `Nobody matches “${search}”` : 'Nobody here yet'}>
          {search ? 'Look for part of a name, an email or an ID, or among the others.' : NOBODY[shown]}
        </EmptyState>
      ) : (
        <PeopleTable people={people} students={shown === 'students'} />
      )}
      <Pages
        page={page}
        pageCount={pageCount}
        hrefOf={(to) => `/school/people?${new URLSearchParams({ shown, search, page: String(to) })}`}
      />
    </DeskPage>
  );
}
