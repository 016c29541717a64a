import { PhraseText } from '@/components/ui/phrase-text';
import type { VersionChoice } from '@/lib/contracts/moves';

interface VersionChangesProps {
  choice: VersionChoice;
  unit: 'in' | 'mm';
}

/** What a version changes of the one the sitting stands on, a sentence each. */
export function VersionChanges({ choice: { changes }, unit }: VersionChangesProps) {
  if (changes.length === 0) return <p>No difference: every reading costs the same.</p>;
  return (
    <ul className="grid max-w-[68ch] gap-1">
      {changes.map((phrase) => (
        <li key={JSON.stringify(phrase)} className="flex gap-2.5">
          <span aria-hidden className="mt-2.5 h-px w-3 shrink-0 bg-ink" />
          <span className="min-w-0 first-letter:uppercase">
            <PhraseText phrase={phrase} unit={unit} />
          </span>
        </li>
      ))}
    </ul>
  );
}
