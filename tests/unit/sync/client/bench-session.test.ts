import { expect, test } from 'vitest';
import type { RoundBundle } from '@/lib/contracts/rounds';
import { recordOf, valueAt } from '@/lib/round/record';
import { BenchSession } from '@/lib/sync/client/bench-session';
import { PracticeRound } from '@/lib/sync/client/practice-round';
import type { EventListener, LoadedRound, Parked } from '@/lib/sync/client/round-store';
import { countingMint, STUDENTS } from '../../../support/bench';
import { defaultRubric, defaultTask, ticksOf } from '../../../support/rubrics';

const BUNDLE: RoundBundle = {
  sittingId: '0190b6e2-7f3a-4c1d-9a55-0242ac120002',
  published: false,
  sectionName: 'Woods 2',
  period: '3',
  schoolName: 'Cedar Fork',
  task: defaultTask(),
  rubric: defaultRubric(),
  versionNumber: 1,
  students: STUDENTS.map((student) => ({ ...student, studentId: student.attemptId })),
  events: [],
  authors: {},
  inHand: { others: [], benchEvents: 0 },
  may: { finish: true, settle: true },
};

/** A store whose disk can be full, and which can report what others did. */
class TestStore extends PracticeRound {
  full = false;
  told: EventListener = () => {};
  park: (parked: Parked[]) => void = () => {};

  override async keep(...args: Parameters<PracticeRound['keep']>): Promise<void> {
    if (this.full) throw new DOMException('no room', 'QuotaExceededError');
    return super.keep(...args);
  }
  override onEvents = (listener: EventListener) => {
    this.told = listener;
    return () => {};
  };
  override onParked = (listener: (parked: Parked[]) => void) => {
    this.park = listener;
    return () => {};
  };
}

async function open() {
  const store = new TestStore(BUNDLE);
  const loaded: LoadedRound = { bundle: BUNDLE, from: 'network', events: [], presses: [], place: null };
  const session = new BenchSession(store, loaded, 'teacher', countingMint());
  const sounds: string[] = [];
  session.onSound((sound) => sounds.push(sound));
  const read = () =>
    session.press({
      do: 'read',
      reading: { ticks: ticksOf('17/32'), typed: '17/32', unit: 'in', instrument: 'rule' },
    });
  const first = () =>
    valueAt(recordOf(session.view.state), { lineId: 'base', ordinal: 1, what: 'thickness' });
  const settled = () => new Promise((resolve) => setTimeout(resolve, 0));
  return { store, session, sounds, read, first, settled };
}

test('the cursor moves at once, and the count rises when the store has it', async () => {
  const { session, read, settled } = await open();
  read();
  expect(session.view.state.spot?.axis).toBe('width');
  await settled();
  expect(session.view.counts).toEqual({ kept: 1, sent: 0 });
});

test('a reading that cannot be written is taken off the screen and said so, with the refused sound', async () => {
  const { store, session, sounds, read, first, settled } = await open();
  store.full = true;
  read();
  await settled();
  expect(first()).toBeNull();
  expect(session.view.failure).toContain('QuotaExceededError');
  expect(session.view.state.presses).toEqual([]);
  expect(sounds).toEqual(['in', 'refused']);
  session.forgetFailure();
  expect(session.view.failure).toBeNull();
});

test('what the server refused is no longer shown as recorded', async () => {
  const { store, session, read, first } = await open();
  read();
  const [event] = [...session.view.state.events.values()].flat();
  if (!event) throw new Error('nothing was recorded');
  store.park([{ id: event.id, reason: 'No such line.', event }]);
  expect(first()).toBeNull();
  expect(session.view.parked).toHaveLength(1);
});

test('what another tablet recorded appears with its author’s name', async () => {
  const { store, session, read, first } = await open();
  read();
  const [event] = [...session.view.state.events.values()].flat();
  if (!event) throw new Error('nothing was recorded');
  const theirs = {
    ...event,
    id: countingMint('9').id(),
    authorId: 'aide',
    value: { kind: 'gauged' as const },
  };
  store.told([theirs], { aide: 'Jonah Pell' });
  expect(first()).toBe('conflict');
  expect(session.view.authors).toEqual({ aide: 'Jonah Pell' });
});
