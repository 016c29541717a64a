import { liveQuery } from 'dexie';
import { z } from 'zod';
import type { InHandView, RoundBundle } from '@/lib/contracts/rounds';
import type { Place } from '@/lib/round/start-round';
import type { BenchEvent } from '@/lib/round/types';
import { browserWorld } from './browser-world';
import { readDeviceId } from './device-id';
import { type DeviceStore, deviceStore } from './device-store';
import { fetchInHand, fetchRound, postInHand } from './fetch-round';
import { keepOnDevice } from './keep-on-device';
import { Outbox, type OutboxState } from './outbox';
import type { Authors, Counts, EventListener, LoadResult, Parked, RoundStore } from './round-store';
import { benchEvent, readStoredBundle, readStoredEvents, storeBundle } from './stored-round';
import { type TakenIn, takeUnsentFile, writeUnsentFile } from './unsent-file';

const IN_HAND_EVERY_MS = 3_000;
const STILL_IN_HAND_MS = 20_000;
const CHANNEL = 'trymark-bench';

const placeSchema = z.object({
  attemptId: z.string(),
  spot: z
    .object({ lineId: z.string(), ordinal: z.number(), axis: z.enum(['thickness', 'width', 'length']) })
    .nullable(),
  order: z.enum(['piece', 'line']),
  skipped: z.array(z.string()),
});

/** A round kept in this device's store, sent on by its person's outbox, and refreshed from the server. */
export class DeviceRound implements RoundStore {
  private readonly outbox: Outbox;
  private readonly channel: BroadcastChannel;
  private readonly closers: (() => void)[] = [];
  private readonly eventListeners = new Set<EventListener>();
  private readonly inHandListeners = new Set<(view: InHandView) => void>();
  private attemptInHand: string | null = null;
  private saidAt = 0;
  private benchEvents = 0;
  private refreshing = false;
  private asking = false;

  constructor(
    private readonly sittingId: string,
    private readonly personId: string,
    private readonly store: DeviceStore = deviceStore(),
  ) {
    this.outbox = new Outbox(store, personId, browserWorld());
    this.channel = new BroadcastChannel(CHANNEL);
    this.channel.onmessage = ({ data }: MessageEvent<{ sittingId: string; ids: string[] }>) => {
      if (data.sittingId === this.sittingId) void this.takeOver(data.ids);
    };
    const nudge = () => void this.outbox.nudge();
    const whenShown = () => document.visibilityState === 'visible' && nudge();
    window.addEventListener('online', nudge);
    document.addEventListener('visibilitychange', whenShown);
    const timer = setInterval(() => void this.askInHand(), IN_HAND_EVERY_MS);
    this.closers.push(
      () => window.removeEventListener('online', nudge),
      () => document.removeEventListener('visibilitychange', whenShown),
      () => clearInterval(timer),
    );
  }

  async load(): Promise<LoadResult> {
    const { store, personId, sittingId } = this;
    const before = await readStoredBundle(store, personId, sittingId);
    const fetched = await fetchRound(sittingId, before !== null);
    if (fetched.ok) {
      await storeBundle(store, personId, fetched.value);
      this.benchEvents = fetched.value.inHand.benchEvents;
    }
    const bundle = fetched.ok ? await this.withoutOwnHand(fetched.value) : before;
    if (!bundle || (!fetched.ok && fetched.why === 'not-found')) {
      return { ok: false, why: fetched.ok ? 'not-found' : fetched.why };
    }
    void this.outbox.nudge();
    const stored = await readStoredEvents(store, personId, sittingId);
    const place = placeSchema.safeParse((await store.meta.get(this.placeKey))?.value).data ?? null;
    return { ok: true, round: { bundle, from: fetched.ok ? 'network' : 'device', place, ...stored } };
  }

  async keep(events: readonly BenchEvent[], press: string | null, undoes: string | null): Promise<void> {
    const drafts = events.map((event) => ({ ...event, supersedes: [...event.supersedes] }));
    await keepOnDevice(this.store, this.sittingId, drafts, { press, undoes });
    this.channel.postMessage({ sittingId: this.sittingId, ids: events.map(({ id }) => id) });
    void this.outbox.nudge();
  }

  async savePlace(place: Place): Promise<void> {
    await this.store.meta.put({ key: this.placeKey, value: { ...place, skipped: [...place.skipped] } });
  }

  onEvents(listener: EventListener): () => void {
    this.eventListeners.add(listener);
    return () => this.eventListeners.delete(listener);
  }

  onCounts(listener: (counts: Counts) => void): () => void {
    const { store, sittingId, personId } = this;
    return this.live(async () => {
      const waiting = await store.outbox
        .where({ sittingId })
        .filter((row) => row.authorId === personId)
        .count();
      const sent = await store.readings.where({ sittingId, mine: 1 }).count();
      return { kept: waiting + sent, sent };
    }, listener);
  }

  onParked(listener: (parked: Parked[]) => void): () => void {
    const { store, sittingId } = this;
    return this.live(async () => {
      const rows = await store.outbox.where({ sittingId }).toArray();
      return rows
        .filter(({ state }) => state === 'refused')
        .map((row) => ({ id: row.id, reason: row.reason ?? '', event: benchEvent(row) }));
    }, listener);
  }

