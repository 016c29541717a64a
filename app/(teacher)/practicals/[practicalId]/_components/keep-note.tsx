'use client';

import { LocalTime } from '@/components/ui/local-time';
import type { KeepState } from './draft-keeper';

/** Where what is typed stands. */
export function KeepNote({ keep }: { keep: KeepState }) {
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
      {keep.kind === 'stale' ? 'changed in another place' : null}
    </p>
  );
}
