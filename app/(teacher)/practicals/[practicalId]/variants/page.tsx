import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { listVariants } from '@/lib/data/practicals/list-variants';
import { pageValue } from '@/lib/transport/page';
import { ProposeForm } from './_components/propose-form';
import { VariantRule } from './_components/variant-rule';
import { VariantTable } from './_components/variant-table';

export const metadata: Metadata = { title: 'Variants' };

interface VariantsPageProps {
  params: Promise<{ practicalId: string }>;
}

export default async function VariantsPage({ params }: VariantsPageProps) {
  const { practicalId } = await params;
  const list = pageValue(await listVariants(await actorInRole('teacher'), { practicalId }));
  if (list.of) redirect(`/practicals/${list.of.practicalId}/variants`);
  const { original, variants, title, unit } = list;
  return (
    <DeskPage
      title={`Variants of ${title}`}
      actions={<LinkButton href={`/practicals/${practicalId}`}>to the original</LinkButton>}
      aside={original ? <VariantRule rubric={original.rubric} /> : undefined}
    >
      {original ? (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
          <VariantTable list={list} original={original} />
          <section aria-labelledby="propose-heading">
            <Heading id="propose-heading">
              {variants.length > 0 ? 'Propose others' : 'One for each period'}
            </Heading>
            {variants.length > 0 ? null : (
              <p className="mt-1 max-w-[62ch]">
                A variant is the same practical with other sizes of equal difficulty, so that a piece borrowed
                from another period does not fit. It is a practical of its own: you review, publish and give
                it like any other.
              </p>
            )}
            <ProposeForm practicalId={practicalId} unit={unit} />
          </section>
        </div>
      ) : (
        <EmptyState
          title="Publish it first"
          action={
            <LinkButton kind="act" href={`/practicals/${practicalId}`}>
              to the practical
            </LinkButton>
          }
        >
          Variants are derived from a published version, so that their prices and pieces stand still.
        </EmptyState>
      )}
    </DeskPage>
  );
}
