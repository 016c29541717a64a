import { SquareHistogram } from '@/components/charts/square-histogram';
import { Heading } from '@/components/ui/titles';
import type { GradebookCell, GradebookView } from '@/lib/contracts/gradebook';
import { percentOf } from './cell-words';
import { SCALE_END, scaleFrom, spreadOf } from './spread';

interface ClassPictureProps {
  book: GradebookView;
  /** The sitting whose cell is open; -1 for none: then the latest with a number. */
  index: number;
  cell: GradebookCell | null;
}

/** Where the whole class stands in one sitting, the open cell's square in blue. */
export function ClassPicture({ book, index, cell }: ClassPictureProps) {
  const at = index >= 0 ? index : latestWithNumbers(book);
  const sitting = book.sittings[at];
  if (!sitting) return null;
  const given = book.students.flatMap(({ cells }) => cells[at] ?? []);
  const values = given.flatMap((each) => percentOf(each) ?? []);
  const spread = spreadOf(values.map(Math.round));
  return (
    <section>
      <Heading>
        {sitting.title}, {values.length} of {given.length} scored
      </Heading>
      {spread ? (
        <>
          <p className="mb-3 text-ink-2">
            median {spread.median}, middle half {spread.low} to {spread.high}
          </p>
          <SquareHistogram
            kind="full"
            values={values}
            from={scaleFrom(values)}
            to={SCALE_END}
            highlight={index >= 0 ? percentOf(cell) : null}
            label={`${sitting.title}, scores in percent`}
          />
        </>
      ) : (
        <p className="text-ink-2">No number yet.</p>
      )}
    </section>
  );
}

function latestWithNumbers({ sittings, students }: GradebookView): number {
  const has = (at: number) => students.some(({ cells }) => percentOf(cells[at] ?? null) !== null);
  const latest = sittings.map((_, at) => at).filter(has);
  return latest.at(-1) ?? sittings.length - 1;
}
