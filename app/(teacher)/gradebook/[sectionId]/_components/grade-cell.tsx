import { DeviationStrip } from '@/components/rule/deviation-strip';
import { classNames } from '@/components/ui/class-names';
import { pointsAsText } from '@/components/ui/points-text';
import type { GradebookCell } from '@/lib/contracts/gradebook';
import { notesOf, wordOf } from './cell-words';

interface GradeCellProps {
  cell: GradebookCell | null;
  /** The points that fill half a strip. */
  full: number;
}

/** A score and where its points went; bold once published, thin while recorded; a word where there is no number. */
export function GradeCell({ cell, full }: GradeCellProps) {
  const word = wordOf(cell);
  if (cell === null || word !== null) {
    return (
      <span className="block text-center text-label text-ink-2">
        <span
          className={
            word === 'absent' || word === 'two readings' ? 'border-b border-dashed border-ink-2' : undefined
          }
        >
          {word}
        </span>
        {cell && notesOf(cell).length > 0 ? <Notes cell={cell} /> : null}
      </span>
    );
  }
  return (
    <span className="grid grid-cols-[2.4rem_4rem_minmax(0,1fr)] items-center">
      <span className={classNames('pr-1 text-right text-text', cell.published ? 'font-[700]' : 'font-[380]')}>
        {pointsAsText(cell.score ?? 0)}
      </span>
      {cell.status === 'zero' ? (
        <span className="col-span-2 pl-3 text-left text-small font-stretch-[88%] text-ink-2">zero</span>
      ) : (
        <>
          <DeviationStrip
            under={cell.lost.under}
            over={cell.lost.over}
            dearestUnder={cell.lost.dearestUnder}
            dearestOver={cell.lost.dearestOver}
            full={full}
            className="h-4.5 w-16"
          />
          <span className="flex min-w-0 items-center justify-end gap-1">
            {cell.attemptNumber > 1 ? <AttemptSign number={cell.attemptNumber} /> : null}
            <Notes cell={cell} />
          </span>
        </>
      )}
    </span>
  );
}

function Notes({ cell }: { cell: GradebookCell }) {
  const notes = notesOf(cell);
  if (notes.length === 0) return null;
  return (
    <span className="truncate pl-1 text-small font-stretch-[82%] text-ink-2" title={notes.join(', ')}>
      {notes.join(', ')}
    </span>
  );
}

/** A second attempt, or a later one. */
export function AttemptSign({ number }: { number: number }) {
  return (
    <svg
      viewBox="0 0 22 20"
      role="img"
      aria-label={`attempt ${number}`}
      className="h-[1.15rem] w-auto shrink-0"
    >
      <path d="M11 1.5L21 18.5H1Z" className="fill-none stroke-ink [stroke-width:1.5]" />
      <text x="11" y="16" fontSize="11.5" className="fill-ink font-[660] [text-anchor:middle]">
        {number}
      </text>
    </svg>
  );
}
