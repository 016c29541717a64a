'use client';

import { useRouter } from 'next/navigation';
import { useState, useTransition } from 'react';
import type { DraftReply } from '../actions';
import type { DraftDesk } from './use-draft';

const NO_ANSWER = 'The server does not answer. Nothing was changed; try again in a moment.';
const NOT_KEPT = 'What is typed here could not be kept yet, so nothing was changed. Try again in a moment.';

/** A press that gives the draft another content: what is typed is kept first, what comes back lies on the desk. */
export function useDraftPress(desk: DraftDesk, press: (revision: number) => Promise<DraftReply>) {
  const router = useRouter();
  const [pending, start] = useTransition();
  const [refused, setRefused] = useState<string | null>(null);

  function run(onDone: () => void) {
    start(async () => {
      setRefused(null);
      const revision = await desk.keepNow();
      if (revision === null) return setRefused(NOT_KEPT);
      const reply = await press(revision).catch(() => null);
      if (reply?.kind !== 'done') return setRefused(reply?.message ?? NO_ANSWER);
      desk.takeThere(reply.draft);
      router.refresh();
      onDone();
    });
  }

  return { run, pending, refused };
}
