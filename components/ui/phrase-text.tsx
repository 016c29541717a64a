import { LengthText } from '@/components/ui/fraction';
import type { Unit } from '@/lib/length';
import type { Phrase } from '@/lib/practicals/compare-types';

/** Words with their lengths set as fractions, or with mm after them. */
export function PhraseText({ phrase, unit }: { phrase: Phrase; unit: Unit }) {
  return phrase.map((part, index) =>
    typeof part === 'string' ? (
      part
    ) : (
      <LengthText
        key={`${index.toString()} ${part.ticks}`}
        ticks={part.ticks}
        unit={unit}
        withUnit={unit === 'mm'}
      />
    ),
  );
}
