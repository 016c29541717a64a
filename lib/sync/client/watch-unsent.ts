import { liveQuery } from 'dexie';
import type { DeviceStore } from './device-store';

export interface UnsentCount {
  waiting: number;
  refused: number;
  /** Made by other people on this device: only their own sign-in sends them. */
  others: number;
}

/** Counts what has not arrived, now and whenever it changes; stops when the function given back is called. */
export function watchUnsent(
  store: DeviceStore,
  personId: string,
  listener: (count: UnsentCount) => void,
): () => void {
  const subscription = liveQuery(async () => {
    const rows = await store.outbox.toArray();
    const own = rows.filter(({ authorId }) => authorId === personId);
    const waiting = own.filter(({ state }) => state === 'waiting').length;
    return { waiting, refused: own.length - waiting, others: rows.length - own.length };
  }).subscribe({ next: listener, error: () => {} });
  return () => subscription.unsubscribe();
}
