import { MAX_BATCH, PROTOCOL_VERSION, type PushAnswer } from '../protocol';
import type { DeviceStore, OutboxRow } from './device-store';
import type { PostEvents, PostReply } from './post-events';
import { waitAfter } from './waits';

export type OutboxState =
  | { state: 'idle' }
  | { state: 'sending' }
  | { state: 'waiting'; message: string }
  | { state: 'halted'; why: 'sign-in' | 'reload' | 'refused'; message: string };

/** What the outbox needs of the world, so that tests can stand in for it. */
export interface OutboxWorld {
  post: PostEvents;
  /** Runs the work unless another page of this browser is at it. */
  alone(work: () => Promise<void>): Promise<void>;
  after(milliseconds: number, work: () => void): () => void;
  random(): number;
}

/** A halt is tried again, seldom: the person may have signed in on another page meanwhile. */
const AFTER_HALT_MS = 30_000;

/**
 * Sends what one person has recorded on this device, oldest first, one batch at a time. An event leaves the outbox
 * only when an answer names it; whatever else happens it stays and is sent again.
 */
export class Outbox {
  private failures = 0;
  private cancelTimer: (() => void) | null = null;
  private running: Promise<void> | null = null;
  private again = false;
  private stopped = false;
  /** Sittings that the server does not take from this person now, with what it said; the others go on. */
  private readonly barred = new Map<string, string>();
  private readonly listeners = new Set<(state: OutboxState) => void>();
  current: OutboxState = { state: 'idle' };

  constructor(
    private readonly store: DeviceStore,
    private readonly personId: string,
    private readonly world: OutboxWorld,
  ) {}

  /** Sends now, or right after the batch that is under way. */
  nudge(): Promise<void> {
    if (this.stopped) return Promise.resolve();
    this.cancelTimer?.();
    this.cancelTimer = null;
    if (this.running) {
      this.again = true;
      return this.running;
    }
    this.running = this.drain().finally(() => {
      this.running = null;
      if (this.again && !this.stopped) void this.nudge();
    });
    return this.running;
  }

  stop(): void {
    this.stopped = true;
    this.cancelTimer?.();
  }

  subscribe(listener: (state: OutboxState) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  private async drain(): Promise<void> {
    let mine = false;
    await this.world.alone(async () => {
      mine = true;
      this.barred.clear();
      do {
        this.again = false;
        while (!this.stopped && (await this.sendBatch())) this.failures = 0;
      } while (this.again && this.current.state === 'idle' && !this.stopped);
    });
    if (!mine) this.retry(AFTER_HALT_MS);
  }

  /** One batch: true when it moved something on and more may follow. */
  private async sendBatch(): Promise<boolean> {
    const batch = await nextBatch(this.store, this.personId, this.barred);
    const [first] = batch;
    if (!first) return this.rest();
    this.tell({ state: 'sending' });
    const reply = await this.world.post(first.sittingId, {
      protocol: PROTOCOL_VERSION,
      deviceId: first.deviceId,
      events: batch.map((row) => row.event),
    });
    return this.settle(batch, reply);
  }

  private async settle(batch: OutboxRow[], reply: PostReply): Promise<boolean> {
    switch (reply.kind) {
      case 'answered':
        if ((await applyAnswer(this.store, batch, reply.answer)) > 0) return true;
        return this.wait('The server did not name any of these readings.', null);
      case 'later':
        return this.wait(reply.message, reply.retryAfterMs);
      case 'unreadable':
        return this.sendSingly(batch, reply.message);
      case 'halt':
        if (reply.why === 'refused' && batch[0]) {
          this.barred.set(batch[0].sittingId, reply.message);
          return true;
        }
        this.tell({ state: 'halted', why: reply.why, message: reply.message });
        this.retry(AFTER_HALT_MS);
        return false;
    }
  }

  /** The server could not read the batch: the event at fault is found, and parked, by sending them one by one. */
  private async sendSingly(batch: OutboxRow[], message: string): Promise<boolean> {
    const [only] = batch;
    if (batch.length === 1 && only) {
      await this.store.outbox.update(only.id, { state: 'refused', reason: message });
      return true;
    }
    for (const row of batch) {
      const { sittingId, deviceId, event } = row;
      const reply = await this.world.post(sittingId, {
        protocol: PROTOCOL_VERSION,
        deviceId,
        events: [event],
      });
      if (!(await this.settle([row], reply))) return false;
      if (this.barred.has(sittingId)) break;
    }
    return true;
  }

  /** Nothing more can be sent now: all has arrived, or what is left is for a sitting that is not taken. */
  private rest(): false {
    const [message] = this.barred.values();
    if (message === undefined) this.tell({ state: 'idle' });
    else {
      this.tell({ state: 'halted', why: 'refused', message });
      this.retry(AFTER_HALT_MS);
    }
    return false;
  }

  private wait(message: string, atLeastMs: number | null): false {
    this.failures += 1;
    this.tell({ state: 'waiting', message });
    this.retry(Math.max(atLeastMs ?? 0, waitAfter(this.failures, this.world.random)));
    return false;
  }

  private retry(milliseconds: number): void {
    if (this.stopped) return;
    this.cancelTimer?.();
    this.cancelTimer = this.world.after(milliseconds, () => void this.nudge());
  }

  private tell(state: OutboxState): void {
    this.current = state;
    for (const listener of this.listeners) listener(state);
  }
}

/** The oldest events of one sitting and device that wait, in the order they were made; none of a barred sitting. */
async function nextBatch(
  store: DeviceStore,
  personId: string,
  barred: ReadonlyMap<string, string>,
): Promise<OutboxRow[]> {
  const all = await store.outbox.where('[authorId+state]').equals([personId, 'waiting']).toArray();
  const waiting = all.filter(({ sittingId }) => !barred.has(sittingId));
  waiting.sort((a, b) => a.sequence - b.sequence);
  const [first] = waiting;
  return waiting
    .filter((row) => row.sittingId === first?.sittingId && row.deviceId === first.deviceId)
    .slice(0, MAX_BATCH);
}

/** Acts on what the answer says of the events that were in the batch; how many it named. */
async function applyAnswer(store: DeviceStore, batch: OutboxRow[], answer: PushAnswer): Promise<number> {
  const rows = new Map(batch.map((row) => [row.id, row]));
  const named = answer.answers.filter(({ id }) => rows.has(id));
  await store.transaction('rw', store.outbox, store.readings, async () => {
    for (const each of named) {
      const row = rows.get(each.id);
      if (!row) continue;
      if (each.outcome === 'refused') {
        await store.outbox.update(row.id, { state: 'refused', reason: each.reason });
        continue;
      }
      const { id, sittingId, deviceId, event, press, undoes } = row;
      await store.readings.put({ id, sittingId, mine: 1, event: { ...event, deviceId }, press, undoes });
      await store.outbox.delete(id);
    }
  });
  return named.length;
}
