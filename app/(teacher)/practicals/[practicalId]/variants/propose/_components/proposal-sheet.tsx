'use client';

import { CheckboxField } from '@/components/ui/choice';
import { PhraseList } from '@/components/ui/phrase-list';
import type { ProposedVariantsView } from '@/lib/data/practicals/propose-variants';
import { VariantDrawing } from '../../_components/variant-drawing';
import { ReviewOfVariant } from './review-of-variant';
import { SizeTable } from './size-table';
import type { MovingAxis, Proposed } from './use-proposals';

interface ProposalSheetProps {
  view: ProposedVariantsView;
  proposed: Proposed;
  onType(lineId: string, axis: MovingAxis, text: string): void;
  onTake(isTaken: boolean): void;
}

/** One proposal: its sizes beside the original's, its pieces over the original's, what is to be said of it. */
export function ProposalSheet({ view, proposed, onType, onTake }: ProposalSheetProps) {
  const { original, unit } = view;
  const name = `variant ${proposed.letter}`;
  const id = `proposal-${proposed.letter}`;
  return (
    <section aria-labelledby={id} className="border-t-edge border-ink pt-2">
      <div className="flex flex-wrap items-center justify-between gap-x-6">
        <h2 id={id} className="font-title text-[1.5rem] leading-9 font-[620] first-letter:uppercase">
          {name}
        </h2>
        <CheckboxField
          label={`make ${name}`}
          checked={proposed.isTaken}
          onChange={(event) => onTake(event.target.checked)}
        />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-10 gap-y-4 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <SizeTable view={view} proposed={proposed} onType={onType} />
        <div>
          <VariantDrawing
            original={original.task.cutList}
            variant={proposed.cutList}
            width={350}
            height={170}
            className="h-auto"
          />
          <p className="mt-1 text-small text-ink-2">
            One piece of each line; the original dashed where it differs.
          </p>
          {proposed.isChanged ? <p className="mt-3 font-[580]">Changed by hand.</p> : null}
          <PhraseList phrases={proposed.judgement.words} unit={unit} className="mt-3 text-label" />
          <ReviewOfVariant view={view} proposed={proposed} />
        </div>
      </div>
    </section>
  );
}
