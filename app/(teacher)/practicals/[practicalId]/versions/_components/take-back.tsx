'use client';

import { useRouter } from 'next/navigation';
import { useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Refusal } from '@/components/ui/refusal';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { DraftDifference } from '@/lib/practicals/field-names';
import { type DraftReply, takeBackVersionAction, undoTakeBackAction } from '../actions';
import { GivingWay } from './giving-way';
import { TakenBack } from './taken-back';

interface TakeBackProps {
  practicalId: string;
  number: number;
  draft: { content: PracticalDraft; revision: number };
  /** What of the draft would be another thing; none when it says the same already. */
  differences: DraftDifference[];
}

type State = { at: 'idle' } | { at: 'taken'; revision: number; before: PracticalDraft } | { at: 'undone' };

/** Makes the draft say what this version says: what would give way is shown first, and it can be undone. */
export function TakeBack({ practicalId, number, draft, differences }: TakeBackProps) {
  const router = useRouter();
  const [asking, setAsking] = useState(false);
  const [state, setState] = useState<State>({ at: 'idle' });
  const [refused, setRefused] = useState<string | null>(null);
  const [pending, start] = useTransition();

  function press(work: () => Promise<DraftReply>, done: (revision: number) => State) {
    start(async () => {
      const reply = await work().catch(() => null);
      if (!reply?.ok) {
        setRefused(
          reply?.message ?? 'The server does not answer. Nothing was changed; try again in a moment.',
        );
        return;
      }
      setRefused(null);
      setAsking(false);
      setState(done(reply.revision));
      router.refresh();
    });
  }

  const take = () =>
    press(
      () => takeBackVersionAction(practicalId, number, draft.revision),
      (revision) => ({ at: 'taken', revision, before: draft.content }),
    );
  const undo = (revision: number, before: PracticalDraft) =>
    press(
      () => undoTakeBackAction(practicalId, revision, before),
      () => ({ at: 'undone' }),
    );

  return (
    <>
      <Dialog
        open={asking}
        onOpenChange={setAsking}
        trigger={
          <Button notYet={differences.length === 0 ? 'your draft says this already' : undefined}>
            take it back into my draft
          </Button>
        }
        title={`Take version ${number} back into your draft?`}
        description="What is published stays as it is, and so does every sitting. Of the draft, this gives way:"
      >
        <GivingWay differences={differences} number={number} />
        {refused ? <Refusal title={refused} className="mt-4" /> : null}
        <div className="mt-6 flex flex-wrap justify-end gap-2">
          <Button onClick={() => setAsking(false)}>leave my draft</Button>
          <Button kind="act" onClick={take} disabled={pending} aria-busy={pending}>
            {pending ? 'taking it back …' : `take version ${number} back`}
          </Button>
        </div>
      </Dialog>
      {state.at === 'taken' ? (
        <TakenBack
          {...{ practicalId, number, pending, refused }}
          onUndo={() => undo(state.revision, state.before)}
        />
      ) : null}
      {state.at === 'undone' ? (
        <p role="status" className="w-0 min-w-full text-label">
          Your draft is as it was.
        </p>
      ) : null}
    </>
  );
}
