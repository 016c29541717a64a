import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { listSections } from '@/lib/data/sections/list-sections';
import { pageValue } from '@/lib/transport/page';
import { FirstSteps } from './_components/first-steps';
import { PastTerms } from './_components/past-terms';
import { SectionTable } from './_components/section-table';
import { periodsTitleBlock } from './_components/title-block-of';

export const metadata: Metadata = { title: 'Periods' };

export default async function PeriodsPage() {
  const actor = await actorInRole('teacher');
  const sections = pageValue(await listSections(actor, {}));
  const now = sections.filter(({ termWhen }) => termWhen === 'now');
  const coming = sections.filter(({ termWhen }) => termWhen === 'coming');
  const past = sections.filter(({ termWhen }) => termWhen === 'past');
  const isNew = sections.every(({ sittings }) => sittings === 0);
  const practicals = isNew ? pageValue(await listPracticals(actor, {})).own : [];
  const add = (
    <LinkButton kind={sections.length === 0 ? 'plain' : 'act'} href="/periods/new">
      add a period
    </LinkButton>
  );
  return (
    <DeskPage
      title="Periods"
      note={now[0]?.termName}
      actions={sections.length === 0 ? undefined : add}
      titleBlock={now.length === 0 ? undefined : periodsTitleBlock(now)}
    >
      {isNew ? <FirstSteps sections={sections} practicals={practicals} /> : null}
      {now.length > 0 ? <SectionTable caption="sections of this term, by period" sections={now} /> : null}
      {now.length === 0 && past.length > 0 ? (
        <p className="max-w-[56ch]">No section of this term yet. Add a period; past terms stay below.</p>
      ) : null}
      {coming.length > 0 ? (
        <section className="mt-8">
          <Heading className="mb-2">coming</Heading>
          <SectionTable caption="sections of a coming term" sections={coming} withTerm />
        </section>
      ) : null}
      {past.length > 0 ? <PastTerms sections={past} /> : null}
    </DeskPage>
  );
}
