'use client';

import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';

const ASK_AGAIN_MS = 3_000;

type Health = 'unknown' | 'up' | 'down';

async function askHealth(): Promise<Health> {
  try {
    return (await fetch('/api/health', { cache: 'no-store' })).ok ? 'up' : 'down';
  } catch {
    return 'down';
  }
}

/** Watches whether the station answers while it does not; opens the page again by itself once it does. */
function useHealth(onBack: () => void): Health {
  const [health, setHealth] = useState<Health>('unknown');
  useEffect(() => {
    let stopped = false;
    let wasDown = false;
    let timer: ReturnType<typeof setTimeout>;
    async function look() {
      const found = await askHealth();
      if (stopped) return;
      setHealth(found);
      if (found === 'up') {
        if (wasDown) onBack();
        return;
      }
      wasDown = true;
      timer = setTimeout(look, ASK_AGAIN_MS);
    }
    void look();
    return () => {
      stopped = true;
      clearTimeout(timer);
    };
  }, [onBack]);
  return health;
}

const reload = () => window.location.reload();

/** What a page says when it could not be made: the database is away, or something broke. */
export function OutOfOrder({ reference, onRetry }: { reference: string | undefined; onRetry: () => void }) {
  const health = useHealth(reload);
  const away = health === 'down';
  return (
    <main className="mx-auto flex min-h-dvh max-w-[44rem] flex-col justify-center px-4 py-12">
      <div role="alert" className="border-t-edge border-ink pt-4">
        <h1 className="font-title text-title">
          {away ? 'The station does not answer' : 'This page broke off'}
        </h1>
        <p className="mt-4 max-w-[60ch] text-lead">
          {away
            ? 'Its database or the network is away. Nothing that was kept is lost; readings on this device stay here. This page opens by itself when the station is back.'
            : 'Something went wrong while it was being made. Nothing that was kept is lost. Try again; if it happens twice, tell your admin the reference below.'}
        </p>
        <p className="mt-6">
          <Button kind="act" onClick={onRetry}>
            try again
          </Button>
        </p>
        {reference ? <p className="mt-6 text-label text-ink-2">reference {reference}</p> : null}
      </div>
    </main>
  );
}
