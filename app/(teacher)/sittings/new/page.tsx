import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { readOpenChoices } from '@/lib/data/sittings/read-open-choices';
import { pageValue } from '@/lib/transport/page';
import { OpenForm } from './_components/open-form';

export const metadata: Metadata = { title: 'Give a practical' };

export default async function NewSittingPage({ searchParams }: PageProps<'/sittings/new'>) {
  const { sections, families } = pageValue(await readOpenChoices(await actorInRole('teacher'), {}));
  const { section, practical } = await searchParams;
  return (
    <DeskPage title="Give a practical">
      {sections.length === 0 ? (
        <EmptyState
          title="No period to give it to"
          action={
            <LinkButton kind="act" href="/periods/new">
              make a period
            </LinkButton>
          }
        >
          A practical is given to a period. Make one and paste its names; then come back.
        </EmptyState>
      ) : (
        <OpenForm
          sections={sections}
          families={families}
          chosen={typeof section === 'string' ? section : null}
          practicalId={typeof practical === 'string' ? practical : null}
        />
      )}
    </DeskPage>
  );
}
