import { ChoiceGroup, RadioField } from '@/components/ui/choice';
import { pointsAsText } from '@/components/ui/points-text';
import type { PublicationPreview } from '@/lib/data/sittings/preview-publication';
import { count, spokenName } from '../../../../_components/names';

interface LateLocksProps {
  late: PublicationPreview['late'];
  error: string | undefined;
  chosen: unknown;
}

/** Predictions locked after the bench had begun, without a receipt: neither refused nor trusted. */
export function LateLocks({ late, error, chosen }: LateLocksProps) {
  return (
    <ChoiceGroup
      legend={`${count(late.length, 'prediction was', 'predictions were')} locked late`}
      error={error ?? null}
    >
      <ul className="my-2 text-label">
        {late.map((student) => (
          <li key={student.studentId}>
            {spokenName(student)}
            {student.predicted === null ? '' : ` predicted ${pointsAsText(student.predicted)}`}
            {student.bonus > 0
              ? `, worth ${pointsAsText(student.bonus)} if it counts`
              : ', worth nothing either way'}
          </li>
        ))}
      </ul>
      <p className="mb-1 max-w-[48ch] text-label text-ink-2">
        They were locked after the bench had begun on the pieces, and no receipt was taken before. You know
        whether they were made in time.
      </p>
      <RadioField name="lateLocks" value="count" defaultChecked={chosen === 'count'} label="they count" />
      <RadioField
        name="lateLocks"
        value="leave out"
        defaultChecked={chosen === 'leave out'}
        label="they earn nothing"
      />
    </ChoiceGroup>
  );
}
