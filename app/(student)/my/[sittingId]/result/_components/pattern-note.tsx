import { LengthText } from '@/components/ui/fraction';
import { COMES_FIRST } from '@/lib/practicals/cautions';
import { FEWEST_LENGTHS, type LengthPattern } from '@/lib/practicals/length-pattern';
import type { Rubric } from '@/lib/scoring';

const NUMBERS = [
  'none',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

const inWords = (count: number) => NUMBERS[count] ?? String(count);

/** One sentence on how the lengths lean, and how that is decided. */
export function PatternNote({ pattern, rubric }: { pattern: LengthPattern; rubric: Rubric }) {
  const { of, short, long, leans, byAtLeast } = pattern;
  if (!leans) {
    return (
      <p className="border-y border-ink py-3">
        Your lengths lean to neither side: of {inWords(of)} read by number, {inWords(short)}{' '}
        {short === 1 ? 'is' : 'are'} short and {inWords(long)} {long === 1 ? 'is' : 'are'} long.
      </p>
    );
  }
  const count = leans === 'short' ? short : long;
  const words = inWords(count);
  return (
    <div className="border-y border-ink py-3">
      <p className="text-heading">
        {words.charAt(0).toUpperCase()}
        {words.slice(1)} of {inWords(of)} lengths are {leans}
        {byAtLeast ? (
          <>
            {' '}
            by <LengthText ticks={byAtLeast} unit={rubric.unit} /> or more
          </>
        ) : null}
        . Check which side of the line the blade runs
        {leans === 'short' ? ': the kerf belongs in the waste.' : '.'}
      </p>
      <details className="mt-2 text-label text-ink-2">
        <summary className="min-h-6 cursor-pointer">how this is decided</summary>
        <p className="mt-1 max-w-[62ch]">
          It is said when at least {inWords(FEWEST_LENGTHS)} lengths were read by number and at least four of
          five of them are off to the same side by more than the reading margin (
          <LengthText ticks={rubric.margin} unit={rubric.unit} withUnit />
          ). Here {short} of {of} are short and {long} long. {COMES_FIRST}
        </p>
      </details>
    </div>
  );
}
