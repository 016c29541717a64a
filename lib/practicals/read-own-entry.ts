import { type Length, parseLength, type Unit } from '@/lib/length';
import { judgeOwnReading, type OwnReadingContext } from './judge-own-reading';
import type { OwnSource } from './own-record';

/** A far reading that was asked about and waits for its second press. */
export interface AskedReading {
  cell: string;
  ticks: Length;
}

export type OwnEntryOutcome =
  | { does: 'keep'; ticks: Length; source: OwnSource }
  | { does: 'ask'; ticks: Length; asks: string }
  | { does: 'refuse'; reason: string };

interface OwnEntryInput {
  text: string;
  unit: Unit;
  instrument: 'rule' | 'caliper';
  /** The key of the cell it is typed for. */
  cell: string;
  asked: AskedReading | null;
  context: OwnReadingContext;
}

/**
 * What becomes of a size as a student typed it: kept as typed, asked about once when it is far off, or refused with a
 * reason when it is no length or cannot be. The text stays as it was typed in each case.
 */
export function readOwnEntry({
  text,
  unit,
  instrument,
  cell,
  asked,
  context,
}: OwnEntryInput): OwnEntryOutcome {
  const typed = text.trim();
  const parsed = parseLength(typed, unit);
  if (!parsed.ok) return { does: 'refuse', reason: parsed.reason };
  const { ticks } = parsed;
  if (ticks <= 0) return { does: 'refuse', reason: 'A piece has a size above zero.' };
  const judged = judgeOwnReading({ ...context, unit }, ticks, typed);
  if (judged.verdict === 'impossible') return { does: 'refuse', reason: judged.asks };
  if (judged.verdict === 'far' && !(asked?.cell === cell && asked.ticks === ticks)) {
    return { does: 'ask', ticks, asks: judged.asks };
  }
  return { does: 'keep', ticks, source: { typed, unit: parsed.unit, instrument } };
}
