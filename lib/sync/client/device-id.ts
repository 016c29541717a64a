import { z } from 'zod';
import { uuid } from '../protocol';
import type { DeviceStore } from './device-store';

const deviceSchema = z.object({ deviceId: uuid, sequence: z.int().min(0) });

const KEY = 'device';

/** This browser's own id, made at its first use. */
export async function readDeviceId(store: DeviceStore): Promise<string> {
  return store.transaction('rw', store.meta, async () => (await readDevice(store)).deviceId);
}

/** The next numbers of this device; call it inside the transaction that uses them, and no two events share one. */
export async function takeSequences(
  store: DeviceStore,
  count: number,
): Promise<{ deviceId: string; first: number }> {
  const { deviceId, sequence } = await readDevice(store);
  await store.meta.put({ key: KEY, value: { deviceId, sequence: sequence + count } });
  return { deviceId, first: sequence + 1 };
}

async function readDevice(store: DeviceStore): Promise<z.infer<typeof deviceSchema>> {
  const known = deviceSchema.safeParse((await store.meta.get(KEY))?.value);
  if (known.success) return known.data;
  const made = { deviceId: crypto.randomUUID(), sequence: 0 };
  await store.meta.put({ key: KEY, value: made });
  return made;
}
