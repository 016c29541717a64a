import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { readDeclaredDifferences } from '@/lib/data/department/read-declared-differences';
import { readSharedVersion } from '@/lib/data/department/read-shared-version';
import { pageValue } from '@/lib/transport/page';
import { ApprovalNote } from './_components/approval-note';
import { ApprovalPress } from './_components/approval-press';
import { DeclaredDifferences } from './_components/declared-differences';
import { Effect } from './_components/effect';
import { sharedTitleBlock } from './_components/shared-title-block';

export const metadata: Metadata = { title: 'A shared version' };

interface SharedVersionPageProps {
  params: Promise<{ versionId: string }>;
}

export default async function SharedVersionPage({ params }: SharedVersionPageProps) {
  const { versionId } = await params;
  const actor = await actorInRole('head');
  const view = pageValue(await readSharedVersion(actor, { versionId }));
  const { versions } = pageValue(await readDeclaredDifferences(actor, { versionId }));
  return (
    <DeskPage
      title={`${view.title}, version ${view.number}`}
      note={view.ownerName}
      actions={
        <>
          <LinkButton href={`/department/versions/${versionId}`}>read version {view.number}</LinkButton>
          <ApprovalPress view={view} />
        </>
      }
      titleBlock={sharedTitleBlock(view)}
    >
      <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
        <ApprovalNote view={view} />
        <Effect view={view} />
        {view.approval ? <DeclaredDifferences versions={versions} unit={view.unit} /> : null}
      </div>
    </DeskPage>
  );
}
