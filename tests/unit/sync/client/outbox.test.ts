import 'fake-indexeddb/auto';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { DeviceStore } from '@/lib/sync/client/device-store';
import { type DraftEvent, keepOnDevice } from '@/lib/sync/client/keep-on-device';
import { Outbox, type OutboxWorld } from '@/lib/sync/client/outbox';
import type { PostReply } from '@/lib/sync/client/post-events';
import { MAX_BATCH, PROTOCOL_VERSION, type Push, type PushAnswer } from '@/lib/sync/protocol';

const SITTING = randomUUID();
const TEACHER = randomUUID();
const AIDE = randomUUID();

let store: DeviceStore;
beforeEach(() => {
  store = new DeviceStore(`test-${randomUUID()}`);
});
afterEach(() => store.delete());

function draft(authorId = TEACHER): DraftEvent {
  return {
    id: randomUUID(),
    attemptId: randomUUID(),
    side: 'bench',
    cell: { lineId: 'base', ordinal: 1, what: 'length' },
    value: { kind: 'gauged' },
    typed: null,
    unit: null,
    instrument: 'gauge',
    supersedes: [],
    capturedAt: '2026-12-01T15:00:00.000Z',
    authorId,
  };
}

type Answers = PushAnswer['answers'];

function answered(answers: Answers): PostReply {
  return { kind: 'answered', answer: { protocol: PROTOCOL_VERSION, answers } };
}

const keepAll = (push: Push) => answered(push.events.map(({ id }) => ({ id, outcome: 'kept' })));

/** A server that answers as scripted, and a clock whose timers run when the test says so. */
class World implements OutboxWorld {
  pushes: { sittingId: string; push: Push }[] = [];
  timers: { milliseconds: number; work: () => void }[] = [];
  busyElsewhere = false;

  constructor(private readonly script: ((push: Push) => PostReply)[]) {}

  post = async (sittingId: string, push: Push) => {
    this.pushes.push({ sittingId, push });
    const reply = this.script[Math.min(this.pushes.length, this.script.length) - 1];
    if (!reply) throw new Error('the script is empty');
    return reply(push);
  };
  alone = async (work: () => Promise<void>) => {
    if (!this.busyElsewhere) await work();
  };
  after = (milliseconds: number, work: () => void) => {
    const timer = { milliseconds, work };
    this.timers.push(timer);
    return () => {
      this.timers = this.timers.filter((each) => each !== timer);
    };
  };
  random = () => 0.5;
}

async function outbox(...script: ((push: Push) => PostReply)[]) {
  const world = new World(script);
  return { world, box: new Outbox(store, TEACHER, world) };
}

const later = (): PostReply => ({ kind: 'later', message: 'No network.', retryAfterMs: null });

describe('keeping on the device', () => {
  test('numbers never repeat, from two pages at once either', async () => {
    const pages = [store, new DeviceStore(store.name)];
    await Promise.all(
      Array.from({ length: 20 }, (_, index) =>
        keepOnDevice(pages[index % 2] ?? store, SITTING, [draft(), draft()]),
      ),
    );
    const rows = await store.outbox.toArray();
    expect(new Set(rows.map(({ sequence }) => sequence)).size).toBe(40);
    expect(Math.max(...rows.map(({ sequence }) => sequence))).toBe(40);
    expect(new Set(rows.map(({ deviceId }) => deviceId)).size).toBe(1);
    pages[1]?.close();
  });

  test('events of one press are kept together or not at all', async () => {
    const [first] = await keepOnDevice(store, SITTING, [draft()]);
    if (!first) throw new Error('nothing was kept');
    await expect(keepOnDevice(store, SITTING, [draft(), { ...draft(), id: first.id }])).rejects.toThrow();
    expect(await store.outbox.count()).toBe(1);
    const [next] = await keepOnDevice(store, SITTING, [draft()]);
    expect(next?.sequence).toBe(2);
  });
});

