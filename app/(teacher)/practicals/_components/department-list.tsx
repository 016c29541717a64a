import { Heading } from '@/components/ui/titles';
import type { DepartmentPractical } from '@/lib/data/practicals/list-practicals';
import { copyPracticalAction } from '../actions';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';

/** What colleagues of the department have published, each to be copied with its prices. */
export function DepartmentList({ practicals }: { practicals: DepartmentPractical[] }) {
  if (practicals.length === 0) return null;
  return (
    <section aria-labelledby="department-heading">
      <Heading id="department-heading">Published in your department</Heading>
      <ul className="mt-3 grid gap-x-8 sm:grid-cols-2 xl:grid-cols-3">
        {practicals.map(({ practicalId, versionId, number, title, unit, ownerName, lines, pieces }) => (
          <li key={practicalId} className="flex items-start justify-between gap-4 border-t border-hair py-3">
            <div>
              <h3 className="font-title text-lead font-[620]">{title}</h3>
              <p className="text-label text-ink-2">
                {ownerName}, version {number}; {sayPieces(lines, pieces)}, {unit === 'in' ? 'inches' : 'mm'}
              </p>
            </div>
            <PressForm
              action={copyPracticalAction}
              fields={{ practicalId, versionId }}
              label="copy it"
              fullLabel={`copy ${title} by ${ownerName}`}
            />
          </li>
        ))}
      </ul>
    </section>
  );
}
