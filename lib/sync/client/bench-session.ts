import type { InHand, RoundBundle } from '@/lib/contracts/rounds';
import { act } from '@/lib/round/act';
import { withEvents, withoutEvents } from '@/lib/round/record-events';
import { placeOf, startRound } from '@/lib/round/start-round';
import type { Action, Mint, RoundState, Sound } from '@/lib/round/types';
import type { OutboxState } from './outbox';
import { pressesOf } from './presses-of';
import type { Authors, Counts, LoadedRound, Parked, RoundStore } from './round-store';
import type { TakenIn } from './unsent-file';

/** Everything the bench screen shows, replaced as a whole on every change. */
export interface BenchView {
  state: RoundState;
  counts: Counts;
  sending: OutboxState;
  parked: readonly Parked[];
  inHand: readonly InHand[];
  authors: Authors;
  /** Readings that this device could not write down. */
  failure: string | null;
}

const browserMint: Mint = { id: () => crypto.randomUUID(), now: () => new Date().toISOString() };

/**
 * One walk of a round on one page: presses change what the screen shows at once and are written to the store in
 * order; a press that cannot be written is taken off the screen again and said so.
 */
export class BenchSession {
  view: BenchView;
  readonly bundle: RoundBundle;
  readonly from: LoadedRound['from'];
  private readonly listeners = new Set<() => void>();
  private readonly soundListeners = new Set<(sound: Sound) => void>();
  private readonly closers: (() => void)[];
  private placeIsOld = false;
  private savingPlace = false;

  constructor(
    private readonly store: RoundStore,
    loaded: LoadedRound,
    personId: string,
    private readonly mint: Mint = browserMint,
  ) {
    const { bundle, events, presses, place } = loaded;
    this.bundle = bundle;
    this.from = loaded.from;
    const { rubric, students, may } = bundle;
    const plan = { rubric, students, personId, mayFinish: may.finish, maySettle: may.settle };
    const opened = startRound(plan, events, place, pressesOf(rubric, presses));
    const state = { ...opened, elsewhere: bundle.inHand.others.map(({ attemptId }) => attemptId) };
    this.view = {
      state,
      counts: { kept: 0, sent: 0 },
      sending: { state: 'idle' },
      parked: [],
      inHand: bundle.inHand.others,
      authors: bundle.authors,
      failure: null,
    };
    this.closers = [
      store.onEvents((more, authors) =>
        this.change({
          state: withEvents(this.view.state, more),
          authors: { ...this.view.authors, ...authors },
        }),
      ),
      store.onCounts((counts) => this.change({ counts })),
      store.onSending((sending) => this.change({ sending })),
      store.onParked((parked) => this.park(parked)),
      store.onInHand(({ others }) =>
        this.change({
          inHand: others,
          state: { ...this.view.state, elsewhere: others.map(({ attemptId }) => attemptId) },
        }),
      ),
    ];
    store.takeInHand(state.attemptId);
  }

  press = (action: Action): void => {
    const outcome = act(this.view.state, action, this.mint);
    const { made, pressId, undid, sound } = outcome;
    this.change({ state: outcome.state });
    if (made.length > 0) void this.keep(made, pressId, undid);
    if (sound) for (const listener of this.soundListeners) listener(sound);
    this.store.takeInHand(outcome.state.attemptId);
    void this.savePlace();
  };

  getView = (): BenchView => this.view;

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  onSound(listener: (sound: Sound) => void): () => void {
    this.soundListeners.add(listener);
    return () => this.soundListeners.delete(listener);
  }

  forgetFailure = (): void => this.change({ failure: null });

  retryParked = (): Promise<void> => this.store.retryParked();

  dropParked = (ids: readonly string[]): Promise<void> => this.store.dropParked(ids);

  unsentFile = (): Promise<string | null> => this.store.unsentFile();

  takeUnsentFile = (text: string): Promise<TakenIn> => this.store.takeUnsentFile(text);

  writeLock = (value: unknown): Promise<void> => this.store.writeLock(value);

  close(): void {
    for (const close of this.closers) close();
    void this.savePlace();
  }

  private async keep(
    made: Parameters<RoundStore['keep']>[0],
    pressId: string | null,
    undid: string | null,
  ): Promise<void> {
    try {
      await this.store.keep(made, pressId, undid);
    } catch (error) {
      const ids = new Set(made.map(({ id }) => id));
      const reason = error instanceof Error ? error.name : 'unknown';
      const what = made.length === 1 ? 'The last reading was' : `The last ${made.length} entries were`;
      this.change({
        state: withoutEvents(this.view.state, ids),
        failure: `${what} not kept: this tablet could not write (${reason}). Everything before is kept. Free some space and record it again.`,
      });
      for (const listener of this.soundListeners) listener('refused');
    }
  }

  /** What the server refused is no longer shown as recorded: it stands in a list of its own. */
  private park(parked: readonly Parked[]): void {
    if (parked.length === 0 && this.view.parked.length === 0) return;
    const ids = new Set(parked.map(({ id }) => id));
    this.change({ parked, state: ids.size > 0 ? withoutEvents(this.view.state, ids) : this.view.state });
  }

  private change(change: Partial<BenchView>): void {
    this.view = { ...this.view, ...change };
    for (const listener of this.listeners) listener();
  }

  /** Written at once, so that a reload finds the cell; while one write is under way, the newest place waits for it. */
  private async savePlace(): Promise<void> {
    this.placeIsOld = true;
    if (this.savingPlace) return;
    this.savingPlace = true;
    while (this.placeIsOld) {
      this.placeIsOld = false;
      await this.store.savePlace(placeOf(this.view.state)).catch(() => {});
    }
    this.savingPlace = false;
  }
}
