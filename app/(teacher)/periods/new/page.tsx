import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { readSectionChoices } from '@/lib/data/sections/read-section-choices';
import { pageValue } from '@/lib/transport/page';
import { SectionForm } from './_components/section-form';

export const metadata: Metadata = { title: 'A new period' };

export default async function NewPeriodPage() {
  const choices = pageValue(await readSectionChoices(await actorInRole('teacher'), {}));
  return (
    <DeskPage title="A new period" note="The names come next.">
      <SectionForm choices={choices} />
    </DeskPage>
  );
}
