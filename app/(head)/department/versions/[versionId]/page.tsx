import type { Metadata } from 'next';
import Link from 'next/link';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LocalTime } from '@/components/ui/local-time';
import { FileLink } from '@/components/version/file-link';
import { VersionSheet } from '@/components/version/version-sheet';
import { versionTitleBlock } from '@/components/version/version-title-block';
import { readVersionSheet } from '@/lib/data/practicals/read-version-sheet';
import { pageValue } from '@/lib/transport/page';

interface DepartmentVersionPageProps {
  params: Promise<{ versionId: string }>;
}

export const metadata: Metadata = { title: 'A version' };

export default async function DepartmentVersionPage({ params }: DepartmentVersionPageProps) {
  const { versionId } = await params;
  const view = pageValue(await readVersionSheet(await actorInRole('head'), { versionId }));
  return (
    <DeskPage
      title={`${view.task.title}, version ${view.number}`}
      note={
        <>
          <LocalTime at={view.publishedAt} style="day" />, {view.publisherName}
          {view.since ? (
            <>
              ; before it{' '}
              <Link className="link" href={`/department/versions/${view.since.versionId}`}>
                version {view.since.number}
              </Link>
            </>
          ) : null}
        </>
      }
      actions={<FileLink practicalId={view.practicalId} version={view.number} />}
      titleBlock={versionTitleBlock(view)}
    >
      {view.differenceReason ? (
        <p className="mb-6 max-w-[68ch]">
          Differs from the department’s: <q>{view.differenceReason}</q>
        </p>
      ) : null}
      <VersionSheet {...view} />
    </DeskPage>
  );
}
