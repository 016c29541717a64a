import Link from 'next/link';
import { LinkButton } from '@/components/ui/link-button';
import { pointsAsText } from '@/components/ui/points-text';
import { Refusal } from '@/components/ui/refusal';
import type { ExplanationView, GradebookCell, GradebookView } from '@/lib/contracts/gradebook';
import { spokenName } from '../../../_components/names';
import { ExplanationRows } from './explanation-rows';
import { useExplanation } from './use-gradebook';

interface ExplanationProps {
  book: GradebookView;
  cell: GradebookCell;
  /** The dialog has the name in its head already. */
  inDialog?: boolean;
}

/** One attempt: the score, and each point that went, with target and reading. */
export function Explanation({ book, cell, inDialog = false }: ExplanationProps) {
  const { sectionId } = book.section;
  const { explanation, failed } = useExplanation(sectionId, cell.attemptId, JSON.stringify(cell));
  if (failed) {
    return (
      <Refusal title="The explanation did not come.">
        Nothing is lost. Look again in a moment, or choose the cell once more.
      </Refusal>
    );
  }
  if (!explanation) return <p className="text-ink-2">looking it up</p>;
  return (
    <section aria-live="polite">
      <Head explanation={explanation} inDialog={inDialog} />
      {explanation.status === 'scored' ||
      explanation.status === 'reading' ||
      explanation.status === 'conflict' ? (
        <ExplanationRows explanation={explanation} />
      ) : (
        <p className="my-4 max-w-[44ch]">{WITHOUT[explanation.status]}</p>
      )}
      {book.may.change ? (
        <div className="mt-4 flex flex-wrap gap-2">
          <LinkButton size="small" href={`/round/${explanation.sittingId}`}>
            at the bench
          </LinkButton>
          <LinkButton size="small" href={`/sittings/${explanation.sittingId}`}>
            excuse, late, redo
          </LinkButton>
        </div>
      ) : null}
    </section>
  );
}

const WITHOUT: Record<'zero' | 'absent' | 'excused' | 'not read', string> = {
  zero: 'A zero was given. It is a number, and counts in the mean.',
  absent: 'Absent: there is no number, and the mean goes on without it.',
  excused: 'Excused: there is no number, and the mean goes on without it.',
  'not read': 'Not read: there is no number yet.',
};

function Head({ explanation, inDialog }: { explanation: ExplanationView; inDialog: boolean }) {
  const { title, versionNumber, attemptNumber, attempts, score, published, counted, redo } = explanation;
  return (
    <header className="border-b border-ink pb-2">
      <div className="flex items-start justify-between gap-4">
        <div className="min-w-0">
          {inDialog ? null : <h2 className="text-key">{spokenName(explanation)}</h2>}
          <p className="text-label text-ink-2">
            {title}, version {versionNumber}
            {attempts.length > 1 ? `, attempt ${attemptNumber}` : ''}
            {published ? '' : ', being recorded'}
          </p>
        </div>
        {score === null ? null : (
          <p className={`tnum text-score ${published ? '' : 'font-[380]'}`}>{pointsAsText(score)}</p>
        )}
      </div>
      {redo && counted !== null ? (
        <p className="mt-1 text-label">
          {attempts
            .map(
              ({ number, score: each }) =>
                `attempt ${number}: ${each === null ? 'no number' : pointsAsText(each)}`,
            )
            .join(', ')}
          ; {redo}. <strong>{pointsAsText(counted)} counts.</strong>
        </p>
      ) : null}
      {explanation.status === 'conflict' ? (
        <p className="mt-1 text-label">
          <strong>Two readings of one size stand against each other.</strong>{' '}
          <Link className="link" href={`/round/${explanation.sittingId}`}>
            Choose at the bench
          </Link>
          . Until then it counts as not read.
        </p>
      ) : null}
    </header>
  );
}
