'use client';

import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Refusal } from '@/components/ui/refusal';
import type { OwnSession, OwnView } from '@/lib/sync/client/own-session';

/** How many entries this device has kept and the server has, and what stands in the way. */
export function KeptLine({ view, session }: { view: OwnView; session: OwnSession }) {
  const { counts, failure } = view;
  return (
    <>
      <p className="tnum flex gap-3 text-label" role="status">
        <span>
          kept <strong data-testid="kept">{counts.kept}</strong>
        </span>
        <span>
          sent <strong data-testid="sent">{counts.sent}</strong>
        </span>
        <span className="text-ink-2">{wordsFor(view)}</span>
      </p>
      {failure ? <Refusal title={failure} className="mt-2" /> : null}
      <NotTaken view={view} session={session} />
    </>
  );
}

function wordsFor({ counts, sending, parked }: OwnView) {
  if (counts.kept - parked.length <= counts.sent) return counts.kept === 0 ? '' : 'all sent';
  if (sending.state === 'halted') {
    return sending.why === 'sign-in' ? (
      <Link href="/sign-in" className="link">
        sign in to send
      </Link>
    ) : (
      sending.message
    );
  }
  return sending.state === 'waiting' ? 'no network, sent later' : 'sending';
}

function NotTaken({ view, session }: { view: OwnView; session: OwnSession }) {
  const [first] = view.parked;
  if (!first) return null;
  const lock = view.parked.find(({ event }) => event.value.kind === 'lock');
  const title = lock
    ? 'Your lock was not taken'
    : view.parked.length === 1
      ? 'One entry was not taken'
      : `${view.parked.length} entries were not taken`;
  return (
    <Refusal
      title={title}
      className="mt-2"
      action={
        <Button size="small" onClick={() => void session.dropParked()}>
          clear this
        </Button>
      }
    >
      {(lock ?? first).reason}{' '}
      {lock ? 'Your readings are all kept.' : 'It does not count. Enter it again if it should.'}
    </Refusal>
  );
}
