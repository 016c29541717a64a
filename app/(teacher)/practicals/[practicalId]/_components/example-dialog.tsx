'use client';

import { LossTable } from '@/components/loss/loss-table';
import { Dialog } from '@/components/ui/dialog';
import { PhraseText } from '@/components/ui/phrase-text';
import type { ExampleAttempt } from '@/lib/practicals/example-attempts';
import { explainScore } from '@/lib/practicals/explain-score';
import { type Rubric, scoreAttempt } from '@/lib/scoring';

interface ExampleDialogProps {
  rubric: Rubric;
  example: ExampleAttempt | null;
  onClose(): void;
}

/** Where the points of an example go: a row for each loss, in both scales, down to its score. */
export function ExampleDialog({ rubric, example, onClose }: ExampleDialogProps) {
  return (
    <Dialog
      open={example !== null}
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={
        example ? (
          <span className="block first-letter:uppercase">
            <PhraseText phrase={example.label} unit={rubric.unit} />
          </span>
        ) : (
          ''
        )
      }
      className="max-w-[46rem]"
    >
      {example ? (
        <LossTable
          rubric={rubric}
          explanation={explainScore(rubric, scoreAttempt(rubric, example.attempt), 0)}
          heading="Where its points go"
        />
      ) : null}
    </Dialog>
  );
}
