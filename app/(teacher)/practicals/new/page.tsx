import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { readSchoolUnit } from '@/lib/data/practicals/read-school-unit';
import { pageValue } from '@/lib/transport/page';
import { NewPracticalForm } from '../_components/new-practical-form';
import { StarterList } from '../_components/starter-list';

export const metadata: Metadata = { title: 'New practical' };

export default async function NewPracticalPage() {
  const unit = pageValue(await readSchoolUnit(await actorInRole('teacher'), {}));
  return (
    <DeskPage title="New practical" actions={<LinkButton href="/practicals/import">from a file</LinkButton>}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
        <section aria-labelledby="empty-heading">
          <Heading id="empty-heading" className="mb-3">
            From nothing
          </Heading>
          <NewPracticalForm unit={unit} />
        </section>
        <StarterList heading="Or copy a starter" />
      </div>
    </DeskPage>
  );
}
