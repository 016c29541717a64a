'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useSyncExternalStore } from 'react';
import { TaskHead } from '@/app/(student)/my/_components/task-head';
import { EmptyState } from '@/components/ui/empty-state';
import type { OwnTaskView } from '@/lib/data/own/read-task';
import type { OwnSession } from '@/lib/sync/client/own-session';
import { KeptLine, KeptTrouble } from './kept-line';
import { LockedSheet } from './locked-sheet';
import { MeasureBoard } from './measure-board';

/** Measuring until the lock; after it the receipt and the predicted score. */
export function MeasureSheet({ session, task }: { session: OwnSession; task: OwnTaskView }) {
  const view = useSyncExternalStore(session.subscribe, session.getView, session.getView);
  const { lock } = view.record.derived;
  const prediction = task.prediction?.receipt === lock?.receipt ? task.prediction : null;
  const sent = view.unsent === 0;
  useRefreshWhen(lock !== null && sent && prediction === null);
  const over = task.stage === 'published' || task.stage === 'closed';
  if (!lock && !over) return <MeasureBoard session={session} view={view} task={task} />;
  return (
    <>
      <TaskHead {...task} stage={over ? task.stage : 'locked'} title={task.task.title} />
      <KeptLine view={view} />
      <KeptTrouble view={view} session={session} />
      {lock ? (
        <LockedSheet
          lock={lock}
          record={view.record}
          rubric={task.rubric}
          prediction={prediction}
          sent={sent}
          over={over}
        />
      ) : (
        <EmptyState title="Own readings are closed">
          The results are out, and you had not locked your readings by then. What you recorded is kept.
        </EmptyState>
      )}
    </>
  );
}

/** Asks the server once what it makes of a lock that has just reached it. */
function useRefreshWhen(isDue: boolean) {
  const router = useRouter();
  useEffect(() => {
    if (isDue && navigator.onLine) router.refresh();
  }, [isDue, router]);
}
