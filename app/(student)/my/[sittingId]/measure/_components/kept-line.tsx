'use client';

import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Refusal } from '@/components/ui/refusal';
import type { OwnSession, OwnView } from '@/lib/sync/client/own-session';

/** How many entries are kept, how many of them the server has, and what holds up the rest. */
export function KeptLine({ view }: { view: OwnView }) {
  return (
    <p className="tnum mt-2 flex gap-2 text-label" role="status">
      <span>
        kept <strong data-testid="kept">{view.kept}</strong>
      </span>
      <span>
        sent <strong data-testid="sent">{Math.max(0, view.kept - view.unsent)}</strong>
      </span>
      <span className="text-ink-2">{wordsFor(view)}</span>
    </p>
  );
}

/** What could not be written down, and what the server would not take. */
export function KeptTrouble({ view, session }: { view: OwnView; session: OwnSession }) {
  const { failure } = view;
  return (
    <>
      {failure ? <Refusal title={failure} className="mt-2" /> : null}
      <NotTaken view={view} session={session} />
    </>
  );
}

function wordsFor({ kept, unsent, sending, parked }: OwnView) {
  if (unsent <= parked.length) return kept === 0 ? '' : 'all sent';
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
