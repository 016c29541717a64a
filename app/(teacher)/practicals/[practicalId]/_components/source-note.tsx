'use client';

import Link from 'next/link';
import { Notice } from '@/components/ui/notice';
import { PhraseList } from '@/components/ui/phrase-list';
import { Heading } from '@/components/ui/titles';
import type { SourceView } from '@/lib/data/practicals/practical-source';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { PutBack } from './put-back';
import { TakeNewer } from './take-newer';

/** The version this practical was taken from; when its original has moved on, what that changes and a press to follow. */
export function SourceNote({ view, source }: { view: PracticalView; source: SourceView }) {
  const newest = source.kind === 'variant' ? null : source.newest;
  return (
    <section aria-labelledby="source-heading">
      <Heading id="source-heading">Where it comes from</Heading>
      <p className="mt-1 text-label">
        From {saySource(source)}.
        {source.isOpen ? '' : ' It is not on offer any more; your copy stays as it is.'}
      </p>
      {source.kind === 'variant' ? (
        <p className="mt-1 text-label">
          <Link className="link" href={`/practicals/${view.practicalId}/variants`}>
            its prices beside the original’s
          </Link>
        </p>
      ) : null}
      {newest ? (
        <div className="mt-3 text-label">
          <Notice title={`Version ${newest.number} is out.`} />
          <details className="mt-1" open={newest.changes.length < 4}>
            <summary className="cursor-pointer py-1.5 font-[640]">what it changes</summary>
            <PhraseList phrases={newest.changes} unit={view.unit} />
          </details>
          <div className="mt-2">
            <TakeNewer view={view} source={source} newest={newest} />
          </div>
        </div>
      ) : null}
      {view.tookOver === null ? null : <PutBack view={view} source={source} tookOver={view.tookOver} />}
    </section>
  );
}

/** "Rut Lindqvist’s version 1", "version 2 of your Desk caddy", with "sizes of its own" for a variant. */
function saySource({ kind, ownerName, title, number }: SourceView): string {
  const version = ownerName ? `${ownerName}’s version ${number}` : `version ${number} of your “${title}”`;
  return kind === 'variant' ? `${version}, with sizes of its own` : version;
}
