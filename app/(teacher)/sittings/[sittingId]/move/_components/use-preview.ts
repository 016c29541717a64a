'use client';

import { useEffect, useState } from 'react';
import type { MovePreview } from '@/lib/contracts/moves';
import { PreviewFailure, readPreview } from './read-preview';

export type PreviewState =
  | { kind: 'running'; done: number; of: number | null }
  | { kind: 'stopped' }
  | { kind: 'failed'; message: string; signedOut: boolean }
  | { kind: 'ready'; preview: MovePreview };

const STARTING: PreviewState = { kind: 'running', done: 0, of: null };

/** The preview of a move, made as soon as the page is there; `stop` lets go of it, `again` makes it anew. */
export function usePreview(sittingId: string, versionId: string) {
  const [state, setState] = useState<PreviewState>(STARTING);
  const [run, setRun] = useState(0);
  const [wanted, setWanted] = useState(true);

  useEffect(() => {
    if (!wanted) return;
    const stopping = new AbortController();
    const url = `/api/sittings/${sittingId}/move?version=${versionId}&look=${run}`;
    const set = (next: PreviewState) => {
      if (!stopping.signal.aborted) setState(next);
    };
    readPreview(url, stopping.signal, (done, of) => set({ kind: 'running', done, of })).then(
      (preview) => set({ kind: 'ready', preview }),
      (error: unknown) => set(failureOf(error)),
    );
    return () => stopping.abort();
  }, [sittingId, versionId, run, wanted]);

  return {
    state,
    stop: () => {
      setWanted(false);
      setState({ kind: 'stopped' });
    },
    again: () => {
      setState(STARTING);
      setWanted(true);
      setRun((before) => before + 1);
    },
  };
}

function failureOf(error: unknown): PreviewState {
  if (error instanceof PreviewFailure) {
    return { kind: 'failed', message: error.message, signedOut: error.signedOut };
  }
  return { kind: 'failed', message: 'The network went away before the preview was whole.', signedOut: false };
}
