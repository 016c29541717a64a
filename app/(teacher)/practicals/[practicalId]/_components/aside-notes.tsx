'use client';

import Link from 'next/link';
import { PressForm } from '@/app/(teacher)/practicals/_components/press-form';
import { offerPracticalAction } from '@/app/(teacher)/practicals/actions';
import { LocalTime } from '@/components/ui/local-time';
import { Heading } from '@/components/ui/titles';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { DepartmentNote } from './department-note';
import { SittingsBehind } from './sittings-behind';
import { SourceNote } from './source-note';

/** The versions so far and what hangs on each, where the practical comes from, and what the department has of it. */
export function AsideNotes({ view }: { view: PracticalView }) {
  return (
    <div className="grid content-start gap-8">
      <Versions view={view} />
      {view.source ? <SourceNote view={view} source={view.source} /> : null}
      {view.department ? <DepartmentNote view={view} department={view.department} /> : null}
    </div>
  );
}

function Versions({ view }: { view: PracticalView }) {
  const { practicalId, versions } = view;
  const held = versions.reduce((sum, { sittings }) => sum + sittings, 0);
  if (versions.length === 0) {
    return (
      <p className="text-label text-ink-2">
        Publishing makes version 1. Then you can open a sitting on it, or try it at the bench in a practice
        round.
      </p>
    );
  }
  return (
    <section aria-labelledby="versions-heading">
      <Heading id="versions-heading">Versions</Heading>
      <ul className="mt-1 text-label">
        {versions.map(({ versionId, number, publishedAt, sittings }) => (
          <li
            key={versionId}
            className="flex justify-between gap-3 items-baseline border-b border-hair py-0.5"
          >
            <span>
              <Link className="link inline-block py-1" href={`/practicals/${practicalId}/versions/${number}`}>
                version {number}
              </Link>
              , <LocalTime at={publishedAt} style="day" />
            </span>
            <span className="tnum text-ink-2">{sittingsText(sittings)}</span>
          </li>
        ))}
      </ul>
      {held > 0 ? <p className="mt-2 text-label">A sitting keeps its version until you move it.</p> : null}
      <SittingsBehind sittings={view.behind} />
      <Offer view={view} />
      <p className="mt-3 text-label">
        <Link className="link inline-block py-1" href={`/practicals/${practicalId}/variants`}>
          variants with other sizes
        </Link>
        , one for each period.
      </p>
    </section>
  );
}

function Offer({ view: { practicalId, title, offered, archived } }: { view: PracticalView }) {
  if (archived) return null;
  return (
    <div className="mt-3 grid justify-items-start gap-2 text-label">
      <p>
        {offered
          ? 'Your department can use what is published here and take copies. Copies stay if you withdraw it.'
          : 'Only you see this practical. Offered, your department can use its versions and take copies.'}
      </p>
      <PressForm
        action={offerPracticalAction}
        fields={{ practicalId, offered: offered ? 'no' : 'yes' }}
        label={offered ? 'withdraw it' : 'offer it to the department'}
        fullLabel={offered ? `withdraw ${title} from the department` : `offer ${title} to the department`}
      />
    </div>
  );
}

function sittingsText(sittings: number): string {
  if (sittings === 0) return 'no sitting';
  return sittings === 1 ? '1 sitting' : `${sittings} sittings`;
}
