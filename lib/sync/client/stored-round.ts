import type { RoundBundle } from '@/lib/contracts/rounds';
import { roundBundleSchema } from '@/lib/contracts/rounds';
import type { BenchEvent } from '@/lib/round/types';
import type { DeviceStore, OutboxRow, ReadingRow } from './device-store';
import type { StoredPress } from './round-store';

const roundKey = (personId: string, sittingId: string) => `${personId}/${sittingId}`;

/** Lays a bundle from the server beside what this device knows; what was made here keeps its marks. */
export async function storeBundle(store: DeviceStore, personId: string, bundle: RoundBundle): Promise<void> {
  const { sittingId } = bundle;
  await store.transaction('rw', store.rounds, store.readings, store.outbox, async () => {
    const known = new Set(await store.readings.where({ sittingId }).primaryKeys());
    const unanswered = new Set(await store.outbox.where({ sittingId }).primaryKeys());
    const fresh = bundle.events.filter(({ id }) => !known.has(id) && !unanswered.has(id));
    await store.readings.bulkPut(
      fresh.map((event) => ({ id: event.id, sittingId, mine: 0, event, press: null, undoes: null })),
    );
    await store.rounds.put({ key: roundKey(personId, sittingId), bundle: { ...bundle, events: [] } });
  });
}

/** The round as this device last stored it for this person. */
export async function readStoredBundle(
  store: DeviceStore,
  personId: string,
  sittingId: string,
): Promise<RoundBundle | null> {
  const row = await store.rounds.get(roundKey(personId, sittingId));
  return row ? (roundBundleSchema.safeParse(row.bundle).data ?? null) : null;
}

/** Every bench event of the sitting that this device knows of and the server has not refused. */
export async function readStoredEvents(
  store: DeviceStore,
  personId: string,
  sittingId: string,
): Promise<{ events: BenchEvent[]; presses: StoredPress[] }> {
  const sent = await store.readings.where({ sittingId }).toArray();
  const unsent = (await store.outbox.where({ sittingId }).toArray()).filter(
    ({ state }) => state === 'waiting',
  );
  const rows = [...sent, ...unsent].filter(({ event }) => event.side === 'bench');
  return { events: rows.map(benchEvent), presses: standingPresses(rows, personId) };
}

/** The row's event without its number. */
export function benchEvent({ event }: Pick<ReadingRow | OutboxRow, 'event'>): BenchEvent {
  const { id, attemptId, side, cell, value, typed, unit, instrument, supersedes, capturedAt, authorId } =
    event;
  return { id, attemptId, side, cell, value, typed, unit, instrument, supersedes, capturedAt, authorId };
}

/** Presses of this person on this device that no later press took back, oldest first. */
function standingPresses(rows: readonly (ReadingRow | OutboxRow)[], personId: string): StoredPress[] {
  const own = rows
    .filter(({ press, event }) => press !== null && event.authorId === personId)
    .sort((a, b) => a.event.sequence - b.event.sequence);
  const undone = new Set(own.flatMap(({ undoes }) => undoes ?? []));
  const presses = new Map<string, StoredPress>();
  for (const row of own) {
    if (row.press === null || row.undoes !== null || undone.has(row.press)) continue;
    if (row.event.cell.what === '@zero') continue;
    const known = presses.get(row.press) ?? { id: row.press, attemptId: row.event.attemptId, events: [] };
    known.events.push(benchEvent(row));
    presses.set(row.press, known);
  }
  return [...presses.values()];
}
