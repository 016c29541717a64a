import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { NavLinks } from '@/components/ui/nav-links';
import { listSections } from '@/lib/data/sections/list-sections';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { pageValue } from '@/lib/transport/page';
import { sayPeriod, sayStudents } from '../_components/words';
import { EmptyRoster } from './_components/empty-roster';
import { LeftTable } from './_components/left-table';
import { RosterActions } from './_components/roster-actions';
import { RosterTable } from './_components/roster-table';
import { periodTabs, rosterTitleBlock } from './_components/roster-words';

export const metadata: Metadata = { title: 'Roster' };

interface RosterPageProps {
  params: Promise<{ sectionId: string }>;
}

export default async function RosterPage({ params }: RosterPageProps) {
  const { sectionId } = await params;
  const actor = await actorInRole('teacher');
  const section = pageValue(await readSectionRoster(actor, { sectionId }));
  const tabs = periodTabs(pageValue(await listSections(actor, {})), sectionId);
  const here = section.students.filter((student) => student.here);
  const left = section.students.filter((student) => !student.here);
  return (
    <DeskPage
      title={section.name}
      note={`${tabs.length > 1 ? '' : `${sayPeriod(section.period)}, `}${sayStudents(here.length)}, ${section.termName}`}
      tabs={tabs.length > 1 ? <NavLinks label="periods of this term" items={tabs} /> : undefined}
      actions={here.length > 0 ? <RosterActions section={section} here={here} /> : undefined}
      titleBlock={here.length > 0 ? rosterTitleBlock(section, here) : undefined}
    >
      {here.length > 0 ? (
        <RosterTable section={section} students={here} />
      ) : (
        <EmptyRoster sectionId={sectionId} anyLeft={left.length > 0} />
      )}
      {left.length > 0 ? <LeftTable section={section} students={left} /> : null}
    </DeskPage>
  );
}
