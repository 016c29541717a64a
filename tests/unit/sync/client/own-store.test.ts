import 'fake-indexeddb/auto';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { OwnEvent } from '@/lib/practicals/own-record';
import { DeviceStore } from '@/lib/sync/client/device-store';
import type { OutboxWorld } from '@/lib/sync/client/outbox';
import { OwnStore } from '@/lib/sync/client/own-store';
import { readTicks, writeTicks } from '@/lib/sync/client/own-ticks';
import { PROTOCOL_VERSION, type Push, type PushAnswer } from '@/lib/sync/protocol';
import { ownEvent, sizeCell } from '../../../support/own-readings';

const OF = { sittingId: randomUUID(), attemptId: randomUUID(), personId: randomUUID() };

let device: DeviceStore;
let network: (push: Push) => PushAnswer['answers'] | null;
const open: OwnStore[] = [];

beforeEach(() => {
  device = new DeviceStore(`test-${randomUUID()}`);
  network = () => null;
  vi.stubGlobal('window', new EventTarget());
  vi.stubGlobal('document', Object.assign(new EventTarget(), { visibilityState: 'visible' }));
});

afterEach(async () => {
  for (const store of open.splice(0)) store.close();
  vi.unstubAllGlobals();
  await device.delete();
});

const world: OutboxWorld = {
  post: async (_, push) => {
    const answers = network(push);
    return answers
      ? { kind: 'answered', answer: { protocol: PROTOCOL_VERSION, answers } }
      : { kind: 'later', message: 'No network.', retryAfterMs: null };
  },
  alone: (work) => work(),
  after: () => () => {},
  random: () => 0,
};

function openStore(of = OF): OwnStore {
  const store = new OwnStore(of, device, world);
  open.push(store);
  return store;
}

function reading(change: Partial<OwnEvent> = {}): OwnEvent {
  return ownEvent(
    sizeCell('base', 1, 'length'),
    { kind: 'spoiled' },
    { id: randomUUID(), attemptId: OF.attemptId, authorId: OF.personId, ...change },
  );
}

const keptAll = (push: Push) => push.events.map(({ id }) => ({ id, outcome: 'kept' as const }));

describe('own readings on a device', () => {
  test('stay when there is no network, are there again on the next page, and go out when it is back', async () => {
    const event = reading();
    await openStore().keep([event]);
    expect(await device.outbox.count()).toBe(1);
    const later = openStore();
    expect(await later.load()).toEqual([event]);
    network = keptAll;
    window.dispatchEvent(new Event('online'));
    await vi.waitFor(async () => expect(await device.outbox.count()).toBe(0));
    expect(await later.load()).toEqual([event]);
  });

  test('of another student on the same tablet, and of the bench, are not to be seen', async () => {
    const other = reading({ attemptId: randomUUID(), authorId: randomUUID() });
    const bench = reading({ side: 'bench' });
    await openStore().keep([reading(), other, bench]);
    expect(await openStore().load()).toHaveLength(1);
  });

  test('that the server refused are told with the reason, are not loaded, and can be let go', async () => {
    network = (push) => push.events.map(({ id }) => ({ id, outcome: 'refused', reason: 'This is locked.' }));
    const store = openStore();
    const told = vi.fn();
    store.onParked(told);
    const event = reading();
    await store.keep([event]);
    await vi.waitFor(() =>
      expect(told).toHaveBeenLastCalledWith([expect.objectContaining({ reason: 'This is locked.' })]),
    );
    expect(await store.load()).toEqual([]);
    await store.dropParked([event.id]);
    expect(await device.outbox.count()).toBe(0);
  });

  test('are counted while they wait', async () => {
    const store = openStore();
    const counted = vi.fn();
    store.onUnsent(counted);
    await store.keep([reading(), reading()]);
    await vi.waitFor(() => expect(counted).toHaveBeenLastCalledWith(2));
    network = keptAll;
    window.dispatchEvent(new Event('online'));
    await vi.waitFor(() => expect(counted).toHaveBeenLastCalledWith(0));
  });
});

describe('the ticks of a cut list', () => {
  test('are kept for one student and one attempt', async () => {
    await writeTicks('ana', 'first', ['base/1'], device);
    expect(await readTicks('ana', 'first', device)).toEqual(['base/1']);
    expect(await readTicks('ben', 'first', device)).toEqual([]);
    expect(await readTicks('ana', 'second', device)).toEqual([]);
  });
});
