import { type Length, parseLength, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Line } from '@/lib/scoring';
import { spotBefore } from './cursor';
import { otherUnit } from './keypad';
import { findPiece } from './pieces';
import { readSize } from './read-size';
import { makeEvent, moved, recorded, refused } from './record-events';
import type { Caliper, Mint, Outcome, RoundState, Spot } from './types';

/** A switch that bounces sends the same reading again at once. */
const BOUNCE_MS = 300;

/** What the jaws show below this is the jaws themselves. */
const CLOSED_BELOW = (30 * TICKS_PER_INCH) / 1000;

/** How near a reading must come to its target to be believed, where the rubric sets no gross limit. */
const NEAR: Record<Unit, Length> = { in: TICKS_PER_INCH / 4, mm: 6 * TICKS_PER_MM };

/** A line of text from an instrument that types digits and Enter. `at` counts milliseconds on the device. */
export function takeInstrument(state: RoundState, mint: Mint, text: string, at: number): Outcome {
  const typed = text.trim();
  const { last } = state.caliper;
  if (last && last.text === typed && at - last.at >= 0 && at - last.at < BOUNCE_MS) return moved(state, {});
  const heard = withCaliper(state, { last: { text: typed, at } });
  const parsed = parseLength(typed, state.caliper.unit);
  if (!parsed.ok) return refused(withCaliper(heard, { closed: false }), `“${typed}”: ${parsed.reason}`);
  const doubtful = suspectUnit(heard, typed, parsed.ticks, parsed.unit);
  if (doubtful) return doubtful;
  if (Math.abs(parsed.ticks) < CLOSED_BELOW) return closeJaws(heard, mint, typed, parsed.ticks);
  if (parsed.ticks < 0) {
    return refused(
      withCaliper(heard, { closed: false }),
      'The caliper shows less than nothing: set its zero and measure again.',
    );
  }
  return readSize({ ...withCaliper(heard, { closed: false }), asked: null }, mint, {
    ticks: parsed.ticks,
    typed,
    unit: parsed.unit,
    instrument: 'caliper',
  });
}

function withCaliper(state: RoundState, change: Partial<Caliper>): RoundState {
  return { ...state, caliper: { ...state.caliper, ...change } };
}

export function stepBack(state: RoundState): Outcome {
  return moved(state, {
    spot: spotBefore(state, state.spot),
    asked: null,
    doubt: null,
    said: { kind: 'did', text: 'One back.' },
  });
}

/** Once: the zero is logged. Again: the cursor steps back to the dimension before. */
function closeJaws(state: RoundState, mint: Mint, typed: string, ticks: Length): Outcome {
  if (state.caliper.closed) return stepBack(state);
  const { unit } = state.caliper;
  const event = makeEvent(
    state,
    mint,
    { lineId: '', ordinal: 0, what: '@zero' },
    { kind: 'zero', ticks },
    { typed, unit, instrument: 'caliper' },
  );
  const past = Math.abs(ticks) > state.plan.rubric.margin;
  const outcome = recorded(
    withCaliper(state, { closed: true, zero: ticks }),
    mint,
    [{ ...event, supersedes: [] }],
    'zero check',
    { said: { kind: 'zero', ticks, past }, sound: past ? 'refused' : 'in' },
  );
  // A check of the instrument is not a step of the work: undo passes over it.
  return { ...outcome, state: { ...outcome.state, presses: state.presses } };
}

/** Asks when a bare number fits the target only in the other unit: 88.9 for 3 1/2, or 0.51 for 13. */
function suspectUnit(state: RoundState, typed: string, ticks: Length, unit: Unit): Outcome | null {
  const place = state.spot && findPiece(state.plan.rubric, state.spot);
  if (!place) return null;
  const other = otherUnit(unit);
  const read = parseLength(typed, other);
  const isBare = read.ok && read.unit === other;
  if (!isBare || state.caliper.denied.includes(other)) return null;
  const near = (length: Length) => isNear(state, place.line, state.spot, length);
  if (near(ticks) || !near(read.ticks)) return null;
  return moved(
    withCaliper(state, { closed: false }),
    { asked: { about: 'unit', text: typed, unit, other, ticks: read.ticks }, doubt: null },
    'refused',
  );
}

function isNear(state: RoundState, line: Line, spot: Spot | null, ticks: Length): boolean {
  const { grossLimit, margin, unit } = state.plan.rubric;
  const target = spot ? line.target[spot.axis] : 0;
  return Math.abs(ticks - target) <= (grossLimit === null ? NEAR[unit] : grossLimit + margin);
}

/** The answer is remembered: the unit from now on, or that it is not to be asked about again. */
export function answerUnit(state: RoundState, mint: Mint, yes: boolean): Outcome {
  const { asked } = state;
  if (asked?.about !== 'unit') return refused(state, 'Nothing was asked.');
  if (yes) {
    const settled = withCaliper({ ...state, asked: null }, { unit: asked.other });
    return readSize(settled, mint, {
      ticks: asked.ticks,
      typed: asked.text,
      unit: asked.other,
      instrument: 'caliper',
    });
  }
  const settled = withCaliper({ ...state, asked: null }, { denied: [...state.caliper.denied, asked.other] });
  const read = parseLength(asked.text, asked.unit);
  if (!read.ok) return refused(settled, read.reason);
  return readSize(settled, mint, {
    ticks: read.ticks,
    typed: asked.text,
    unit: asked.unit,
    instrument: 'caliper',
  });
}