describe('the outbox', () => {
  test('sends in the order of recording and removes what an answer names', async () => {
    const rows = await keepOnDevice(store, SITTING, [draft(), draft(), draft()]);
    const { world, box } = await outbox(keepAll);
    await box.nudge();
    expect(world.pushes).toHaveLength(1);
    expect(world.pushes[0]?.push.events.map(({ id }) => id)).toEqual(rows.map(({ id }) => id));
    expect(await store.outbox.count()).toBe(0);
    expect(await store.readings.where({ sittingId: SITTING, mine: 1 }).count()).toBe(3);
    expect(box.current).toEqual({ state: 'idle' });
  });

  test('“already” removes like “kept”; what an answer does not name stays and is sent again', async () => {
    const [first, second] = await keepOnDevice(store, SITTING, [draft(), draft()]);
    const { world, box } = await outbox(
      () => answered([{ id: first?.id ?? '', outcome: 'already' }]),
      keepAll,
    );
    await box.nudge();
    expect(world.pushes[1]?.push.events.map(({ id }) => id)).toEqual([second?.id]);
    expect(await store.outbox.count()).toBe(0);
  });

  test('an answer that names only others removes nothing and waits', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    const { world, box } = await outbox(() => answered([{ id: randomUUID(), outcome: 'kept' }]));
    await box.nudge();
    expect(await store.outbox.count()).toBe(1);
    expect(world.timers).toHaveLength(1);
  });

  test('a sitting that is not taken from this person holds up no other, and is tried again later', async () => {
    const other = randomUUID();
    const [mine] = await keepOnDevice(store, SITTING, [draft()]);
    await keepOnDevice(store, other, [draft(), draft()]);
    const { world, box } = await outbox(
      () => ({ kind: 'halt', why: 'refused', message: 'Not yours.' }),
      keepAll,
    );
    await box.nudge();
    expect(world.pushes.map(({ sittingId }) => sittingId)).toEqual([SITTING, other]);
    expect(await store.outbox.toArray()).toMatchObject([{ id: mine?.id, state: 'waiting' }]);
    expect(box.current).toEqual({ state: 'halted', why: 'refused', message: 'Not yours.' });
    expect(world.timers).toHaveLength(1);
    world.timers[0]?.work();
    await box.nudge();
    expect(await store.outbox.count()).toBe(0);
    expect(box.current).toEqual({ state: 'idle' });
  });

  test('a refused event is parked with its reason and holds up no other', async () => {
    const [bad, good] = await keepOnDevice(store, SITTING, [draft(), draft()]);
    const { box } = await outbox((push) =>
      answered(
        push.events.map(({ id }) =>
          id === bad?.id ? { id, outcome: 'refused', reason: 'No such line.' } : { id, outcome: 'kept' },
        ),
      ),
    );
    await box.nudge();
    expect(await store.outbox.toArray()).toMatchObject([
      { id: bad?.id, state: 'refused', reason: 'No such line.' },
    ]);
    expect(await store.readings.get(good?.id ?? '')).toBeDefined();
  });

  test('failures wait longer and longer, and success starts afresh', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    const { world, box } = await outbox(later, later, later, keepAll);
    const waits: number[] = [];
    await box.nudge();
    for (let count = 0; count < 3; count += 1) {
      waits.push(world.timers[0]?.milliseconds ?? 0);
      await box.nudge();
    }
    expect(waits).toEqual([750, 1500, 3000]);
    expect(world.timers).toEqual([]);
    await keepOnDevice(store, SITTING, [draft()]);
    await box.nudge();
    expect(await store.outbox.count()).toBe(0);
  });

  test('the server’s own wait is honoured when it is longer', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    const { world, box } = await outbox(() => ({ kind: 'later', message: 'busy', retryAfterMs: 9_000 }));
    await box.nudge();
    expect(world.timers[0]?.milliseconds).toBe(9_000);
  });

  test('without a sign-in, or with an old page, everything stays and the person is told', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    const { world, box } = await outbox(() => ({ kind: 'halt', why: 'sign-in', message: 'Sign in.' }));
    await box.nudge();
    expect(box.current).toEqual({ state: 'halted', why: 'sign-in', message: 'Sign in.' });
    expect(await store.outbox.count()).toBe(1);
    expect(world.timers).toHaveLength(1);
  });

  test('only the author’s events are sent', async () => {
    await keepOnDevice(store, SITTING, [draft(AIDE), draft()]);
    const { world, box } = await outbox(keepAll);
    await box.nudge();
    expect(world.pushes.flatMap(({ push }) => push.events.map(({ authorId }) => authorId))).toEqual([
      TEACHER,
    ]);
    expect(await store.outbox.toArray()).toMatchObject([{ authorId: AIDE, state: 'waiting' }]);
  });

  test('one batch holds one sitting and device, and no more than the most', async () => {
    const other = randomUUID();
    await keepOnDevice(
      store,
      SITTING,
      Array.from({ length: MAX_BATCH + 1 }, () => draft()),
    );
    await keepOnDevice(store, other, [draft()]);
    const [row] = await store.outbox.limit(1).toArray();
    if (!row) throw new Error('nothing was kept');
    const fromFile = { ...row, id: randomUUID(), deviceId: randomUUID(), sequence: 3 };
    await store.outbox.put({ ...fromFile, event: { ...row.event, id: fromFile.id, sequence: 3 } });
    const { world, box } = await outbox(keepAll);
    await box.nudge();
    expect(world.pushes.map(({ push }) => push.events.length).sort((a, b) => a - b)).toEqual([
      1,
      1,
      1,
      MAX_BATCH,
    ]);
    for (const { sittingId, push } of world.pushes) {
      expect(push.events.length).toBeLessThanOrEqual(MAX_BATCH);
      expect([SITTING, other]).toContain(sittingId);
    }
    expect(await store.outbox.count()).toBe(0);
  });

  test('a batch that the server cannot read is sent one by one, and only the one at fault is parked', async () => {
    const [, bad] = await keepOnDevice(store, SITTING, [draft(), draft(), draft()]);
    const { box } = await outbox((push) =>
      push.events.some(({ id }) => id === bad?.id)
        ? { kind: 'unreadable', message: 'This cannot be read.' }
        : keepAll(push),
    );
    await box.nudge();
    expect(await store.outbox.toArray()).toMatchObject([{ id: bad?.id, state: 'refused' }]);
    expect(await store.readings.count()).toBe(2);
  });

  test('nudges during a batch start no second one beside it, and what came meanwhile is sent after it', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    let open = 0;
    let most = 0;
    const world = new World([keepAll]);
    const post = world.post;
    world.post = async (sittingId, push) => {
      open += 1;
      most = Math.max(most, open);
      if (world.pushes.length === 0) await keepOnDevice(store, SITTING, [draft()]);
      const reply = await post(sittingId, push);
      open -= 1;
      return reply;
    };
    const box = new Outbox(store, TEACHER, world);
    await Promise.all([box.nudge(), box.nudge(), box.nudge()]);
    await box.nudge();
    expect(most).toBe(1);
    expect(await store.outbox.count()).toBe(0);
  });

  test('while another page sends, this one waits its turn', async () => {
    await keepOnDevice(store, SITTING, [draft()]);
    const { world, box } = await outbox(keepAll);
    world.busyElsewhere = true;
    await box.nudge();
    expect(world.pushes).toEqual([]);
    expect(world.timers).toHaveLength(1);
  });
});
