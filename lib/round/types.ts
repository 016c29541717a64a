import type { Length, Unit } from '@/lib/length';
import type { Axis, Rubric } from '@/lib/scoring';
import type { Cell, CellValue } from '@/lib/sync/cells';
import type { CellEvent } from '@/lib/sync/derive';
import type { ReadingEvent } from '@/lib/sync/protocol';

/** An event as the bench handles it: everything but the number it gets from the device's store. */
export type BenchEvent = CellEvent & Omit<ReadingEvent, 'sequence'>;

export type Instrument = NonNullable<ReadingEvent['instrument']>;

/** One dimension of one piece: where the cursor stands. */
export interface Spot {
  lineId: string;
  ordinal: number;
  axis: Axis;
}

export interface Student {
  attemptId: string;
  attemptNumber: number;
  givenName: string;
  familyName: string;
}

/** What does not change while a round is walked. */
export interface RoundPlan {
  rubric: Rubric;
  students: readonly Student[];
  personId: string;
  mayFinish: boolean;
  maySettle: boolean;
}

/** What one press recorded, so that undo can take it back as one. */
export interface Press {
  id: string;
  attemptId: string;
  /** Where the cursor stood when it was made. */
  spot: Spot | null;
  eventIds: readonly string[];
  label: string;
}

/** A choice that is open on the screen: its answer is the second tap. */
export type Asked =
  | { about: 'missing' | 'held' | 'spoiled'; lineId: string; ordinal: number }
  | { about: 'found'; lineId: string; ordinal: number }
  | { about: 'checks'; lineId: string; ordinal: number }
  | { about: 'work' }
  | { about: 'conflict'; cell: Cell }
  | { about: 'finish'; unread: number; conflicts: number }
  | { about: 'unit'; text: string; unit: Unit; other: Unit; ticks: Length }
  | { about: 'round-end' };

/** What an instrument that types has shown so far. */
export interface Caliper {
  /** The unit of a number that comes without one. */
  unit: Unit;
  /** Units the teacher said the caliper is not in: not asked again. */
  denied: readonly Unit[];
  last: { text: string; at: number } | null;
  /** The input before this one was closed jaws. */
  closed: boolean;
  zero: Length | null;
}

/** What the last press did: for the sound, the line under the target, and the screen reader. */
export type Said =
  | { kind: 'read'; label: string; axis: Axis; ticks: Length; deviation: Length; lose: number }
  | { kind: 'did'; text: string }
  | { kind: 'zero'; ticks: Length; past: boolean }
  | { kind: 'doubt'; label: string; axis: Axis; ticks: Length; deviation: Length }
  | { kind: 'refused'; text: string };

export type Sound = 'in' | 'off' | 'refused';

export interface RoundState {
  plan: RoundPlan;
  events: ReadonlyMap<string, readonly BenchEvent[]>;
  attemptId: string;
  spot: Spot | null;
  order: 'piece' | 'line';
  presses: readonly Press[];
  asked: Asked | null;
  /** Students passed over, to come back to. */
  skipped: readonly string[];
  /** Attempts that another device has in hand. */
  elsewhere: readonly string[];
  keypad: { text: string; unit: Unit };
  caliper: Caliper;
  /** A reading past the gross limit that waits for its second press. */
  doubt: { attemptId: string; spot: Spot; ticks: Length } | null;
  said: Said | null;
}

export interface Reading {
  ticks: Length;
  typed: string;
  unit: Unit;
  instrument: Instrument;
}

export type Action =
  | { do: 'point'; lineId: string; ordinal: number; what: string }
  | { do: 'read'; reading: Reading }
  | { do: 'key'; key: string }
  | { do: 'keep'; text?: string }
  | { do: 'instrument'; text: string; at: number }
  | { do: 'answer-unit'; yes: boolean }
  | { do: 'caliper-unit'; unit: Unit }
  | { do: 'step-back' }
  | { do: 'line-ok' }
  | { do: 'rest-ok' }
  | { do: 'all-good' }
  | { do: 'ask'; about: 'missing' | 'held' | 'spoiled' | 'work' }
  | { do: 'cancel' }
  | { do: 'missing'; scope: 'piece' | 'line' }
  | { do: 'held'; note: string }
  | { do: 'spoiled'; scope: 'size' | 'piece' }
  | { do: 'found' }
  | { do: 'check'; checkId: string; level: number }
  | { do: 'settle'; value: CellValue }
  | { do: 'undo' }
  | { do: 'finish' }
  | { do: 'next' }
  | { do: 'skip' }
  | { do: 'open'; attemptId: string }
  | { do: 'standing'; standing: 'absent' | 'expected' }
  | { do: 'order'; order: 'piece' | 'line' };

/** Ids and the time come from outside. */
export interface Mint {
  id(): string;
  now(): string;
}

/** The state after a press, and what it recorded: the events go to the device's store under the press's id. */
export interface Outcome {
  state: RoundState;
  made: BenchEvent[];
  pressId: string | null;
  /** The press that this one took back. */
  undid: string | null;
  sound: Sound | null;
}
