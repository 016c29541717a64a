import { z } from 'zod';
import { type DeviceStore, deviceStore } from './device-store';

const ticksSchema = z.array(z.string().max(80)).max(400);

const keyOf = (personId: string, attemptId: string) => `ticks/${personId}/${attemptId}`;

/** The pieces a student has ticked off while cutting. They stay on this device and count for nothing. */
export async function readTicks(
  personId: string,
  attemptId: string,
  store: DeviceStore = deviceStore(),
): Promise<string[]> {
  const row = await store.meta.get(keyOf(personId, attemptId));
  return ticksSchema.safeParse(row?.value).data ?? [];
}

export async function writeTicks(
  personId: string,
  attemptId: string,
  ticks: readonly string[],
  store: DeviceStore = deviceStore(),
): Promise<void> {
  await store.meta.put({ key: keyOf(personId, attemptId), value: [...ticks] });
}
