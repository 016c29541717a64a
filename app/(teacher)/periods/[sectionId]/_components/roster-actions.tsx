import { LinkButton } from '@/components/ui/link-button';
import type { RosterStudentView, RosterView } from '@/lib/data/sections/read-roster';
import { AddStudent } from './add-student';
import { waitsForSlip } from './roster-words';

interface RosterActionsProps {
  section: RosterView;
  here: readonly RosterStudentView[];
}

/** What is done with a whole roster. While somebody cannot sign in, the slips come first. */
export function RosterActions({ section: { sectionId }, here }: RosterActionsProps) {
  const waiting = here.some(waitsForSlip);
  return (
    <>
      <AddStudent sectionId={sectionId} />
      <LinkButton href={`/periods/${sectionId}/import`}>import names</LinkButton>
      {waiting ? <LinkButton href={`/periods/${sectionId}/slips`}>make slips</LinkButton> : null}
      <LinkButton href={`/periods/${sectionId}/modified`}>modified rubrics</LinkButton>
      <LinkButton href={`/gradebook/${sectionId}`}>gradebook</LinkButton>
      <LinkButton kind="act" href={`/sittings/new?section=${sectionId}`}>
        give a practical
      </LinkButton>
    </>
  );
}
