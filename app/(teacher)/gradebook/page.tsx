import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listSections } from '@/lib/data/sections/list-sections';
import { pageActor, pageValue } from '@/lib/transport/page';
import { SectionLinks } from './_components/section-links';

export const metadata: Metadata = { title: 'Gradebook' };

/** A teacher lands on the first period of this term; a head chooses among the sections of the department. */
export default async function GradebookPage() {
  const actor = await pageActor();
  const sections = pageValue(await listSections(actor, {}));
  const now = sections.filter(({ termWhen }) => termWhen === 'now');
  const first = now[0] ?? sections[0];
  if (actor.role === 'teacher' && first) redirect(`/gradebook/${first.sectionId}`);
  return (
    <DeskPage title="Gradebook">
      {first ? (
        <SectionLinks sections={sections} />
      ) : (
        <EmptyState
          title="No period yet"
          action={
            actor.role === 'teacher' ? (
              <LinkButton kind="act" href="/periods/new">
                make a period
              </LinkButton>
            ) : undefined
          }
        >
          {actor.role === 'teacher'
            ? 'A gradebook has a period’s students down and its practicals across. Make a period and paste its names first.'
            : 'Your department has no sections yet.'}
        </EmptyState>
      )}
    </DeskPage>
  );
}
