import type { InHandView, RoundBundle } from '@/lib/contracts/rounds';
import type { Place } from '@/lib/round/start-round';
import type { BenchEvent } from '@/lib/round/types';
import type { OutboxState } from './outbox';
import type { TakenIn } from './unsent-file';

/** How many events of this round this person made here, and how far they have come. */
export interface Counts {
  kept: number;
  sent: number;
}

/** An event that the server would not take, with its reason. */
export interface Parked {
  id: string;
  reason: string;
  event: BenchEvent;
}

/** A press as the store knows it, to rebuild what undo can take back. */
export interface StoredPress {
  id: string;
  attemptId: string;
  events: BenchEvent[];
}

/** Names of those who recorded, by person. */
export type Authors = Readonly<Record<string, string>>;

export type EventListener = (events: BenchEvent[], authors: Authors) => void;

export interface LoadedRound {
  bundle: RoundBundle;
  /** From the server just now, or as it was last stored here. */
  from: 'network' | 'device' | 'practice';
  events: BenchEvent[];
  presses: StoredPress[];
  place: Place | null;
}

export type LoadResult =
  | { ok: true; round: LoadedRound }
  | { ok: false; why: 'sign-in' | 'not-found' | 'offline' };

/** Where a bench keeps its round: the device's store with the server behind it, or the memory of a practice round. */
export interface RoundStore {
  load(): Promise<LoadResult>;
  /** Resolves when the events are on the disk; rejects when they could not be written. */
  keep(events: readonly BenchEvent[], press: string | null, undoes: string | null): Promise<void>;
  savePlace(place: Place): Promise<void>;
  /** Events made elsewhere: another page, or another device by way of the server. */
  onEvents(listener: EventListener): () => void;
  onCounts(listener: (counts: Counts) => void): () => void;
  onParked(listener: (parked: Parked[]) => void): () => void;
  onSending(listener: (state: OutboxState) => void): () => void;
  onInHand(listener: (view: InHandView) => void): () => void;
  /** Says whose pieces are on this bench now. */
  takeInHand(attemptId: string | null): void;
  /** Tries again to send what was refused, or lets it go for good. */
  retryParked(): Promise<void>;
  dropParked(ids: readonly string[]): Promise<void>;
  unsentFile(): Promise<string | null>;
  takeUnsentFile(text: string): Promise<TakenIn>;
  readLock(): Promise<unknown>;
  writeLock(value: unknown): Promise<void>;
  close(): void;
}
