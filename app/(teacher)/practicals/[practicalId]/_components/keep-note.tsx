'use client';

import { LocalTime } from '@/app/(teacher)/practicals/_components/local-time';
import type { KeepState } from './draft-keeper';

/** Where what is typed stands. */
export function KeepNote({ keep }: { keep: KeepState }) {
  return (
    <span role="status">
      {keep.kind === 'kept' ? (
        <>
          kept <LocalTime at={keep.at} />
        </>
      ) : null}
      {keep.kind === 'keeping' ? 'keeping …' : null}
      {keep.kind === 'waiting' ? `not kept yet. ${keep.message}` : null}
      {keep.kind === 'stale' ? 'changed in another place' : null}
    </span>
  );
}
