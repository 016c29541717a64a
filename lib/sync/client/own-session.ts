import {
  LOCK_CELL,
  makeOwnEvent,
  type OwnEvent,
  type OwnRecord,
  type OwnSource,
  ownRecordOf,
} from '@/lib/practicals/own-record';
import type { Mint } from '@/lib/round/types';
import type { Cell, CellValue } from '../cells';
import { receiptOf } from '../receipt';
import type { OutboxState } from './outbox';
import type { OwnAttempt, OwnStore } from './own-store';
import type { Parked } from './round-store';

/** Everything the measuring screen shows of the record, replaced as a whole on every change. */
export interface OwnView {
  record: OwnRecord;
  /** Entries known to be on a disk, here or at the server; and those of them that have not arrived. */
  kept: number;
  unsent: number;
  sending: OutboxState;
  parked: readonly Parked[];
  /** What this device could not write down. */
  failure: string | null;
}

export interface OwnEntry {
  cell: Cell;
  value: CellValue;
  source?: OwnSource;
}

/** What a session needs of the store. */
export type OwnShelf = Pick<
  OwnStore,
  'keep' | 'dropParked' | 'onEvents' | 'onUnsent' | 'onSending' | 'onParked'
>;

const browserMint: Mint = { id: () => crypto.randomUUID(), now: () => new Date().toISOString() };

/**
 * A student's own record on one page. What is entered is written to the device's store first and shown once it is on
 * the disk, in the order in which it was entered.
 */
export class OwnSession {
  view: OwnView;
  private events: ReadonlyMap<string, OwnEvent>;
  private refused: ReadonlySet<string> = new Set();
  private queue: Promise<unknown> = Promise.resolve();
  private readonly listeners = new Set<() => void>();
  private readonly closers: (() => void)[];

  constructor(
    private readonly of: OwnAttempt,
    private readonly store: OwnShelf,
    events: readonly OwnEvent[],
    private readonly mint: Mint = browserMint,
  ) {
    this.events = byId(events);
    this.view = {
      record: ownRecordOf(events),
      kept: events.length,
      unsent: 0,
      sending: { state: 'idle' },
      parked: [],
      failure: null,
    };
    this.closers = [
      store.onEvents((more) => this.take(more)),
      store.onUnsent((unsent) => this.change({ unsent })),
      store.onSending((sending) => this.change({ sending })),
      store.onParked((parked) => this.park(parked)),
    ];
  }

  getView = (): OwnView => this.view;

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Events known from elsewhere: the server, or another page. */
  take(events: readonly OwnEvent[]): void {
    const fresh = events.filter(({ id }) => !this.events.has(id));
    if (fresh.length > 0) this.replace(new Map([...this.events, ...byId(fresh)]));
  }

  /** True once the entries are on the disk. */
  enter(entries: readonly OwnEntry[]): Promise<boolean> {
    return this.inTurn(() => this.keep(entries));
  }

  /** Locks the record as it stands by then, under the receipt of exactly those readings. */
  lock(): Promise<boolean> {
    return this.inTurn(async () => {
      const receipt = await receiptOf(this.of.attemptId, this.standing());
      return this.keep([{ cell: LOCK_CELL, value: { kind: 'lock', locked: true, receipt } }]);
    });
  }

  dropParked = (): Promise<void> => this.store.dropParked(this.view.parked.map(({ id }) => id));

  close(): void {
    for (const close of this.closers) close();
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const next = this.queue.then(work, work);
    this.queue = next;
    return next;
  }

  private async keep(entries: readonly OwnEntry[]): Promise<boolean> {
    const made = entries.map((entry) => makeOwnEvent(this.view.record, this.mint, this.of, entry));
    try {
      await this.store.keep(made);
    } catch (error) {
      const reason = error instanceof Error ? error.name : 'unknown';
      this.change({
        failure: `That was not kept: this device could not write (${reason}). Everything before is kept. Free some space and enter it again.`,
      });
      return false;
    }
    this.take(made);
    this.change({ failure: null });
    return true;
  }

  /** What the server refused no longer counts as recorded. */
  private park(parked: readonly Parked[]): void {
    const same = parked.length === this.refused.size && parked.every(({ id }) => this.refused.has(id));
    if (same) return;
    const known = new Map([...this.events, ...byId(parked.map(({ event }) => event))]);
    this.refused = new Set(parked.map(({ id }) => id));
    const gone = this.view.parked.filter(({ id }) => !this.refused.has(id));
    for (const { id } of gone) known.delete(id);
    this.change({ parked });
    this.replace(known);
  }

  private standing(): OwnEvent[] {
    return [...this.events.values()].filter(({ id }) => !this.refused.has(id));
  }

  private replace(events: ReadonlyMap<string, OwnEvent>): void {
    this.events = events;
    this.change({ record: ownRecordOf(this.standing()), kept: events.size });
  }

  private change(change: Partial<OwnView>): void {
    this.view = { ...this.view, ...change };
    for (const listener of this.listeners) listener();
  }
}

function byId(events: readonly OwnEvent[]): Map<string, OwnEvent> {
  return new Map(events.map((event) => [event.id, event]));
}
