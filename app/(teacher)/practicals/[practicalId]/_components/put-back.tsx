'use client';

import { useState } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { PhraseList } from '@/components/ui/phrase-list';
import { Refusal } from '@/components/ui/refusal';
import type { SourceView } from '@/lib/data/practicals/practical-source';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import type { Phrase } from '@/lib/practicals/compare-types';
import { ownDifferences } from '@/lib/practicals/take-over';
import { putBackDraftAction } from '../actions';
import { useEditor } from './editor-context';
import { useDraftPress } from './use-draft-press';

/** A variant goes on standing on the version it was made from, so what is new in it cannot be told apart. */
const SINCE: Phrase = ['The prices that were taken over, and all that was typed since.'];

interface PutBackProps {
  view: PracticalView;
  source: SourceView;
  tookOver: number;
}

/** The way back from a version that was taken over; what was made otherwise since is told first. */
export function PutBack({ view, source, tookOver }: PutBackProps) {
  const { desk } = useEditor();
  const [giving, setGiving] = useState<Phrase[] | null>(null);
  const press = useDraftPress(desk, (revision) => putBackDraftAction(view.practicalId, revision));

  function putBack() {
    press.run(() => {
      setGiving(null);
      toast('The draft from before is back.');
    });
  }

  function ask() {
    const since = source.kind === 'variant' ? [SINCE] : ownDifferences(desk.draft, source);
    if (since.length === 0) putBack();
    else setGiving(since);
  }

  return (
    <div className="mt-3 grid justify-items-start gap-2 text-label">
      <p>
        {source.kind === 'variant' ? `The prices of version ${tookOver} were` : `Version ${tookOver} was`}{' '}
        taken over. Your draft from before is kept.
      </p>
      <Button size="small" disabled={press.pending} onClick={ask}>
        {press.pending ? 'putting it back …' : 'put my draft back'}
      </Button>
      {press.refused && giving === null ? <Refusal title={press.refused} /> : null}
      <Dialog
        open={giving !== null}
        onOpenChange={(open) => {
          if (!open) setGiving(null);
        }}
        title="Put your earlier draft back?"
        description="This was made otherwise since. It goes, and is not kept."
      >
        <PhraseList phrases={giving ?? []} unit={view.unit} />
        {press.refused ? <Refusal title={press.refused} className="mt-4" /> : null}
        <div className="mt-6 flex flex-wrap justify-end gap-2">
          <Button onClick={() => setGiving(null)}>leave it</Button>
          <Button kind="refuse" onClick={putBack} disabled={press.pending} aria-busy={press.pending}>
            put my draft back
          </Button>
        </div>
      </Dialog>
    </div>
  );
}
