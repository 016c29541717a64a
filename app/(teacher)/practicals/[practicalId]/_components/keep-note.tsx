'use client';

import { Button } from '@/components/ui/button';
import { LocalTime } from '@/components/ui/local-time';
import type { KeepState } from './draft-keeper';

/** Where what is typed stands; `onChoose` leads back to the choice between two drafts. */
export function KeepNote({ keep, onChoose }: { keep: KeepState; onChoose(): void }) {
  return (
    <p role="status" className="mr-2 max-w-[40ch] text-label text-ink-2">
      {keep.kind === 'kept' ? (
        <>
          kept <LocalTime at={keep.at} />
        </>
      ) : null}
      {keep.kind === 'keeping' ? 'keeping …' : null}
      {keep.kind === 'waiting' ? `not kept yet. ${keep.message} ` : null}
      {keep.kind === 'waiting' && keep.signIn ? (
        <a href="/sign-in" target="_blank" rel="noreferrer" className="link">
          sign in in another tab
        </a>
      ) : null}
      {keep.kind === 'stale' ? (
        <>
          not kept: changed in another place{' '}
          <Button kind="quiet" size="small" className="px-1" onClick={onChoose}>
            choose a draft
          </Button>
        </>
      ) : null}
    </p>
  );
}