  onSending(listener: (state: OutboxState) => void): () => void {
    listener(this.outbox.current);
    return this.outbox.subscribe(listener);
  }

  onInHand(listener: (view: InHandView) => void): () => void {
    this.inHandListeners.add(listener);
    return () => this.inHandListeners.delete(listener);
  }

  takeInHand(attemptId: string | null): void {
    if (attemptId === this.attemptInHand) return;
    this.attemptInHand = attemptId;
    void this.sayInHand();
  }

  async retryParked(): Promise<void> {
    const { store, sittingId } = this;
    const refused = (await store.outbox.where({ sittingId }).toArray()).filter(
      ({ state }) => state === 'refused',
    );
    await store.outbox.bulkPut(refused.map((row) => ({ ...row, state: 'waiting' as const, reason: null })));
    this.tellEvents(refused.map(benchEvent));
    await this.outbox.nudge();
  }

  async dropParked(ids: readonly string[]): Promise<void> {
    await this.store.outbox.bulkDelete([...ids]);
  }

  unsentFile(): Promise<string> {
    return writeUnsentFile(this.store, new Date().toISOString());
  }

  async takeUnsentFile(text: string): Promise<TakenIn> {
    const taken = await takeUnsentFile(this.store, text, this.personId);
    if (taken.ok && taken.taken > 0) {
      const { events } = await readStoredEvents(this.store, this.personId, this.sittingId);
      this.tellEvents(events);
      void this.outbox.nudge();
    }
    return taken;
  }

  async readLock(): Promise<unknown> {
    return (await this.store.meta.get(`lock/${this.personId}`))?.value;
  }

  async writeLock(value: unknown): Promise<void> {
    await this.store.meta.put({ key: `lock/${this.personId}`, value });
  }

  close(): void {
    for (const close of this.closers) close();
    this.outbox.stop();
    this.channel.close();
    void postInHandQuietly(this.store, this.sittingId);
  }

  /** What this device said of itself before a reload is no news to it. */
  private async withoutOwnHand(bundle: RoundBundle): Promise<RoundBundle> {
    const own = await readDeviceId(this.store);
    const others = bundle.inHand.others.filter(({ deviceId }) => deviceId !== own);
    return { ...bundle, inHand: { ...bundle.inHand, others } };
  }

  private get placeKey(): string {
    return `place/${this.personId}/${this.sittingId}`;
  }

  private live<T>(query: () => Promise<T>, listener: (value: T) => void): () => void {
    const subscription = liveQuery(query).subscribe({ next: listener, error: () => {} });
    return () => subscription.unsubscribe();
  }

  private tellEvents(events: BenchEvent[], authors: Authors = {}): void {
    if (events.length > 0) for (const listener of this.eventListeners) listener(events, authors);
  }

  /** Events that another page of this browser has kept. */
  private async takeOver(ids: string[]): Promise<void> {
    const rows = await this.store.outbox.bulkGet(ids);
    this.tellEvents(rows.flatMap((row) => (row ? [benchEvent(row)] : [])));
  }

  /** One question at a time: a slow network is not asked again before it has answered. */
  private async askInHand(): Promise<void> {
    if (this.asking || document.visibilityState !== 'visible') return;
    this.asking = true;
    try {
      if (this.attemptInHand && Date.now() - this.saidAt > STILL_IN_HAND_MS) return await this.sayInHand();
      const fetched = await fetchInHand(this.sittingId, await readDeviceId(this.store));
      if (fetched.ok) await this.heard(fetched.value);
    } finally {
      this.asking = false;
    }
  }

  private async sayInHand(): Promise<void> {
    this.saidAt = Date.now();
    const deviceId = await readDeviceId(this.store);
    const fetched = await postInHand(this.sittingId, deviceId, this.attemptInHand);
    if (fetched.ok) await this.heard(fetched.value);
  }

  private async heard(view: InHandView): Promise<void> {
    for (const listener of this.inHandListeners) listener(view);
    if (this.outbox.current.state !== 'idle') void this.outbox.nudge();
    if (view.benchEvents !== this.benchEvents) await this.refresh(view.benchEvents);
  }

  /** The server knows of events that may not be known here: fetched once, however often it is noticed. */
  private async refresh(benchEvents: number): Promise<void> {
    if (this.refreshing) return;
    this.refreshing = true;
    try {
      const stored = await this.store.readings
        .where({ sittingId: this.sittingId })
        .filter(({ event }) => event.side === 'bench')
        .count();
      if (stored < benchEvents) {
        const fetched = await fetchRound(this.sittingId, true);
        if (!fetched.ok) return;
        await storeBundle(this.store, this.personId, fetched.value);
        this.tellEvents(
          fetched.value.events.map((event) => benchEvent({ event })),
          fetched.value.authors,
        );
      }
      this.benchEvents = benchEvents;
    } finally {
      this.refreshing = false;
    }
  }
}

/** Puts the pieces down when the page is left; if that does not arrive, the server lets go of them in time. */
async function postInHandQuietly(store: DeviceStore, sittingId: string): Promise<void> {
  await postInHand(sittingId, await readDeviceId(store), null);
}
