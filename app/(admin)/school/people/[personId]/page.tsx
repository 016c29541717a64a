import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Heading } from '@/components/ui/titles';
import { ROLE_NAMES } from '@/lib/auth/roles';
import { listDepartments } from '@/lib/data/school/list-departments';
import { readPerson } from '@/lib/data/school/read-person';
import { pageActor, pageValue } from '@/lib/transport/page';
import { type SearchParams, saidIn } from '../../_components/search-params';
import { PersonActs } from '../_components/person-acts';
import { RolesForm } from '../_components/roles-form';
import { STATE_WORDS } from '../_components/state-words';

export const metadata: Metadata = { title: 'Person' };

const DONE: Record<string, string> = {
  invited: 'The invitation is on its way. Its link works once, for seven days.',
  roles: 'The roles are kept.',
};

interface PersonPageProps {
  params: Promise<{ personId: string }>;
  searchParams: SearchParams;
}

export default async function PersonPage({ params, searchParams }: PersonPageProps) {
  const { personId } = await params;
  const actor = await pageActor();
  const person = pageValue(await readPerson(actor, { personId }));
  const departments = pageValue(await listDepartments(actor, {}));
  const { done = '' } = await saidIn(searchParams);
  const { givenName, familyName, email, localId, roles, department, state } = person;
  return (
    <DeskPage
      title={`${givenName} ${familyName}`.trim()}
      note={STATE_WORDS[state] || roles.map((role) => ROLE_NAMES[role]).join(', ')}
      actions={
        <>
          <LinkButton href={`/school/log?aboutPersonId=${personId}`}>in the access log</LinkButton>
          <LinkButton
            href={
              roles.every((role) => role === 'student') ? '/school/people?shown=students' : '/school/people'
            }
          >
            all people
          </LinkButton>
        </>
      }
      titleBlock={[
        { label: email ? 'email' : 'ID', value: email ?? localId, wide: true },
        { label: 'roles', value: roles.map((role) => ROLE_NAMES[role]).join(', ') },
        { label: 'department', value: department?.name ?? 'none' },
      ]}
    >
      {DONE[done] ? <Notice className="mb-8" title={DONE[done]} /> : null}
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-2">
        {email && state !== 'left' ? (
          <section>
            <Heading className="mb-4 border-b border-ink pb-1">roles</Heading>
            <RolesForm
              personId={personId}
              roles={roles.filter((role) => role !== 'student')}
              departmentId={department?.departmentId ?? ''}
              departments={departments.map(({ departmentId, name }) => ({ departmentId, name }))}
            />
          </section>
        ) : null}
        <PersonActs person={person} />
      </div>
    </DeskPage>
  );
}
