import { type CellValue, valueKey } from '@/lib/sync/cells';
import { headsAt, recordOf } from './record';
import { moved, refused, withEvents } from './record-events';
import type { BenchEvent, Mint, Outcome, RoundState } from './types';

const CLEARED: CellValue = { kind: 'cleared' };

/**
 * Takes back the last press as new events that restore what stood before it, and returns to where it was made.
 * What another device has changed since, or also recorded, stays as it is.
 */
export function undo(state: RoundState, mint: Mint): Outcome {
  const press = state.presses.at(-1);
  if (!press) return refused(state, 'There is nothing to undo.');
  const events = state.events.get(press.attemptId) ?? [];
  const byId = new Map(events.map((event) => [event.id, event]));
  const there = { ...state, attemptId: press.attemptId };
  const record = recordOf(there);
  const made = press.eventIds.flatMap((id) => {
    const event = byId.get(id);
    const heads = event ? headsAt(record, event.cell) : [];
    return event && heads.length === 1 && heads[0]?.id === id ? restore(there, mint, event, byId) : [];
  });
  const whole = press.eventIds.length > 0 && made.length === 0;
  const text = whole
    ? `Not undone: another tablet has recorded ${press.label} since.`
    : `Undone: ${press.label}.`;
  const undone = moved(withEvents(there, made), {
    spot: press.spot,
    presses: state.presses.slice(0, -1),
    asked: null,
    doubt: null,
    keypad: { ...state.keypad, text: '' },
    said: whole ? { kind: 'refused', text } : { kind: 'did', text },
  });
  return { ...undone, made, pressId: mint.id(), undid: press.id, sound: whole ? 'refused' : null };
}

/** What the event replaced, brought back: nothing, one value, or the two that it had settled. */
function restore(
  state: RoundState,
  mint: Mint,
  event: BenchEvent,
  byId: ReadonlyMap<string, BenchEvent>,
): BenchEvent[] {
  const before = new Map<string, Pick<BenchEvent, 'value' | 'typed' | 'unit' | 'instrument'>>();
  for (const id of event.supersedes) {
    const replaced = byId.get(id);
    if (replaced) before.set(valueKey(replaced.value), replaced);
  }
  if (before.size === 0) before.set('', { value: CLEARED, typed: null, unit: null, instrument: null });
  return [...before.values()].map(({ value, typed, unit, instrument }) => ({
    id: mint.id(),
    attemptId: event.attemptId,
    side: 'bench',
    cell: event.cell,
    value,
    typed,
    unit,
    instrument,
    supersedes: [event.id],
    capturedAt: mint.now(),
    authorId: state.plan.personId,
  }));
}
