import type { Unit } from '@/lib/length';
import type { Phrase } from '@/lib/practicals/compare-types';
import { classNames } from './class-names';
import { PhraseText } from './phrase-text';

interface PhraseListProps {
  phrases: readonly Phrase[];
  unit: Unit;
  className?: string;
}

/** Sentences with lengths in them, one below the other. */
export function PhraseList({ phrases, unit, className }: PhraseListProps) {
  return (
    <ul className={classNames('list-disc pl-5', className)}>
      {phrases.map((phrase) => (
        <li key={JSON.stringify(phrase)} className="first-letter:uppercase">
          <PhraseText phrase={phrase} unit={unit} />
        </li>
      ))}
    </ul>
  );
}
