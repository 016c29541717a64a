import { z } from 'zod';
import { PROTOCOL_VERSION, readingEventSchema, uuid } from '../protocol';
import type { DeviceStore, OutboxRow } from './device-store';

const unsentFileSchema = z.strictObject({
  file: z.literal('trymark unsent readings'),
  protocol: z.literal(PROTOCOL_VERSION),
  writtenAt: z.iso.datetime(),
  readings: z.array(z.strictObject({ sittingId: uuid, deviceId: uuid, event: readingEventSchema })),
});

/** Every event that has not arrived, refused ones too, as the text of a file. */
export async function writeUnsentFile(store: DeviceStore, writtenAt: string): Promise<string> {
  const rows = await store.outbox.toArray();
  rows.sort((a, b) => a.sequence - b.sequence);
  const readings = rows.map(({ sittingId, deviceId, event }) => ({ sittingId, deviceId, event }));
  return `${JSON.stringify({ file: 'trymark unsent readings', protocol: PROTOCOL_VERSION, writtenAt, readings }, null, 1)}\n`;
}

export type TakenIn =
  | { ok: true; taken: number; known: number; others: number }
  | { ok: false; reason: string };

/**
 * Takes a file of unsent readings back in. What this device has already is passed over; what another person made waits
 * until that person signs in here. Sending them twice does no harm: the server knows each by its id.
 */
export async function takeUnsentFile(store: DeviceStore, text: string, personId: string): Promise<TakenIn> {
  const parsed = unsentFileSchema.safeParse(parseJson(text));
  if (!parsed.success) {
    return {
      ok: false,
      reason: 'This is no file of unsent readings, or it was changed. Nothing was taken in.',
    };
  }
  return store.transaction('rw', store.outbox, store.readings, async () => {
    const known = new Set([
      ...(await store.outbox.toCollection().primaryKeys()),
      ...(await store.readings.toCollection().primaryKeys()),
    ]);
    const fresh = parsed.data.readings.filter(({ event }) => !known.has(event.id));
    await store.outbox.bulkPut(fresh.map(rowOf));
    return {
      ok: true,
      taken: fresh.length,
      known: parsed.data.readings.length - fresh.length,
      others: fresh.filter(({ event }) => event.authorId !== personId).length,
    };
  });
}

function rowOf({
  sittingId,
  deviceId,
  event,
}: z.infer<typeof unsentFileSchema>['readings'][number]): OutboxRow {
  const { id, authorId, sequence } = event;
  return {
    id,
    sittingId,
    authorId,
    deviceId,
    sequence,
    state: 'waiting',
    reason: null,
    event,
    press: null,
    undoes: null,
  };
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
