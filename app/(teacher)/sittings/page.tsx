import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { listSittings } from '@/lib/data/sittings/list-sittings';
import { pageValue } from '@/lib/transport/page';
import { count } from '../_components/names';
import { SittingTable } from './_components/sitting-table';

export const metadata: Metadata = { title: 'Sittings' };

export default async function SittingsPage() {
  const sittings = pageValue(await listSittings(await actorInRole('teacher'), {}));
  const open = sittings.filter(({ published }) => !published);
  const published = sittings.filter(({ published: out }) => out);
  const give = (
    <LinkButton kind="act" href="/sittings/new">
      give a practical
    </LinkButton>
  );
  if (sittings.length === 0) {
    return (
      <DeskPage title="Sittings">
        <EmptyState title="No sitting yet" action={give}>
          A sitting is a practical given to one of your periods. Give one, and its round opens: you walk from
          bench to bench, and the results go out from here.
        </EmptyState>
      </DeskPage>
    );
  }
  return (
    <DeskPage
      title="Sittings"
      note={`${open.length} open, ${published.length} published`}
      actions={give}
      titleBlock={[
        { label: 'open', value: count(open.length, 'sitting', 'sittings') },
        { label: 'published', value: count(published.length, 'sitting', 'sittings') },
      ]}
    >
      {open.length > 0 ? (
        <SittingTable caption="open sittings, by period" sittings={open} />
      ) : (
        <p>Every sitting is published. Give the next practical when its pieces are due.</p>
      )}
      {published.length > 0 ? (
        <section className="mt-8">
          <Heading className="mb-2">published</Heading>
          <SittingTable caption="published sittings, by period" sittings={published} />
        </section>
      ) : null}
    </DeskPage>
  );
}
