import { LengthText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import { WOOD_PERCENT } from '@/lib/practicals/propose-variants-types';
import type { Rubric } from '@/lib/scoring';

/** The rule by which sizes count as equally difficult, and what becomes of a borrowed piece. */
export function VariantRule({ rubric }: { rubric: Rubric }) {
  return (
    <section aria-labelledby="rule-heading">
      <Heading id="rule-heading">What is proposed</Heading>
      <p className="mt-1 text-label text-ink-2">
        The rule by which this product calls sizes equally difficult. Whether they are for your class, you
        judge.
      </p>
      <ul className="mt-2 [&>li]:border-t [&>li]:border-hair [&>li]:py-2">
        <li>The same pieces at the same prices, from the same blank.</li>
        <li>Thickness stays, and every width that is as thick: the stock is given.</li>
        <li>
          Widths and lengths move by whole graduations, equal sizes together, none by more than a quarter of
          itself. Their order stays.
        </li>
        <li>The wood stays within {WOOD_PERCENT} percent of the original’s, kerfs counted.</li>
        <li>
          Any piece of one, handed in for any line of another, is off by more than{' '}
          {rubric.grossLimit === null ? (
            'twice the last band'
          ) : (
            <>
              the gross limit of <LengthText ticks={rubric.grossLimit} unit={rubric.unit} withUnit />
            </>
          )}{' '}
          somewhere.
        </li>
      </ul>
    </section>
  );
}
