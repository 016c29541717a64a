import { receiptOf } from '@/lib/sync/receipt';
import { morningOf } from './practicals';
import type { Random } from './random';
import { Recorder, recordPieces, type SeedEvent } from './recording';
import type { SeededSitting } from './sittings';
import type { MadePiece } from './wood';

/** What students read themselves before the bench, most of them carefully, and locked. */
export async function recordOwnReadings(random: Random, sitting: SeededSitting): Promise<SeedEvent[]> {
  const events: SeedEvent[] = [];
  if (sitting.plan.state === 'open') return events;
  for (const attempt of sitting.attempts) {
    if (!random.chance(0.7)) continue;
    const start = new Date(morningOf(sitting.plan.day).getTime() - 40 * 60_000);
    const recorder = new Recorder(random, random.uuid(), attempt.student.id, 'own', start);
    const wishful = random.chance(0.15);
    const pieces = wishful ? attempt.pieces.map(asOrdered) : attempt.pieces;
    const reader = { bias: 0, instrument: 'rule' as const, gauges: false };
    const own = recordPieces(random, recorder, attempt.id, sitting.version.rubric, pieces, reader);
    const receipt = await receiptOf(
      attempt.id,
      own.map((event) => ({ ...event, capturedAt: event.capturedAt.toISOString() })),
    );
    const lock = { kind: 'lock' as const, locked: true, receipt };
    events.push(...own, recorder.record(attempt.id, { lineId: '', ordinal: 0, what: '@lock' }, lock));
  }
  return events;
}

/** A student who writes down what the cut list asks for instead of what is there. */
function asOrdered(piece: MadePiece): MadePiece {
  return { ...piece, sizes: { ...piece.line.target }, checks: {} };
}
