import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { compareVersions } from '@/lib/data/department/compare-versions';
import { pageValue } from '@/lib/transport/page';
import { comparisonTitleBlock } from '../_components/comparison-title-block';
import { ComparisonView } from '../_components/comparison-view';
import { DifferenceTable } from '../_components/difference-table';

export const metadata: Metadata = { title: 'Rubrics side by side' };

interface ComparePageProps {
  searchParams: Promise<{ versions?: string | string[] }>;
}

const NUMBERS = ['', 'one', 'two', 'three', 'four', 'five', 'six'];
const BESIDE = 3;

export default async function ComparePage({ searchParams }: ComparePageProps) {
  const { versions: asked = [] } = await searchParams;
  const versionIds = [asked].flat().flatMap((each) => each.split(',').filter(Boolean));
  const result = await compareVersions(await actorInRole('head'), { versionIds });
  if (!result.ok && result.problem.code === 'invalid')
    return <NotComparable reason={result.problem.message} />;
  const view = pageValue(result);
  const table = <DifferenceTable view={view} />;
  const beside = view.versions.length <= BESIDE;
  return (
    <DeskPage
      title={`${view.title}, ${NUMBERS[view.versions.length]} rubrics`}
      actions={<LinkButton href="/department">other rubrics</LinkButton>}
      aside={beside ? table : undefined}
      titleBlock={comparisonTitleBlock(view)}
    >
      <ComparisonView view={view} />
      {beside ? null : <div className="mt-8">{table}</div>}
    </DeskPage>
  );
}

function NotComparable({ reason }: { reason: string }) {
  return (
    <DeskPage title="Rubrics side by side">
      <EmptyState
        title="These cannot be laid side by side"
        action={<LinkButton href="/department">to the rubrics</LinkButton>}
      >
        {reason}
      </EmptyState>
    </DeskPage>
  );
}
