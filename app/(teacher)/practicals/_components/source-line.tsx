import Link from 'next/link';
import { PhraseList } from '@/components/ui/phrase-list';
import type { ListedSource } from '@/lib/data/practicals/list-practicals';
import type { Unit } from '@/lib/length';

interface SourceLineProps {
  practicalId: string;
  unit: Unit;
  source: ListedSource;
}

/** What a practical was taken from, and when its original has moved on, what that changes. */
export function SourceLine({ practicalId, unit, source }: SourceLineProps) {
  const { kind, ownerName, title, number, newest } = source;
  const from = ownerName ? `${ownerName}’s version ${number}` : `version ${number} of your “${title}”`;
  const words = kind === 'variant' ? `a variant of ${from}` : `from ${from}`;
  if (!newest || kind === 'variant') {
    return <span className="block text-small font-[440] text-ink-2">{words}</span>;
  }
  return (
    <div className="text-small font-[440]">
      <details>
        <summary className="w-fit cursor-pointer py-1">
          <span className="text-ink-2">{words};</span> <strong>version {newest.number} is out</strong>
        </summary>
        <PhraseList phrases={newest.changes} unit={unit} className="max-w-[60ch]" />
        <Link className="link inline-block py-1" href={`/practicals/${practicalId}`}>
          look at it in your copy
        </Link>
      </details>
    </div>
  );
}
