'use client';

import { useEffect, useRef, useState } from 'react';
import { toast } from 'sonner';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { saveDraftAction } from '../actions';
import { DraftKeeper, type KeepState, type KeptDraft } from './draft-keeper';
import { localStoreOf, readLocalCopy } from './local-copy';

export interface DraftDesk {
  draft: PracticalDraft;
  keep: KeepState;
  /** Changes a copy of the draft and keeps it. */
  edit(change: (draft: PracticalDraft) => void): void;
  replace(draft: PracticalDraft): void;
  /** Saves what is not kept yet; the kept revision, or null when it could not be kept. */
  keepNow(): Promise<number | null>;
  keepHere(there: KeptDraft): void;
  takeThere(there: KeptDraft): void;
}

/** The draft on this desk, kept while it is typed, and brought back after a reload that came too early. */
export function useDraft(practicalId: string, opened: KeptDraft): DraftDesk {
  const [draft, showDraft] = useState(opened.content);
  const latest = useRef(opened.content);
  const [keep, setKeep] = useState<KeepState>({ kind: 'kept', at: opened.at });
  const [keeper] = useState(
    () =>
      new DraftKeeper(opened.revision, {
        save: (revision, content) => saveDraftAction(practicalId, revision, content),
        store: localStoreOf(practicalId),
        onState: setKeep,
      }),
  );

  const [first] = useState(opened);
  useEffect(() => {
    const copy = readLocalCopy(practicalId);
    if (copy) {
      latest.current = copy.content;
      showDraft(copy.content);
      toast('What you typed before is here again.');
      keeper.bringBack(copy, first);
    }
    return () => {
      void keeper.keepNow();
      keeper.stop();
    };
  }, [practicalId, keeper, first]);

  function replace(next: PracticalDraft) {
    latest.current = next;
    showDraft(next);
    keeper.change(next);
  }

  return {
    draft,
    keep,
    replace,
    edit(change) {
      const next = structuredClone(latest.current);
      change(next);
      replace(next);
    },
    async keepNow() {
      return (await keeper.keepNow()) ? keeper.keptRevision : null;
    },
    keepHere(there) {
      keeper.settle(latest.current, there.revision);
    },
    takeThere(there) {
      latest.current = there.content;
      showDraft(there.content);
      keeper.take(there);
    },
  };
}
