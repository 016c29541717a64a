'use client';

import Link from 'next/link';
import { useEffect, useState } from 'react';
import type { RoundBundle } from '@/lib/contracts/rounds';
import { BenchSession } from '@/lib/sync/client/bench-session';
import { askForLastingStorage } from '@/lib/sync/client/browser-world';
import { DeviceRound } from '@/lib/sync/client/device-round';
import { type Lock, parseLock } from '@/lib/sync/client/pin';
import { PracticeRound } from '@/lib/sync/client/practice-round';
import type { RoundStore } from '@/lib/sync/client/round-store';
import { BenchScreen } from './bench-screen';

interface BenchProps {
  personId: string;
  /** The sitting to record, or a round that is made up for practice. */
  round: { sittingId: string } | { practice: RoundBundle; leaveTo: string };
}

type Opened =
  | { state: 'opening' }
  | { state: 'open'; session: BenchSession; lock: Lock }
  | { state: 'shut'; why: 'sign-in' | 'not-found' | 'offline' | 'no-store' };

/** Opens the round from the server or, without a network, as this device has it, and puts the bench before you. */
export function Bench({ personId, round }: BenchProps) {
  const [opened, setOpened] = useState<Opened>({ state: 'opening' });
  const sittingId = 'sittingId' in round ? round.sittingId : null;
  const practice = 'practice' in round ? round.practice : null;

  useEffect(() => {
    const store: RoundStore | null = practice
      ? new PracticeRound(practice)
      : sittingId === null
        ? null
        : new DeviceRound(sittingId, personId);
    if (!store) return;
    let session: BenchSession | null = null;
    let left = false;
    openRound(store, personId)
      .then((next) => {
        if (next.state === 'open') session = next.session;
        if (left) session?.close();
        else setOpened(next);
      })
      .catch(() => {
        if (!left) setOpened({ state: 'shut', why: 'no-store' });
      });
    if (!practice) void askForLastingStorage();
    return () => {
      left = true;
      session?.close();
      store.close();
    };
  }, [sittingId, practice, personId]);

  if (opened.state === 'opening') return <Opening />;
  if (opened.state === 'shut') return <Shut why={opened.why} />;
  return (
    <BenchScreen
      session={opened.session}
      lock={opened.lock}
      practice={practice !== null}
      leaveTo={'leaveTo' in round ? round.leaveTo : '/round'}
    />
  );
}

async function openRound(store: RoundStore, personId: string): Promise<Opened> {
  const loaded = await store.load();
  if (!loaded.ok) return { state: 'shut', why: loaded.why };
  const lock = parseLock(await store.readLock());
  return { state: 'open', session: new BenchSession(store, loaded.round, personId), lock };
}

function Opening() {
  return (
    <main className="p-bench">
      <p role="status" className="text-lead text-ink-2">
        Opening the round…
      </p>
    </main>
  );
}

const REASONS = {
  'sign-in': {
    title: 'Sign in to go on',
    text: 'Your sign-in has run out. What you recorded is still on this tablet and is sent once you are back.',
    link: { href: '/sign-in', label: 'sign in' },
  },
  'not-found': {
    title: 'No such round',
    text: 'There is nothing here, or it is not yours to record.',
    link: { href: '/round', label: 'your rounds' },
  },
  offline: {
    title: 'No network, and this round is not on this tablet yet',
    text: 'A round that was opened here once can be opened again without a network. Find one and open it again.',
    link: { href: '/round', label: 'your rounds' },
  },
  'no-store': {
    title: 'This browser cannot keep readings',
    text: 'It does not let the page store anything, as in a private window. Open the round in an ordinary window.',
    link: { href: '/round', label: 'your rounds' },
  },
} as const;

function Shut({ why }: { why: keyof typeof REASONS }) {
  const { title, text, link } = REASONS[why];
  return (
    <main className="mx-auto max-w-2xl p-6">
      <h1 className="border-b-edge border-ink pb-2 font-title text-title">{title}</h1>
      <p className="mt-4 text-lead">{text}</p>
      <p className="mt-4">
        <Link href={link.href} className="link text-lead">
          {link.label}
        </Link>
      </p>
    </main>
  );
}
