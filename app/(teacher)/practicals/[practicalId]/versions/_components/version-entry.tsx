import Link from 'next/link';
import type { ReactNode } from 'react';
import { LocalTime } from '@/components/ui/local-time';
import { PhraseList } from '@/components/ui/phrase-list';
import { FileLink } from '@/components/version/file-link';
import type { ListedVersion, VersionList } from '@/lib/data/practicals/list-versions';
import { fieldName } from '@/lib/practicals/field-names';

const NAME = 'underline decoration-hair underline-offset-4 hover:decoration-ink';

/** One version: what it is called, when and by whom it was published, what stands on it, what it changed. */
export function VersionEntry({ view, version }: { view: VersionList; version: ListedVersion }) {
  const { practicalId, unit } = view;
  const { number, publishedAt, publisherName, sittings, changes, differenceReason } = version;
  return (
    <Entry
      name={
        <Link className={NAME} href={`/practicals/${practicalId}/versions/${number}`}>
          version {number}
        </Link>
      }
      about={
        <>
          <LocalTime at={publishedAt} style="day" />
          <span className="block">{publisherName}</span>
          <span className="block">{sittingsText(sittings)}</span>
        </>
      }
      press={<FileLink practicalId={practicalId} version={number} small />}
    >
      {changes ? (
        <PhraseList phrases={changes} unit={unit} />
      ) : (
        <p className="text-ink-2">
          {number === 1 ? 'The first one.' : 'The one before it is not yours to see.'}
        </p>
      )}
      {differenceReason ? (
        <p className="mt-2">
          Differs from the department’s: <q>{differenceReason}</q>
        </p>
      ) : null}
    </Entry>
  );
}

const MOST_NAMED = 8;

interface DraftEntryProps {
  view: VersionList;
  draft: NonNullable<VersionList['draft']>;
}

/** The draft above its versions: what it would change, or which fields cannot be read yet. */
export function DraftEntry({ view, draft: { savedAt, changes, wrong } }: DraftEntryProps) {
  const { practicalId, unit, versions } = view;
  const named = wrong.slice(0, MOST_NAMED).map(fieldName).join('; ');
  return (
    <Entry
      name={
        <Link className={NAME} href={`/practicals/${practicalId}`}>
          draft
        </Link>
      }
      about={
        <>
          kept <LocalTime at={savedAt} style="day" />
        </>
      }
      press={wrong.length === 0 ? <FileLink practicalId={practicalId} version={null} small /> : null}
    >
      {wrong.length > 0 ? (
        <p>
          {wrong.length === 1 ? 'One field' : `${wrong.length} fields`} cannot be read yet: {named}
          {wrong.length > MOST_NAMED ? ' …' : ''}. Put right, the draft can be published or taken out as a
          file.
        </p>
      ) : null}
      {changes && changes.length > 0 ? <PhraseList phrases={changes} unit={unit} /> : null}
      {changes && changes.length === 0 ? (
        <p className="text-ink-2">Nothing is changed since version {versions[0]?.number}.</p>
      ) : null}
      {changes === null && wrong.length === 0 ? (
        <p className="text-ink-2">Nothing is published yet.</p>
      ) : null}
    </Entry>
  );
}

interface EntryProps {
  name: ReactNode;
  about: ReactNode;
  press: ReactNode;
  children: ReactNode;
}

function Entry({ name, about, press, children }: EntryProps) {
  return (
    <li className="grid gap-x-8 gap-y-2 border-b border-hair py-4 md:grid-cols-[13rem_minmax(0,1fr)_auto]">
      <div>
        <h2 className="font-title text-[1.25rem] leading-6 font-[620]">{name}</h2>
        <p className="mt-1 text-label text-ink-2">{about}</p>
      </div>
      <div className="max-w-[76ch]">{children}</div>
      <div className="print:hidden">{press}</div>
    </li>
  );
}

function sittingsText(count: number): string {
  if (count === 0) return 'no sitting on it';
  return count === 1 ? '1 sitting on it' : `${count} sittings on it`;
}
