import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { listShared } from '@/lib/data/department/list-shared';
import { pageValue } from '@/lib/transport/page';
import { SharedGroup } from './_components/shared-group';

export const metadata: Metadata = { title: 'Shared practicals' };

export default async function SharedPage() {
  const { practicals } = pageValue(await listShared(await actorInRole('head'), {}));
  const approved = practicals.filter(({ versions }) => versions.some(({ approval }) => approval !== null));
  return (
    <DeskPage
      title="Shared practicals"
      note={
        practicals.length > 0
          ? 'See what a version would do to readings you have, then approve it as the department’s.'
          : undefined
      }
      titleBlock={[
        { label: 'on offer', value: practicals.filter(({ offered }) => offered).length },
        { label: 'the department’s', value: approved.length },
        { label: 'teachers', value: new Set(practicals.map(({ ownerName }) => ownerName)).size },
        { label: 'copies taken', value: practicals.reduce((sum, { copies }) => sum + copies, 0) },
      ]}
    >
      {practicals.length === 0 ? (
        <EmptyState title="Nothing is on offer yet">
          A teacher offers a practical from its own page, once a version is published. It then stands here,
          with what it would do to the readings of every section.
        </EmptyState>
      ) : (
        <ul className="grid gap-8">
          {practicals.map((practical) => (
            <li key={practical.practicalId}>
              <SharedGroup practical={practical} />
            </li>
          ))}
        </ul>
      )}
    </DeskPage>
  );
}
