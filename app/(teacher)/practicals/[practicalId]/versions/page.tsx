import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listVersions } from '@/lib/data/practicals/list-versions';
import { pageValue } from '@/lib/transport/page';
import { DraftEntry, VersionEntry } from './_components/version-entry';

interface VersionsPageProps {
  params: Promise<{ practicalId: string }>;
}

export const metadata: Metadata = { title: 'Versions' };

export default async function VersionsPage({ params }: VersionsPageProps) {
  const { practicalId } = await params;
  const view = pageValue(await listVersions(await actorInRole('teacher'), { practicalId }));
  const { title, versions, draft } = view;
  return (
    <DeskPage
      title={`Versions of ${title}`}
      actions={draft ? <LinkButton href={`/practicals/${practicalId}`}>to the draft</LinkButton> : null}
      titleBlock={[
        { label: 'versions', value: versions.length },
        { label: 'sittings', value: versions.reduce((sum, { sittings }) => sum + sittings, 0) },
      ]}
    >
      <ol className="border-t-outline border-ink">
        {draft ? <DraftEntry view={view} draft={draft} /> : null}
        {versions.map((version) => (
          <VersionEntry key={version.versionId} view={view} version={version} />
        ))}
      </ol>
      {versions.length === 0 ? (
        <EmptyState title="No version yet" className="mt-6">
          Publishing makes version 1. It never changes after that; what you change makes the next one.
        </EmptyState>
      ) : null}
    </DeskPage>
  );
}
