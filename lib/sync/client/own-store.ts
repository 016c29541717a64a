import { liveQuery } from 'dexie';
import type { OwnEvent } from '@/lib/practicals/own-record';
import { browserWorld } from './browser-world';
import type { DeviceStore, OutboxRow, ReadingRow } from './device-store';
import { deviceStore } from './device-store';
import { keepOnDevice } from './keep-on-device';
import { Outbox, type OutboxState, type OutboxWorld } from './outbox';
import type { Parked } from './round-store';
import { benchEvent } from './stored-round';

const CHANNEL = 'trymark-own';

/** Whose readings of which attempt are kept here. */
export interface OwnAttempt {
  sittingId: string;
  attemptId: string;
  personId: string;
}

/** A student's own readings of one attempt in this device's store, sent on by that student's outbox. */
export class OwnStore {
  private readonly outbox: Outbox;
  private readonly channel = new BroadcastChannel(CHANNEL);
  private readonly closers: (() => void)[] = [];
  private readonly eventListeners = new Set<(events: OwnEvent[]) => void>();

  constructor(
    private readonly of: OwnAttempt,
    private readonly store: DeviceStore = deviceStore(),
    world: OutboxWorld = browserWorld(),
  ) {
    this.outbox = new Outbox(store, of.personId, world);
    this.channel.onmessage = ({ data }: MessageEvent<string[]>) => void this.takeOver(data);
    const nudge = () => void this.outbox.nudge();
    const whenShown = () => document.visibilityState === 'visible' && nudge();
    window.addEventListener('online', nudge);
    document.addEventListener('visibilitychange', whenShown);
    this.closers.push(
      () => window.removeEventListener('online', nudge),
      () => document.removeEventListener('visibilitychange', whenShown),
    );
  }

  /** What this device knows of the attempt and the server has not refused. */
  async load(): Promise<OwnEvent[]> {
    void this.outbox.nudge();
    const [sent, unsent] = [await this.sentRows(), await this.unsentRows()];
    return [...sent, ...unsent.filter(({ state }) => state === 'waiting')].map(benchEvent);
  }

  /** Resolves when the events are on the disk; rejects when none of them could be written. */
  async keep(events: readonly OwnEvent[]): Promise<void> {
    const drafts = events.map((event) => ({ ...event, supersedes: [...event.supersedes] }));
    await keepOnDevice(this.store, this.of.sittingId, drafts);
    this.channel.postMessage(events.map(({ id }) => id));
    void this.outbox.nudge();
  }

  onEvents(listener: (events: OwnEvent[]) => void): () => void {
    this.eventListeners.add(listener);
    return () => this.eventListeners.delete(listener);
  }

  /** How many entries wait here for the server, those that it refused among them. */
  onUnsent(listener: (count: number) => void): () => void {
    return this.live(async () => (await this.unsentRows()).length, listener);
  }

  /** What the server would not take, each with its reason. */
  onParked(listener: (parked: Parked[]) => void): () => void {
    return this.live(async () => {
      const refused = (await this.unsentRows()).filter(({ state }) => state === 'refused');
      return refused.map((row) => ({ id: row.id, reason: row.reason ?? '', event: benchEvent(row) }));
    }, listener);
  }

  onSending(listener: (state: OutboxState) => void): () => void {
    listener(this.outbox.current);
    return this.outbox.subscribe(listener);
  }

  async dropParked(ids: readonly string[]): Promise<void> {
    await this.store.outbox.bulkDelete([...ids]);
  }

  close(): void {
    for (const close of this.closers) close();
    this.outbox.stop();
    this.channel.close();
  }

  private sentRows(): Promise<ReadingRow[]> {
    return this.ofAttempt(this.store.readings.where({ sittingId: this.of.sittingId }).toArray());
  }

  private unsentRows(): Promise<OutboxRow[]> {
    return this.ofAttempt(this.store.outbox.where({ sittingId: this.of.sittingId }).toArray());
  }

  /** A shared tablet holds other students' readings too: they are not this student's to see. */
  private async ofAttempt<Row extends ReadingRow | OutboxRow>(rows: PromiseLike<Row[]>): Promise<Row[]> {
    const { attemptId } = this.of;
    return (await rows).filter(({ event }) => event.side === 'own' && event.attemptId === attemptId);
  }

  /** Readings that another page of this browser has kept. */
  private async takeOver(ids: string[]): Promise<void> {
    const rows = await this.ofAttempt(
      this.store.outbox.bulkGet(ids).then((found) => found.flatMap((row) => row ?? [])),
    );
    if (rows.length > 0) for (const listener of this.eventListeners) listener(rows.map(benchEvent));
  }

  private live<T>(query: () => Promise<T>, listener: (value: T) => void): () => void {
    const subscription = liveQuery(query).subscribe({ next: listener, error: () => {} });
    return () => subscription.unsubscribe();
  }
}
