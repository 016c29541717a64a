'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { AddStudentForm } from './add-student-form';

export function AddStudent({ sectionId }: { sectionId: string }) {
  return (
    <Dialog trigger={<Button>add one</Button>} title="Add a student">
      <AddStudentForm sectionId={sectionId} />
    </Dialog>
  );
}
