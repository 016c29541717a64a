import { AXES } from '@/lib/scoring';
import { type Cell, type CellValue, valueKey } from '@/lib/sync/cells';
import { advance } from './read-size';
import { headsAt, recordOf, valueAt } from './record';
import { makeEvent, recorded, refused } from './record-events';
import type { BenchEvent, Mint, Outcome, RoundState } from './types';

/** The readings that stand against each other in a cell, each with the event that holds it. */
export function contenders(state: RoundState, cell: Cell): BenchEvent[] {
  const record = recordOf(state);
  const byValue = new Map(headsAt(record, cell).map((event) => [valueKey(event.value), event]));
  if (cell.what !== 'piece' || byValue.size > 1) return [...byValue.values()];
  const measured = AXES.flatMap((axis) => {
    const at = { lineId: cell.lineId, ordinal: cell.ordinal, what: axis };
    return valueAt(record, at) === null ? [] : headsAt(record, at);
  });
  return [...byValue.values(), ...measured];
}

/** A person's choice between readings. Where a piece was called missing and measured, it is one or the other. */
export function settle(state: RoundState, mint: Mint, value: CellValue): Outcome {
  const { asked } = state;
  if (asked?.about !== 'conflict') return refused(state, 'Tap the cell with two readings first.');
  if (!state.plan.maySettle) return refused(state, 'The teacher chooses between two readings.');
  const { cell } = asked;
  const chosen = headsAt(recordOf(state), cell).find((event) => valueKey(event.value) === valueKey(value));
  const source = chosen ?? { typed: null, unit: null, instrument: null };
  const { typed, unit, instrument } = source;
  const made = [makeEvent(state, mint, cell, value, { typed, unit, instrument })];
  if (cell.what === 'piece' && value.kind === 'state' && value.state === 'missing') {
    const record = recordOf(state);
    for (const axis of AXES) {
      const at = { ...cell, what: axis };
      if (valueAt(record, at) !== null) made.push(makeEvent(state, mint, at, { kind: 'cleared' }));
    }
  }
  const outcome = recorded(state, mint, made, 'two readings', {
    said: { kind: 'did', text: 'Chosen. Both readings stay in the record.' },
    sound: 'in',
  });
  return state.spot === null ? advance(outcome, null) : outcome;
}
