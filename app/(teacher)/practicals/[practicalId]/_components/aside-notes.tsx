'use client';

import { LocalTime } from '@/app/(teacher)/practicals/_components/local-time';
import { Heading } from '@/components/ui/titles';
import type { PracticalView } from '@/lib/data/practicals/read-practical';

/** The versions so far and what hangs on each. */
export function AsideNotes({ view }: { view: PracticalView }) {
  const { versions } = view;
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
          <li key={versionId} className="flex justify-between gap-3 border-b border-hair py-1.5">
            <span>
              version {number}, <LocalTime at={publishedAt} style="day" />
            </span>
            <span className="tnum text-ink-2">{sittingsText(sittings)}</span>
          </li>
        ))}
      </ul>
      {held > 0 ? (
        <p className="mt-2 text-label">A sitting keeps its version, whatever you change here.</p>
      ) : null}
    </section>
  );
}

function sittingsText(sittings: number): string {
  if (sittings === 0) return 'no sitting';
  return sittings === 1 ? '1 sitting' : `${sittings} sittings`;
}
