import { sayDay } from '@/components/ui/days';
import type { RosterStudentView } from '@/lib/data/sections/read-roster';
import { BringBack } from './bring-back';
import { LeaveForm } from './leave-form';

interface InSectionProps {
  sectionId: string;
  student: RosterStudentView;
  today: string;
}

export function InSection({ sectionId, student, today }: InSectionProps) {
  const { studentId, here, leftOn } = student;
  if (leftOn !== null) {
    return (
      <div className="grid gap-3">
        <p>
          {here ? 'Leaves' : 'Left'} on {sayDay(leftOn)}. What they made and earned here is kept.
        </p>
        <BringBack
          sectionId={sectionId}
          studentId={studentId}
          label={here ? 'let them stay' : 'bring back'}
        />
      </div>
    );
  }
  if (!here) return <p>Has left the school. The office can bring them back.</p>;
  return <LeaveForm sectionId={sectionId} studentId={studentId} today={today} />;
}
