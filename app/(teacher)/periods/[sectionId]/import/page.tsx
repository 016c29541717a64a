import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { MADE_ID_RULE } from '@/lib/data/sections/local-ids';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { pageValue } from '@/lib/transport/page';
import { sayPeriod } from '../../_components/words';
import { RosterImport } from './_components/roster-import';

export const metadata: Metadata = { title: 'Import names' };

interface ImportPageProps {
  params: Promise<{ sectionId: string }>;
}

export default async function ImportPage({ params }: ImportPageProps) {
  const { sectionId } = await params;
  const section = pageValue(await readSectionRoster(await actorInRole('teacher'), { sectionId }));
  return (
    <DeskPage
      title={`Names for ${section.name}`}
      note={`${sayPeriod(section.period)}, ${section.termName}`}
      actions={<LinkButton href={`/periods/${sectionId}`}>the roster</LinkButton>}
    >
      <RosterImport sectionId={sectionId} madeIdRule={MADE_ID_RULE} />
    </DeskPage>
  );
}
