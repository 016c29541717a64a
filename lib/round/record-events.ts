import { type Cell, type CellValue, hasCell } from '@/lib/sync/cells';
import { headsAt, recordOf } from './record';
import type { BenchEvent, Mint, Outcome, Reading, RoundState, Said, Sound } from './types';

type Source = Pick<BenchEvent, 'typed' | 'unit' | 'instrument'>;

const NO_SOURCE: Source = { typed: null, unit: null, instrument: null };

/** One new event of the student in hand, in place of everything that stands in its cell now. */
export function makeEvent(
  state: RoundState,
  mint: Mint,
  cell: Cell,
  value: CellValue,
  source: Source = NO_SOURCE,
): BenchEvent {
  return {
    id: mint.id(),
    attemptId: state.attemptId,
    side: 'bench',
    cell,
    value,
    ...source,
    supersedes: headsAt(recordOf(state), cell).map(({ id }) => id),
    capturedAt: mint.now(),
    authorId: state.plan.personId,
  };
}

export function sourceOf({ typed, unit, instrument }: Reading): Source {
  return { typed, unit, instrument };
}

/**
 * The events laid beside what is known; an event that is known already stays as it is. One of a cell that the rubric
 * does not have, from before or after the sitting was moved to another version, stays where it is kept.
 */
export function withEvents(state: RoundState, events: readonly BenchEvent[]): RoundState {
  const all = new Map(state.events);
  for (const event of events) {
    if (!hasCell(state.plan.rubric, event.cell)) continue;
    const known = all.get(event.attemptId) ?? [];
    if (!known.some(({ id }) => id === event.id)) all.set(event.attemptId, [...known, event]);
  }
  return { ...state, events: all };
}

/** Takes events out again that could not be kept after all. */
export function withoutEvents(state: RoundState, ids: ReadonlySet<string>): RoundState {
  const all = new Map(
    [...state.events].map(([attemptId, events]) => {
      const stay = events.filter(({ id }) => !ids.has(id));
      return [attemptId, stay.length < events.length ? stay : events];
    }),
  );
  const presses = state.presses.filter(({ eventIds }) => !eventIds.some((id) => ids.has(id)));
  return { ...state, events: all, presses };
}

/** What a press recorded, as one step that undo takes back. Any open question is answered by it. */
export function recorded(
  state: RoundState,
  mint: Mint,
  made: BenchEvent[],
  label: string,
  more: { said: Said; sound?: Sound },
): Outcome {
  const id = mint.id();
  const { attemptId, spot, presses } = state;
  const press = { id, attemptId, spot, eventIds: made.map((event) => event.id), label };
  const next = withEvents(
    { ...state, presses: [...presses, press], asked: null, doubt: null, said: more.said },
    made,
  );
  return { state: next, made, pressId: id, undid: null, sound: more.sound ?? null };
}

/** A press that records nothing. */
export function moved(state: RoundState, change: Partial<RoundState>, sound: Sound | null = null): Outcome {
  return { state: { ...state, ...change }, made: [], pressId: null, undid: null, sound };
}

export function refused(state: RoundState, text: string, change: Partial<RoundState> = {}): Outcome {
  return moved(state, { ...change, said: { kind: 'refused', text } }, 'refused');
}
