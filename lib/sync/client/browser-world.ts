import type { OutboxWorld } from './outbox';
import { postEvents } from './post-events';

const LOCK = 'trymark-outbox';

/** The outbox's world in a browser: one page at a time sends, by the browser's own lock. */
export function browserWorld(): OutboxWorld {
  return {
    post: postEvents,
    alone: (work) =>
      navigator.locks
        ? navigator.locks.request(LOCK, { ifAvailable: true }, async (lock) => {
            if (lock) await work();
          })
        : work(),
    after: (milliseconds, work) => {
      const timer = setTimeout(work, milliseconds);
      return () => clearTimeout(timer);
    },
    random: Math.random,
  };
}

/** Asks the browser not to clear this store when the disk runs short; it may say no, and the bench goes on. */
export async function askForLastingStorage(): Promise<boolean> {
  try {
    return (await navigator.storage?.persisted?.()) || ((await navigator.storage?.persist?.()) ?? false);
  } catch {
    return false;
  }
}
