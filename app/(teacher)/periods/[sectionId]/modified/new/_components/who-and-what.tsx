import { SelectField } from '@/components/ui/select-field';
import type { AccommodationDeskView } from '@/lib/data/accommodations/read-accommodation-desk';
import { sayName } from '../../../../_components/words';
import type { Typed } from './use-typed';

interface WhoAndWhatProps {
  desk: AccommodationDeskView;
  typed: Typed;
  error: string[] | null | undefined;
  onStudent: (studentId: string) => void;
}

/** For whom, and for the term or one sitting. Both stay where one is changed. */
export function WhoAndWhat({ desk, typed, error, onStudent }: WhoAndWhatProps) {
  const term = `the term, ${desk.termName}`;
  if (desk.change) {
    const student = desk.students.find(({ studentId }) => studentId === desk.chosen);
    return (
      <div>
        <input type="hidden" name="studentId" value={desk.chosen ?? ''} />
        <input type="hidden" name="sittingId" value={desk.change.sittingId ?? ''} />
        <p className="text-lead font-[620]">
          {student ? sayName(student) : null}, for {typed.sittingId ? typed.sittings[0]?.title : term}
        </p>
      </div>
    );
  }
  return (
    <div className="grid max-w-[44rem] gap-4 sm:grid-cols-2">
      <SelectField
        label="student"
        name="studentId"
        placeholder="choose a student"
        options={desk.students.map((student) => ({ value: student.studentId, label: sayName(student) }))}
        value={desk.chosen ?? ''}
        onChange={(event) => onStudent(event.target.value)}
        error={error}
      />
      <SelectField
        label="for"
        name="sittingId"
        options={[
          ...desk.sittings.map(({ sittingId, title, versionNumber }) => ({
            value: sittingId,
            label: `${title}, version ${versionNumber}`,
          })),
          { value: '', label: term },
        ]}
        value={typed.sittingId ?? ''}
        onChange={(event) => typed.setSittingId(event.target.value || null)}
        hint={
          typed.sittingId === null
            ? 'Every sitting of your department in this term that has none of its own, also after a change of period.'
            : 'This sitting alone; it goes before one for the term.'
        }
      />
    </div>
  );
}
