import { browserWorld } from './browser-world';
import { deviceStore } from './device-store';
import { Outbox } from './outbox';

/** Sends what a person has unsent on this device while a page is open that is no bench; gives back how to stop. */
export function sendUnsent(personId: string): () => void {
  const outbox = new Outbox(deviceStore(), personId, browserWorld());
  const nudge = () => void outbox.nudge();
  nudge();
  window.addEventListener('online', nudge);
  return () => {
    window.removeEventListener('online', nudge);
    outbox.stop();
  };
}
