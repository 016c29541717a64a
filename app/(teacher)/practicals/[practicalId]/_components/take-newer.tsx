'use client';

import { useState } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { PhraseList } from '@/components/ui/phrase-list';
import { Refusal } from '@/components/ui/refusal';
import type { NewerVersion, SourceView } from '@/lib/data/practicals/practical-source';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import type { Phrase } from '@/lib/practicals/compare-types';
import { ownDifferences } from '@/lib/practicals/take-over';
import { takeNewerVersionAction } from '../actions';
import { useEditor } from './editor-context';
import { useDraftPress } from './use-draft-press';

interface TakeNewerProps {
  view: PracticalView;
  source: SourceView;
  newest: NewerVersion;
}

/** Takes the newer version over; a draft with differences of its own says first what gives way. */
export function TakeNewer({ view, source, newest }: TakeNewerProps) {
  const { desk } = useEditor();
  const [giving, setGiving] = useState<Phrase[] | null>(null);
  const press = useDraftPress(desk, (revision) =>
    takeNewerVersionAction(view.practicalId, revision, newest.versionId),
  );
  const label = `take version ${newest.number} over`;

  function take() {
    press.run(() => {
      setGiving(null);
      toast(`Version ${newest.number} is taken over. The draft before it can be put back.`);
    });
  }

  function ask() {
    const own = ownDifferences(desk.draft, source);
    if (own.length === 0) take();
    else setGiving(own);
  }

  return (
    <>
      <Button size="small" disabled={press.pending} onClick={ask}>
        {press.pending ? 'taking it over …' : label}
      </Button>
      {press.refused && giving === null ? <Refusal title={press.refused} className="mt-2" /> : null}
      <Dialog
        open={giving !== null}
        onOpenChange={(open) => {
          if (!open) setGiving(null);
        }}
        title={`Take version ${newest.number} over?`}
        description={`Your draft differs from version ${source.number}. These differences give way; the title stays yours.`}
      >
        <PhraseList phrases={giving ?? []} unit={view.unit} />
        <p className="mt-4">
          The draft as it is now is kept and can be put back with one press. What you have published, and
          every sitting, stays as it is.
        </p>
        {press.refused ? <Refusal title={press.refused} className="mt-4" /> : null}
        <div className="mt-6 flex flex-wrap justify-end gap-2">
          <Button onClick={() => setGiving(null)}>leave it</Button>
          <Button kind="act" onClick={take} disabled={press.pending} aria-busy={press.pending}>
            {press.pending ? 'taking it over …' : label}
          </Button>
        </div>
      </Dialog>
    </>
  );
}
