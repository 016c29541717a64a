import Link from 'next/link';
import { Heading } from '@/components/ui/titles';
import type { DepartmentPractical } from '@/lib/data/practicals/list-practicals';
import { copyPracticalAction } from '../actions';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';

/** What colleagues of the department offer, each to be copied with its prices; the department's own is told so. */
export function DepartmentList({ practicals }: { practicals: DepartmentPractical[] }) {
  if (practicals.length === 0) return null;
  return (
    <section aria-labelledby="department-heading">
      <Heading id="department-heading">Offered in your department</Heading>
      <p className="mt-1 max-w-[68ch] text-label text-ink-2">
        A copy is yours to change. It remembers the version it was taken from, and says when that moves on.
      </p>
      <ul className="mt-3 grid gap-x-8 sm:grid-cols-2 xl:grid-cols-3">
        {practicals.map((practical) => (
          <Offered key={practical.practicalId} practical={practical} />
        ))}
      </ul>
    </section>
  );
}

function Offered({ practical }: { practical: DepartmentPractical }) {
  const { practicalId, versionId, number, title, unit, ownerName, lines, pieces, approved, taken } =
    practical;
  const isDepartments = approved?.versionId === versionId;
  return (
    <li className="grid content-start gap-2 border-t border-hair py-3">
      <div>
        <h3 className="font-title text-lead font-[620]">{title}</h3>
        <p className="text-label text-ink-2">
          {ownerName},{' '}
          <Link className="link" href={`/practicals/${practicalId}/versions/${number}`}>
            version {number}
          </Link>
          ; {sayPieces(lines, pieces)}, {unit === 'in' ? 'inches' : 'mm'}
        </p>
        {approved ? (
          <p className="text-label font-[620]">
            {isDepartments
              ? 'This is the department’s rubric.'
              : `Version ${approved.number} is the department’s rubric.`}
          </p>
        ) : null}
        {taken ? <p className="text-label">You have a copy.</p> : null}
      </div>
      <div className="flex flex-wrap gap-2">
        <PressForm
          action={copyPracticalAction}
          fields={{ practicalId, versionId }}
          label={taken ? 'take another copy' : 'take a copy'}
          fullLabel={`${taken ? 'take another copy' : 'take a copy'} of ${title} by ${ownerName}`}
        />
        {approved && !isDepartments ? (
          <PressForm
            action={copyPracticalAction}
            fields={{ practicalId, versionId: approved.versionId }}
            label="copy the department’s"
            fullLabel={`copy the department’s version ${approved.number} of ${title} by ${ownerName}`}
          />
        ) : null}
      </div>
    </li>
  );
}
