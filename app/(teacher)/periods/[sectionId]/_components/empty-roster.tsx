import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { AddStudent } from './add-student';

export function EmptyRoster({ sectionId, anyLeft }: { sectionId: string; anyLeft: boolean }) {
  return (
    <EmptyState
      title={anyLeft ? 'Everybody has left' : 'No students yet'}
      action={
        <>
          <LinkButton kind="act" href={`/periods/${sectionId}/import`}>
            paste names
          </LinkButton>
          <AddStudent sectionId={sectionId} />
        </>
      }
    >
      Paste the names, one a line, or bring in the CSV of your school’s list. IDs are kept as they are; where
      there are none, they are made.
    </EmptyState>
  );
}
