import { describe, expect, test } from 'vitest';
import {
  countOwnSizes,
  isOpen,
  listOpen,
  makeOwnEvent,
  nextOpen,
  ownRecordOf,
  predictedSheet,
} from '@/lib/practicals/own-record';
import { countingMint } from '../../support/bench';
import { ownEvent, readAll, recordOfAll, sizeCell } from '../../support/own-readings';
import { defaultRubric, ticksOf } from '../../support/rubrics';

const rubric = defaultRubric();
const base = sizeCell('base', 1, 'length');
const baseSpot = { lineId: 'base', ordinal: 1, axis: 'length' } as const;
const seven = { kind: 'value', ticks: ticksOf('7') } as const;

describe('what a lock still waits for', () => {
  test('nothing is recorded at first, and everything is once each size has a reading', () => {
    expect(countOwnSizes(rubric, ownRecordOf([]))).toEqual({ of: 27, done: 0 });
    expect(countOwnSizes(rubric, recordOfAll(rubric))).toEqual({ of: 27, done: 27 });
    expect(nextOpen(rubric, recordOfAll(rubric), baseSpot)).toBeNull();
  });

  test.each([
    ['a reading', seven, false],
    ['spoiled', { kind: 'spoiled' }, false],
    ['couldn’t read', { kind: 'unreadable' }, false],
    ['taken back', { kind: 'cleared' }, true],
  ] as const)('a size that holds “%s” is open: %s', (_, value, open) => {
    expect(isOpen(ownRecordOf([ownEvent(base, value)]), baseSpot)).toBe(open);
  });

  test('two different readings from two devices are open until one replaces both', () => {
    const one = ownEvent(base, seven);
    const other = ownEvent(base, { kind: 'value', ticks: ticksOf('6 31/32') });
    expect(isOpen(ownRecordOf([one, other]), baseSpot)).toBe(true);
    const record = ownRecordOf([one, other]);
    const again = makeOwnEvent(record, countingMint(), WHO, { cell: base, value: seven });
    expect(again.supersedes).toEqual([one.id, other.id]);
    expect(isOpen(ownRecordOf([one, other, again]), baseSpot)).toBe(false);
  });

  test('a missing piece leaves nothing to measure; a piece that turned up does', () => {
    const piece = { lineId: 'base', ordinal: 1, what: 'piece' };
    const gone = ownEvent(piece, { kind: 'state', state: 'missing' });
    expect(listOpen(rubric, ownRecordOf([gone]))).toHaveLength(24);
    const back = ownEvent(piece, { kind: 'state', state: 'present' }, { supersedes: [gone.id] });
    expect(listOpen(rubric, ownRecordOf([gone, back]))).toHaveLength(27);
  });

  test('the next open size is the one after the cursor, going round to the first', () => {
    const last = { lineId: 'divider', ordinal: 4, axis: 'length' } as const;
    expect(nextOpen(rubric, ownRecordOf([]), null)).toEqual({
      lineId: 'base',
      ordinal: 1,
      axis: 'thickness',
    });
    expect(nextOpen(rubric, ownRecordOf([ownEvent(base, seven)]), last)).toEqual({
      lineId: 'base',
      ordinal: 1,
      axis: 'thickness',
    });
  });

  test('what the bench recorded is no part of the own record', () => {
    const bench = ownEvent(base, seven, { side: 'bench' });
    expect(countOwnSizes(rubric, ownRecordOf([bench])).done).toBe(0);
  });
});

const WHO = { attemptId: 'attempt', personId: 'student' };

describe('an own event', () => {
  test('is of the own side, keeps what was typed, and replaces what stood in its cell', () => {
    const first = ownEvent(base, seven);
    const source = { typed: '6 15/16', unit: 'in', instrument: 'caliper' } as const;
    const value = { kind: 'value', ticks: ticksOf('6 15/16') } as const;
    const made = makeOwnEvent(ownRecordOf([first]), countingMint(), WHO, { cell: base, value, source });
    expect(made).toMatchObject({
      side: 'own',
      cell: base,
      value,
      ...source,
      supersedes: [first.id],
      authorId: 'student',
    });
  });
});

describe('the predicted score', () => {
  test('is what the engine gives for the own readings alone', () => {
    const sheet = predictedSheet(rubric, recordOfAll(rubric, { 'base 1 length': -ticksOf('1/16') }));
    expect(sheet).toMatchObject({ lost: 100, possible: 8100, provisional: 9900 });
  });

  test('a size that couldn’t be read costs nothing and is still told as unread', () => {
    const events = readAll(rubric).map((event) =>
      event.cell.lineId === 'base' && event.cell.what === 'length'
        ? { ...event, value: { kind: 'unreadable' } as const }
        : event,
    );
    const sheet = predictedSheet(rubric, ownRecordOf(events));
    expect(sheet.lost).toBe(0);
    expect(sheet.unread).toContainEqual({ lineId: 'base', ordinal: 1, what: 'length' });
  });
});
