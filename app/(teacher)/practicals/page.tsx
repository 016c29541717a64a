import type { Metadata } from 'next';
import Link from 'next/link';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { pageValue } from '@/lib/transport/page';
import { DepartmentList } from './_components/department-list';
import { PracticalTable } from './_components/practical-table';
import { StarterList } from './_components/starter-list';

export const metadata: Metadata = { title: 'Practicals' };

interface PracticalsPageProps {
  searchParams: Promise<{ put?: string | string[] }>;
}

export default async function PracticalsPage({ searchParams }: PracticalsPageProps) {
  const archived = (await searchParams).put === 'away';
  const { own, department } = pageValue(await listPracticals(await actorInRole('teacher'), { archived }));
  const first = own.length === 0 && !archived;
  return (
    <DeskPage
      title={archived ? 'Practicals put away' : 'Practicals'}
      actions={
        <LinkButton kind="act" href="/practicals/new">
          new practical
        </LinkButton>
      }
    >
      <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
        {own.length > 0 ? (
          <div>
            <PracticalTable practicals={own} archived={archived} />
            <AwayLink archived={archived} />
          </div>
        ) : (
          <EmptyState
            title={archived ? 'Nothing is put away' : 'No practical yet'}
            action={archived ? <LinkButton href="/practicals">to your practicals</LinkButton> : undefined}
          >
            {archived
              ? 'A practical that you put away keeps its versions and sittings, and can be brought back from here.'
              : 'Copy a starter below and change what you like, or make one from nothing. Publish it, then open a sitting.'}
          </EmptyState>
        )}
        {archived ? null : (
          <>
            <DepartmentList practicals={department} />
            <StarterList heading={first ? 'Copy a starter' : 'Or copy a starter'} />
            {first ? <AwayLink archived={false} /> : null}
          </>
        )}
      </div>
    </DeskPage>
  );
}

function AwayLink({ archived }: { archived: boolean }) {
  return (
    <p className="mt-3 text-label">
      <Link className="link inline-block py-1" href={archived ? '/practicals' : '/practicals?put=away'}>
        {archived ? 'to your practicals' : 'what is put away'}
      </Link>
    </p>
  );
}
