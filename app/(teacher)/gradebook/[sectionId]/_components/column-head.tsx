import { SquareHistogram } from '@/components/charts/square-histogram';
import { sayShortDayOf } from '@/components/ui/days';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { percentOf } from './cell-words';
import { SCALE_END } from './spread';

interface ColumnHeadProps {
  book: GradebookView;
  index: number;
  /** The common lower end of all histograms. */
  from: number;
}

/** A sitting's head: what it is, when, and everybody's score as a square on a rule. */
export function ColumnHead({ book, index, from }: ColumnHeadProps) {
  const sitting = book.sittings[index];
  if (!sitting) return null;
  const values = book.students.flatMap(({ cells }) => percentOf(cells[index] ?? null) ?? []);
  return (
    <span className="flex h-full min-h-24 flex-col">
      <span className="block text-text font-[660] text-ink">{sitting.title}</span>
      <span className="block truncate text-small font-stretch-[88%]">{whenOf(sitting, book.timeZone)}</span>
      <SquareHistogram
        values={values}
        from={from}
        to={SCALE_END}
        label={`${sitting.title}, scores in percent`}
        className="mt-auto -mb-px max-w-full pt-1"
      />
    </span>
  );
}

function whenOf({ publication, openedAt }: GradebookView['sittings'][number], timeZone: string): string {
  if (!publication) return `${sayShortDayOf(openedAt, timeZone)}, being recorded`;
  const day = sayShortDayOf(publication.publishedAt, timeZone);
  return `${publication.number > 1 ? 'corrected' : 'published'} ${day}`;
}
