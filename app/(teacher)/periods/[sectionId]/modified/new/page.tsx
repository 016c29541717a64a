import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { readAccommodationDesk } from '@/lib/data/accommodations/read-accommodation-desk';
import { pageValue } from '@/lib/transport/page';
import { saySection } from '../../../_components/words';
import { ModifyDesk } from './_components/modify-desk';

export const metadata: Metadata = { title: 'Modify a rubric' };

interface NewModifiedPageProps {
  params: Promise<{ sectionId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function NewModifiedPage({ params, searchParams }: NewModifiedPageProps) {
  const { sectionId } = await params;
  const { student, change } = await searchParams;
  const desk = pageValue(
    await readAccommodationDesk(await actorInRole('teacher'), {
      sectionId,
      studentId: student ?? null,
      change: change ?? null,
    }),
  );
  if (desk.students.length > 0) return <ModifyDesk key={desk.change?.accommodationId ?? 'new'} desk={desk} />;
  return (
    <DeskPage title="Modify a rubric" note={saySection(desk)}>
      <EmptyState
        title="Nobody is in this period"
        action={<LinkButton href={`/periods/${sectionId}`}>the roster</LinkButton>}
      >
        A rubric is modified for a student. Put the students on the roster first.
      </EmptyState>
    </DeskPage>
  );
}
