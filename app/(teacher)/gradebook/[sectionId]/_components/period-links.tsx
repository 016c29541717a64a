import Link from 'next/link';
import { classNames } from '@/components/ui/class-names';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { sayPeriod } from '../../../_components/names';

/** The person's other periods of the term, one press away. */
export function PeriodLinks({ book: { sections, section } }: { book: GradebookView }) {
  if (sections.length < 2) return null;
  return (
    <nav aria-label="periods of this term">
      <ul className="flex flex-wrap gap-x-1">
        {sections.map(({ sectionId, name, period }) => {
          const current = sectionId === section.sectionId;
          return (
            <li key={sectionId}>
              <Link
                href={`/gradebook/${sectionId}`}
                aria-current={current ? 'page' : undefined}
                aria-label={`${sayPeriod(period)}, ${name}`}
                title={name}
                className={classNames(
                  'tnum inline-flex min-h-9 min-w-9 items-center justify-center border-b-[4px] border-transparent px-2 hover:border-hair',
                  current && 'border-act font-[660] hover:border-act',
                )}
              >
                {period}
              </Link>
            </li>
          );
        })}
      </ul>
    </nav>
  );
}
