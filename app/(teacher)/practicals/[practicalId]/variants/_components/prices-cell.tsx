'use client';

import { useActionState, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { PhraseList } from '@/components/ui/phrase-list';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import type { PublishedOriginal, VariantView } from '@/lib/data/practicals/load-variants';
import type { Unit } from '@/lib/length';
import { takePricesAction } from '../actions';

interface PricesCellProps {
  variant: VariantView;
  original: PublishedOriginal;
  unit: Unit;
}

/** Whether a variant costs what its original does; where not, the difference and a press that takes the prices over. */
export function PricesCell({ variant, original, unit }: PricesCellProps) {
  const [open, setOpen] = useState(false);
  const [reply, take] = useActionState(takePricesAction, undefined);
  if (variant.prices.length === 0) return <span className="text-ink-2">as the original</span>;
  return (
    <Dialog
      open={open}
      onOpenChange={setOpen}
      trigger={
        <Button size="small" aria-label={`${variant.name}: prices differ`}>
          prices differ
        </Button>
      }
      title={`Prices of ${variant.name}`}
      description={`Its draft is priced otherwise than version ${original.number} of the original, whose figures stand second.`}
      closeLabel="leave them"
    >
      <PhraseList phrases={variant.prices} unit={unit} />
      <p className="mt-4">
        Taken over, prices, checks and rules are the original’s; sizes and words stay the variant’s. The draft
        as it is now is kept and can be put back. What is published stays as it is until you publish again.
      </p>
      {reply ? <Refusal title={reply.message} className="mt-4" /> : null}
      <form action={take} className="mt-6 flex flex-wrap justify-end gap-2">
        <input type="hidden" name="practicalId" value={variant.practicalId} />
        <input type="hidden" name="revision" value={variant.revision} />
        <input type="hidden" name="versionId" value={original.versionId} />
        <SubmitButton pendingLabel="taking them …">take the prices over</SubmitButton>
      </form>
    </Dialog>
  );
}
