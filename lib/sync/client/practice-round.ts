import type { RoundBundle } from '@/lib/contracts/rounds';
import type { BenchEvent } from '@/lib/round/types';
import type { Counts, LoadResult, RoundStore } from './round-store';
import type { TakenIn } from './unsent-file';

/** A round in this page's memory alone: nothing is stored, nothing sent, and all of it gone when the page is left. */
export class PracticeRound implements RoundStore {
  private kept = 0;
  private lock: unknown;
  private readonly countListeners = new Set<(counts: Counts) => void>();

  constructor(private readonly bundle: RoundBundle) {}

  async load(): Promise<LoadResult> {
    return {
      ok: true,
      round: { bundle: this.bundle, from: 'practice', events: [], presses: [], place: null },
    };
  }

  async keep(events: readonly BenchEvent[]): Promise<void> {
    this.kept += events.length;
    for (const listener of this.countListeners) listener({ kept: this.kept, sent: 0 });
  }

  onCounts(listener: (counts: Counts) => void): () => void {
    this.countListeners.add(listener);
    listener({ kept: this.kept, sent: 0 });
    return () => this.countListeners.delete(listener);
  }

  async readLock(): Promise<unknown> {
    return this.lock;
  }

  async writeLock(value: unknown): Promise<void> {
    this.lock = value;
  }

  async savePlace(): Promise<void> {}
  onEvents: RoundStore['onEvents'] = () => () => {};
  onParked: RoundStore['onParked'] = () => () => {};
  onSending: RoundStore['onSending'] = () => () => {};
  onInHand: RoundStore['onInHand'] = () => () => {};
  takeInHand(): void {}
  async retryParked(): Promise<void> {}
  async dropParked(): Promise<void> {}
  async unsentFile(): Promise<null> {
    return null;
  }
  async takeUnsentFile(): Promise<TakenIn> {
    return { ok: false, reason: 'A practice round takes nothing in.' };
  }
  close(): void {}
}
