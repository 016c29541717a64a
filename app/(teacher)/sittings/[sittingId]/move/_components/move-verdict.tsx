import { pointsAsText } from '@/components/ui/points-text';
import { Verdict } from '@/components/ui/titles';
import type { MovePreview } from '@/lib/contracts/moves';
import { count } from '../../../../_components/names';
import { whoMoves } from './move-words';

/** What the move would do, its reason first, and what a teacher should know before believing it. */
export function MoveVerdict({ preview }: { preview: MovePreview }) {
  const { students, gain, same, lose, from, to, notAsked } = preview;
  const compared = gain + same + lose;
  const without = students.length - compared;
  const { counts, mean } = whoMoves(preview);
  return (
    <div>
      {compared === 0 ? (
        <Verdict>
          <strong>Nothing to compare yet.</strong> Nobody is read to the end. You can move the sitting all the
          same: what is recorded stays, and version {to.number} prices it.
        </Verdict>
      ) : (
        <Verdict>
          <strong>{counts}</strong>
          {mean ? `; ${mean}.` : '.'}
        </Verdict>
      )}
      <ul className="mt-2 grid gap-1 text-label text-ink-2">
        {from.total === to.total ? null : (
          <li>
            Version {from.number} is of {pointsAsText(from.total)}, version {to.number} of{' '}
            {pointsAsText(to.total)}: changes are told on the scale of version {to.number}.
          </li>
        )}
        {compared > 0 && without > 0 ? (
          <li>
            {count(without, 'student has', 'students have')} no two numbers to compare, and{' '}
            {without === 1 ? 'is' : 'are'} not in the count.
          </li>
        ) : null}
        {notAsked.map(({ label, attempts }) => (
          <li key={label}>
            Recorded and not asked for any more: <strong className="text-ink">{label}</strong>,{' '}
            {count(attempts, 'student', 'students')}. It stays recorded.
          </li>
        ))}
      </ul>
    </div>
  );
}
