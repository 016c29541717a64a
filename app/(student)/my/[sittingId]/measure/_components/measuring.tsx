'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useEffectEvent, useState } from 'react';
import { TaskHead } from '@/app/(student)/my/_components/task-head';
import { Refusal } from '@/components/ui/refusal';
import type { OwnTaskView } from '@/lib/data/own/read-task';
import { askForLastingStorage } from '@/lib/sync/client/browser-world';
import { OwnSession } from '@/lib/sync/client/own-session';
import { OwnStore } from '@/lib/sync/client/own-store';
import { MeasureSheet } from './measure-sheet';

type Opened = { state: 'opening' } | { state: 'open'; session: OwnSession } | { state: 'no-store' };

/** Opens the student's own record: what the server has and what this device has kept of it. */
export function Measuring({ task }: { task: OwnTaskView }) {
  const { sittingId, attemptId, studentId } = task;
  const [opened, setOpened] = useState<Opened>({ state: 'opening' });
  const serverEvents = useEffectEvent(() => task.events);

  useEffect(() => {
    const of = { sittingId, attemptId, personId: studentId };
    const store = new OwnStore(of);
    let session: OwnSession | null = null;
    let left = false;
    store.load().then(
      (events) => {
        if (left) return;
        session = new OwnSession(of, store, serverEvents());
        session.take(events);
        setOpened({ state: 'open', session });
      },
      () => left || setOpened({ state: 'no-store' }),
    );
    void askForLastingStorage();
    return () => {
      left = true;
      session?.close();
      store.close();
    };
  }, [sittingId, attemptId, studentId]);

  const session = opened.state === 'open' ? opened.session : null;
  useEffect(() => session?.take(task.events), [session, task.events]);
  useRefreshWhenShown();

  if (session) return <MeasureSheet session={session} task={task} />;
  return (
    <>
      <TaskHead {...task} title={task.task.title} />
      {opened.state === 'opening' ? (
        <p role="status" className="mt-4 text-lead text-ink-2">
          Opening your readings…
        </p>
      ) : (
        <Refusal title="This browser cannot keep readings" className="mt-4">
          It does not let the page store anything, as in a private window. Open it in an ordinary window. What
          you have recorded elsewhere is not lost.
        </Refusal>
      )}
    </>
  );
}

/** Another device, or the teacher who reopens a lock, may have changed what the server knows. */
function useRefreshWhenShown() {
  const router = useRouter();
  useEffect(() => {
    const refresh = () => document.visibilityState === 'visible' && navigator.onLine && router.refresh();
    document.addEventListener('visibilitychange', refresh);
    return () => document.removeEventListener('visibilitychange', refresh);
  }, [router]);
}
