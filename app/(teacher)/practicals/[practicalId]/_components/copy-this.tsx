'use client';

import { useState, useTransition } from 'react';
import { copyPracticalAction } from '@/app/(teacher)/practicals/actions';
import { Button } from '@/components/ui/button';
import { Refusal } from '@/components/ui/refusal';
import type { DraftDesk } from './use-draft';

const NOT_KEPT =
  'What you typed could not be kept, so nothing was copied. It is still here; try again in a moment.';

/** A practical of its own that begins as this one stands, with what was typed last. */
export function CopyThis({ practicalId, desk }: { practicalId: string; desk: DraftDesk }) {
  const [pending, start] = useTransition();
  const [refused, setRefused] = useState<string | null>(null);
  function copy() {
    start(async () => {
      if ((await desk.keepNow()) === null) return setRefused(NOT_KEPT);
      const fields = new FormData();
      fields.set('practicalId', practicalId);
      const reply = await copyPracticalAction(undefined, fields);
      setRefused(reply?.message ?? null);
    });
  }
  return (
    <div>
      <Button onClick={copy} disabled={pending} aria-busy={pending}>
        {pending ? 'copying …' : 'copy this practical'}
      </Button>
      <p className="mt-1 text-label text-ink-2">
        Cut list, prices and rules go along; this one and its sittings stay as they are.
      </p>
      {refused ? <Refusal title={refused} className="mt-2" /> : null}
    </div>
  );
}
