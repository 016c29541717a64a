import { PhraseText } from '@/components/ui/phrase-text';
import { Heading } from '@/components/ui/titles';
import { rulesInWords } from '@/lib/practicals/rules-in-words';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';

/** What decides a score besides the sizes, in sentences. */
export function VersionRules({ rubric, form }: { rubric: Rubric; form: RubricForm }) {
  return (
    <section aria-labelledby="rules-heading">
      <Heading id="rules-heading">Rules</Heading>
      <dl className="mt-2 border-t border-hair">
        {rulesInWords(rubric, form).map(({ label, phrase }) => (
          <div
            key={`${label} ${JSON.stringify(phrase)}`}
            className="grid gap-x-6 border-b border-hair py-2 sm:grid-cols-[13rem_minmax(0,1fr)]"
          >
            <dt className="text-label leading-6 text-ink-2">{label}</dt>
            <dd className="max-w-[72ch]">
              <PhraseText phrase={phrase} unit={rubric.unit} />
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
