import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { ImportForm } from './_components/import-form';

export const metadata: Metadata = { title: 'Practical from a file' };

export default async function ImportPracticalPage() {
  await actorInRole('teacher');
  return (
    <DeskPage
      title="Practical from a file"
      actions={<LinkButton href="/practicals/new">other ways to begin</LinkButton>}
    >
      <p className="mb-6 max-w-[68ch]">
        A practical that was taken out as a file, here or in another school, becomes a practical of yours: the
        task, the cut list and the whole rubric as a draft, which you can change before you publish it. No
        students, readings or scores come with it.
      </p>
      <ImportForm />
    </DeskPage>
  );
}
