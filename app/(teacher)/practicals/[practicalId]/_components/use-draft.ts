'use client';

import { useEffect, useRef, useState } from 'react';
import { toast } from 'sonner';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { shareDraft } from '@/lib/practicals/share-unchanged';
import { saveDraftAction } from '../actions';
import { DraftKeeper, type KeepState, type KeptDraft } from './draft-keeper';
import { localStoreOf, readKeptHere, readLocalCopy } from './local-copy';

export interface DraftDesk {
  draft: PracticalDraft;
  keep: KeepState;
  /** The draft as it is this moment, for what happens between two drawings. */
  now(): PracticalDraft;
  /** Changes a copy of the draft and keeps it; lines that say the same stay the same objects. */
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
    const known = copy ? null : readKeptHere(practicalId);
    if (known && known.revision > first.revision) {
      latest.current = known.content;
      showDraft(known.content);
      keeper.take(known);
    }
    const again = () => void keeper.keepNow();
    const leaving = () => document.visibilityState === 'hidden' && again();
    window.addEventListener('online', again);
    window.addEventListener('focus', again);
    document.addEventListener('visibilitychange', leaving);
    return () => {
      window.removeEventListener('online', again);
      window.removeEventListener('focus', again);
      document.removeEventListener('visibilitychange', leaving);
      void keeper.keepNow();
      keeper.stop();
    };
  }, [practicalId, keeper, first]);

  const [verbs] = useState(() => {
    const replace = (next: PracticalDraft) => {
      const shared = shareDraft(latest.current, next);
      latest.current = shared;
      showDraft(shared);
      keeper.change(shared);
    };
    return {
      replace,
      now: () => latest.current,
      edit(change: (draft: PracticalDraft) => void) {
        const next = structuredClone(latest.current);
        change(next);
        replace(next);
      },
      keepNow: async () => ((await keeper.keepNow()) ? keeper.keptRevision : null),
      keepHere: (there: KeptDraft) => keeper.settle(latest.current, there.revision),
      takeThere(there: KeptDraft) {
        latest.current = there.content;
        showDraft(there.content);
        keeper.take(there);
      },
    };
  });

  return { draft, keep, ...verbs };
}
