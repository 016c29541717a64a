import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { proposeVariants } from '@/lib/data/practicals/propose-variants';
import { pageValue } from '@/lib/transport/page';
import { ProposeForm } from '../_components/propose-form';
import { ProposalsDesk } from './_components/proposals-desk';

export const metadata: Metadata = { title: 'Propose variants' };

interface ProposePageProps {
  params: Promise<{ practicalId: string }>;
  searchParams: Promise<{ count?: string | string[]; graduation?: string | string[] }>;
}

export default async function ProposePage({ params, searchParams }: ProposePageProps) {
  const { practicalId } = await params;
  const { count = '2', graduation } = await searchParams;
  const input = { practicalId, count, graduation };
  const result = await proposeVariants(await actorInRole('teacher'), input);
  const list = `/practicals/${practicalId}/variants`;
  if (!result.ok && result.problem.code === 'conflict') redirect(list);
  const view = pageValue(result);
  return (
    <DeskPage
      title={`Sizes for ${view.title}`}
      actions={<LinkButton href={list}>to the variants</LinkButton>}
    >
      <ProposeForm {...view} />
      <ProposalsDesk key={`${view.count} ${view.graduation} ${view.original.versionId}`} view={view} />
    </DeskPage>
  );
}
