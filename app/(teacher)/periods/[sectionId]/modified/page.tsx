import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { AccommodationTable } from '@/components/accommodation/accommodation-table';
import { ReadReasonPress } from '@/components/accommodation/read-reason-press';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { listAccommodations } from '@/lib/data/accommodations/list-accommodations';
import { pageValue } from '@/lib/transport/page';
import { saySection } from '../../_components/words';
import { EndPress } from './_components/end-press';
import { readReasonAction } from './actions';

export const metadata: Metadata = { title: 'Modified rubrics' };

interface ModifiedPageProps {
  params: Promise<{ sectionId: string }>;
}

export default async function ModifiedPage({ params }: ModifiedPageProps) {
  const { sectionId } = await params;
  const list = pageValue(await listAccommodations(await actorInRole('teacher'), { sectionId }));
  const { standing, ended } = list;
  const nameOf = ({ givenName, familyName }: { givenName: string; familyName: string }) =>
    `${givenName} ${familyName}`.trim();
  return (
    <DeskPage
      title="Modified rubrics"
      note={saySection(list)}
      actions={
        <>
          <LinkButton href={`/periods/${sectionId}`}>the roster</LinkButton>
          <LinkButton kind="act" href={`/periods/${sectionId}/modified/new`}>
            modify a rubric
          </LinkButton>
        </>
      }
      titleBlock={[
        { label: 'section', value: saySection(list) },
        { label: 'term', value: list.termName },
        { label: 'standing', value: standing.length },
        { label: 'ended', value: ended.length },
      ]}
    >
      <p className="mb-6 max-w-[70ch]">
        You and the head of your department see this page, nobody else. The bench shows the sitting’s bands
        for everybody; results and exports carry the score and no word of how it was priced.
      </p>
      {standing.length > 0 ? (
        <AccommodationTable
          caption="modified rubrics that stand"
          rows={standing}
          acts={(row) => (
            <>
              <ReadReasonPress
                accommodationId={row.accommodationId}
                name={nameOf(row)}
                action={readReasonAction}
              />
              <LinkButton
                size="small"
                href={`/periods/${sectionId}/modified/new?change=${row.accommodationId}`}
              >
                change<span className="sr-only"> {nameOf(row)}</span>
              </LinkButton>
              <EndPress accommodationId={row.accommodationId} name={nameOf(row)} />
            </>
          )}
        />
      ) : (
        <EmptyState title="Nobody’s rubric is modified">
          One student can be priced by wider bands, without some lines or sizes, or with checks at other
          prices, in one sitting or for the term. The total stays the same.
        </EmptyState>
      )}
      {ended.length > 0 ? (
        <section className="mt-10">
          <Heading className="mb-1">Ended</Heading>
          <AccommodationTable
            caption="modified rubrics that have ended"
            rows={ended}
            acts={(row) => (
              <ReadReasonPress
                accommodationId={row.accommodationId}
                name={nameOf(row)}
                action={readReasonAction}
              />
            )}
          />
        </section>
      ) : null}
    </DeskPage>
  );
}
