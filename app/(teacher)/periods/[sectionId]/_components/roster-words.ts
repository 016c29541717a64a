import type { TitleBlockCell } from '@/components/shell/title-block';
import type { NavItem } from '@/components/ui/nav-links';
import type { SectionListView } from '@/lib/data/sections/list-sections';
import type { RosterStudentView, RosterView } from '@/lib/data/sections/read-roster';
import { sayPeriod, saySection } from '../../_components/words';

export const PASSPHRASE_WORDS: Record<RosterStudentView['passphrase'], string> = {
  none: 'no words yet',
  first: 'slip given out',
  own: 'own words',
};

/** Who cannot sign in yet and can be given a slip: staff have a password, and words need an ID. */
export function waitsForSlip({ passphrase, isStaff, localId }: RosterStudentView): boolean {
  return passphrase === 'none' && !isStaff && localId !== null;
}

/** The sections of the same time as this one, to change over between them. */
export function periodTabs(sections: readonly SectionListView[], sectionId: string): NavItem[] {
  const open = sections.find((section) => section.sectionId === sectionId);
  return sections
    .filter(({ termWhen, termName }) => termWhen === open?.termWhen && termName === open.termName)
    .map((section) => ({ href: `/periods/${section.sectionId}`, label: sayPeriod(section.period) }));
}

export function rosterTitleBlock(section: RosterView, here: readonly RosterStudentView[]): TitleBlockCell[] {
  const waiting = here.filter(waitsForSlip).length;
  return [
    { label: 'section', value: saySection(section) },
    { label: 'term', value: section.termName },
    { label: 'students', value: here.length },
    { label: 'without words', value: waiting === 0 ? 'none' : waiting },
  ];
}
