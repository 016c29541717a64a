'use client';

import { useRouter } from 'next/navigation';
import { useState, useTransition } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PhraseText } from '@/components/ui/phrase-text';
import { Refusal } from '@/components/ui/refusal';
import type { ProposedVariantsView } from '@/lib/data/practicals/propose-variants';
import { makeVariantsAction } from '../../actions';
import { ProposalSheet } from './proposal-sheet';
import { type Proposed, useProposals } from './use-proposals';

/** The proposals beside the original: looked at, changed by hand, chosen and made. */
export function ProposalsDesk({ view }: { view: ProposedVariantsView }) {
  const { practicalId, original, proposals, stopped, unit } = view;
  const { shown, type, take } = useProposals(view);
  const making = useMaking(practicalId, original.versionId);
  const taken = shown.filter(({ isTaken }) => isTaken);
  if (proposals.length === 0) {
    return (
      <EmptyState title="No sizes found by the rule" className="mt-8">
        {stopped ? <PhraseText phrase={stopped.words} unit={unit} /> : null} A smaller gross limit, another
        graduation or pieces that differ more from each other give it room.
      </EmptyState>
    );
  }
  return (
    <div className="mt-8 grid grid-cols-[minmax(0,1fr)] gap-10">
      {stopped ? (
        <Notice title={`${proposals.length} of ${view.count} found.`}>
          <PhraseText phrase={stopped.words} unit={unit} />
        </Notice>
      ) : null}
      {shown.map((proposed) => (
        <ProposalSheet
          key={proposed.letter}
          view={view}
          proposed={proposed}
          onType={(lineId, axis, text) => type(proposed.letter, lineId, axis, text)}
          onTake={(isTaken) => take(proposed.letter, isTaken)}
        />
      ))}
      <div className="grid gap-3 border-t-outline border-ink pt-4">
        {making.refused ? <Refusal title={making.refused} /> : null}
        <div className="flex flex-wrap items-center gap-4">
          <Button
            kind="act"
            notYet={whyNotYet(taken)}
            disabled={making.pending}
            aria-busy={making.pending}
            onClick={() => making.make(taken)}
          >
            {making.pending ? 'making them …' : sayMake(taken.map(({ letter }) => letter))}
          </Button>
          <p className="max-w-[62ch] text-label text-ink-2">
            {namesSizes(view)
              ? 'Each becomes a draft with the instructions and notes of the original. They name sizes: read them again before you publish.'
              : 'Each becomes a draft of its own. Review it and publish it like any other practical.'}
          </p>
        </div>
      </div>
    </div>
  );
}

function useMaking(practicalId: string, versionId: string) {
  const router = useRouter();
  const [pending, start] = useTransition();
  const [refused, setRefused] = useState<string | null>(null);

  function make(taken: readonly Proposed[]) {
    setRefused(null);
    const variants = taken.map(({ letter, cutList }) => ({
      letter,
      lines: cutList.lines.map(({ id, target: { width, length } }) => ({ lineId: id, width, length })),
    }));
    start(async () => {
      const reply = await makeVariantsAction({ practicalId, versionId, variants }).catch(() => null);
      if (reply && 'made' in reply) {
        toast(`${reply.made.join(' and ')} ${reply.made.length === 1 ? 'is' : 'are'} made.`);
        router.push(`/practicals/${practicalId}/variants`);
        return;
      }
      setRefused(
        reply?.message ??
          'The server does not answer. Nothing was made; what you typed is still here. Try again.',
      );
    });
  }
  return { pending, refused, make };
}

function whyNotYet(taken: readonly { errors: Map<string, string> }[]): string | null {
  if (taken.length === 0) return 'choose at least one';
  return taken.some(({ errors }) => errors.size > 0) ? 'a size cannot be read' : null;
}

function sayMake(letters: readonly string[]): string {
  const [last = '', ...others] = [...letters].reverse();
  if (others.length === 0) return `make variant ${last}`.trim();
  return `make variants ${others.reverse().join(', ')} and ${last}`;
}

/** Whether the words of the task hold figures, which a variant copies as they are. */
function namesSizes({ original: { task } }: ProposedVariantsView): boolean {
  return [task.instructions, ...Object.values(task.lineNotes)].some((text) => /\d/.test(text));
}
