import { describe, expect, test } from 'vitest';
import type { OwnEvent } from '@/lib/practicals/own-record';
import { valueAt } from '@/lib/round/record';
import { OwnSession, type OwnShelf } from '@/lib/sync/client/own-session';
import type { Parked } from '@/lib/sync/client/round-store';
import { receiptOf } from '@/lib/sync/receipt';
import { countingMint } from '../../../support/bench';
import { readAll, sizeCell } from '../../../support/own-readings';
import { defaultRubric, ticksOf } from '../../../support/rubrics';

const OF = { sittingId: 'sitting', attemptId: 'attempt', personId: 'student' };
const LENGTH = sizeCell('base', 1, 'length');
const inches = (text: string) => ({ kind: 'value', ticks: ticksOf(text) }) as const;

/** A store under test: it writes when it is let, and says what the server refused. */
class Shelf implements OwnShelf {
  kept: OwnEvent[] = [];
  failing = false;
  dropped: string[] = [];
  private tellParked: (parked: Parked[]) => void = () => {};

  keep = async (events: readonly OwnEvent[]) => {
    await Promise.resolve();
    if (this.failing) throw new DOMException('full', 'QuotaExceededError');
    this.kept.push(...events);
  };
  refuse(...events: OwnEvent[]): void {
    this.tellParked(events.map((event) => ({ id: event.id, reason: 'no', event })));
  }
  dropParked = async (ids: readonly string[]) => {
    this.dropped.push(...ids);
    this.tellParked([]);
  };
  onParked = (listener: (parked: Parked[]) => void) => {
    this.tellParked = listener;
    return () => {};
  };
  onEvents = () => () => {};
  onUnsent = () => () => {};
  onSending = () => () => {};
}

function open(events: OwnEvent[] = []) {
  const shelf = new Shelf();
  return { shelf, session: new OwnSession(OF, shelf, events, countingMint()) };
}

describe('a student’s own record on a page', () => {
  test('shows a reading once it is on the disk, not before', async () => {
    const { session, shelf } = open();
    const entering = session.enter([{ cell: LENGTH, value: inches('7') }]);
    expect(valueAt(session.view.record, LENGTH)).toBeNull();
    expect(await entering).toBe(true);
    expect(valueAt(session.view.record, LENGTH)).toEqual(inches('7'));
    expect(shelf.kept).toHaveLength(1);
  });

  test('readings of one size in a row replace one another, however fast they come', async () => {
    const { session, shelf } = open();
    await Promise.all(
      ['7', '6 31/32', '6 15/16'].map((text) => session.enter([{ cell: LENGTH, value: inches(text) }])),
    );
    const [first, second, third] = shelf.kept;
    expect([second?.supersedes, third?.supersedes]).toEqual([[first?.id], [second?.id]]);
    expect(valueAt(session.view.record, LENGTH)).toEqual(inches('6 15/16'));
  });

  test('what could not be written is said, is not shown as kept, and the next entry is tried afresh', async () => {
    const { session, shelf } = open();
    shelf.failing = true;
    expect(await session.enter([{ cell: LENGTH, value: inches('7') }])).toBe(false);
    expect(session.view.failure).toMatch(/not kept.*QuotaExceededError.*Everything before is kept/);
    expect(valueAt(session.view.record, LENGTH)).toBeNull();
    shelf.failing = false;
    expect(await session.enter([{ cell: LENGTH, value: inches('7') }])).toBe(true);
    expect(session.view.failure).toBeNull();
  });

  test('what the server refused counts as not recorded, and leaves when it is cleared', async () => {
    const { session, shelf } = open();
    await session.enter([{ cell: LENGTH, value: inches('7') }]);
    const [event] = shelf.kept;
    if (!event) throw new Error('nothing was kept');
    shelf.refuse(event);
    expect(session.view.parked).toHaveLength(1);
    expect(valueAt(session.view.record, LENGTH)).toBeNull();
    await session.dropParked();
    expect(shelf.dropped).toEqual([event.id]);
    expect(session.view).toMatchObject({ parked: [], kept: 0 });
    expect(valueAt(session.view.record, LENGTH)).toBeNull();
  });

  test('what the server or another page knows joins in, and once', () => {
    const events = readAll(defaultRubric());
    const { session } = open(events.slice(0, 5));
    session.take(events);
    session.take(events);
    expect(session.view.kept).toBe(27);
  });

  test('a lock carries the receipt of the readings as they stand, those entered just before it too', async () => {
    const { session, shelf } = open(readAll(defaultRubric()));
    const entering = session.enter([{ cell: LENGTH, value: inches('6 15/16') }]);
    const locking = session.lock();
    await Promise.all([entering, locking]);
    const expected = await receiptOf('attempt', [
      ...readAll(defaultRubric(), { 'base 1 length': -ticksOf('1/16') }),
    ]);
    expect(shelf.kept.at(-1)?.value).toEqual({ kind: 'lock', locked: true, receipt: expected });
    expect(session.view.record.derived.lock?.receipt).toBe(expected);
  });
});
