import Link from 'next/link';
import { PhraseList } from '@/components/ui/phrase-list';
import { Heading } from '@/components/ui/titles';
import type { DeclaredVersion } from '@/lib/data/department/read-declared-differences';
import type { Unit } from '@/lib/length';
import { sayPeriods } from '../../_components/words';

interface DeclaredDifferencesProps {
  versions: DeclaredVersion[];
  unit: Unit;
}

/** Each teacher's rubric of this task, and where it differs from the department's. */
export function DeclaredDifferences({ versions, unit }: DeclaredDifferencesProps) {
  return (
    <section aria-labelledby="declared-heading">
      <Heading id="declared-heading">Declared differences</Heading>
      <p className="mt-1 max-w-[75ch] text-label text-ink-2">
        Every rubric of the department that was taken from this one or prices the same pieces: the newest
        version, and each that a sitting stands under.
      </p>
      {versions.length === 0 ? (
        <p className="mt-3">No other rubric of the department was taken from it or prices these pieces.</p>
      ) : (
        <ul className="mt-3">
          {versions.map((version) => (
            <Declared key={version.versionId} version={version} unit={unit} />
          ))}
        </ul>
      )}
    </section>
  );
}

function Declared({ version, unit }: { version: DeclaredVersion; unit: Unit }) {
  const { versionId, ownerName, title, number, periods, same, sentences, reason } = version;
  return (
    <li className="grid gap-x-8 gap-y-1 border-t border-hair py-3 md:grid-cols-[16rem_minmax(0,1fr)]">
      <div>
        <h3 className="font-[640]">{ownerName}</h3>
        <p className="text-label text-ink-2">
          {title},{' '}
          <Link className="link" href={`/department/versions/${versionId}`}>
            version {number}
          </Link>
          ; {periods.length > 0 ? `used in ${sayPeriods(periods)}` : 'no sitting yet'}
        </p>
      </div>
      <div className="max-w-[75ch]">
        {same ? <p>No difference.</p> : <PhraseList phrases={sentences} unit={unit} />}
        {reason ? (
          <p className="mt-1">
            <span className="text-ink-2">Why: </span>
            {reason}
          </p>
        ) : null}
        {!same && !reason ? <p className="mt-1 text-label text-ink-2">No reason given.</p> : null}
      </div>
    </li>
  );
}
