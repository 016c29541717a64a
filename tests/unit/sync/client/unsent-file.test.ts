import 'fake-indexeddb/auto';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { DeviceStore } from '@/lib/sync/client/device-store';
import { keepOnDevice } from '@/lib/sync/client/keep-on-device';
import { takeUnsentFile, writeUnsentFile } from '@/lib/sync/client/unsent-file';

const TEACHER = randomUUID();
let tablet: DeviceStore;
let other: DeviceStore;
beforeEach(() => {
  tablet = new DeviceStore(`a-${randomUUID()}`);
  other = new DeviceStore(`b-${randomUUID()}`);
});
afterEach(async () => {
  await tablet.delete();
  await other.delete();
});

const draft = (authorId: string) => ({
  id: randomUUID(),
  attemptId: randomUUID(),
  side: 'bench' as const,
  cell: { lineId: 'base', ordinal: 1, what: 'length' },
  value: { kind: 'value' as const, ticks: 254_000_000 },
  typed: '1',
  unit: 'in' as const,
  instrument: 'rule' as const,
  supersedes: [],
  capturedAt: '2026-12-01T15:00:00.000Z',
  authorId,
});

test('what is unsent on one tablet is taken in on another, whole, once, with its own device and number', async () => {
  const kept = await keepOnDevice(tablet, randomUUID(), [draft(TEACHER), draft(randomUUID())]);
  const file = await writeUnsentFile(tablet, '2026-12-01T16:00:00.000Z');
  expect(await takeUnsentFile(other, file, TEACHER)).toEqual({ ok: true, taken: 2, known: 0, others: 1 });
  expect(await takeUnsentFile(other, file, TEACHER)).toEqual({ ok: true, taken: 0, known: 2, others: 0 });
  const rows = await other.outbox.orderBy('id').toArray();
  expect(rows.map(({ event, deviceId, state }) => ({ event, deviceId, state }))).toEqual(
    kept
      .sort((a, b) => (a.id < b.id ? -1 : 1))
      .map(({ event, deviceId }) => ({ event, deviceId, state: 'waiting' })),
  );
  expect(await takeUnsentFile(tablet, file, TEACHER)).toMatchObject({ taken: 0, known: 2 });
});

test.each([
  '',
  '{}',
  '[1]',
  'PK\u0003\u0004',
  '{"file":"trymark unsent readings","protocol":9,"readings":[]}',
])('a file that is none is refused and changes nothing: %j', async (text) => {
  expect(await takeUnsentFile(other, text, TEACHER)).toMatchObject({ ok: false });
  expect(await other.outbox.count()).toBe(0);
});
