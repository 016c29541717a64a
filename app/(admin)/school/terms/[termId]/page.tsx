import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { listTerms } from '@/lib/data/school/list-terms';
import { pageActor, pageValue } from '@/lib/transport/page';
import { TermForm } from '../../_components/term-form';

export const metadata: Metadata = { title: 'Change a term' };

export default async function TermPage({ params }: { params: Promise<{ termId: string }> }) {
  const { termId } = await params;
  const terms = pageValue(await listTerms(await pageActor(), {}));
  const term = terms.find((each) => each.termId === termId);
  if (!term) notFound();
  const { name, startsOn, endsOn, sectionCount } = term;
  return (
    <DeskPage
      title={name}
      note={sectionCount === 1 ? 'one section is in it' : `${sectionCount} sections are in it`}
      actions={<LinkButton href="/school/terms">all terms</LinkButton>}
    >
      <TermForm term={{ termId, name, startsOn, endsOn }} />
    </DeskPage>
  );
}
