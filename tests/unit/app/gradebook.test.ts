import { describe, expect, it } from 'vitest';
import {
  cellSaid,
  isShown,
  notesOf,
  SHOWN,
  type Shown,
  tenthsAsText,
  wordOf,
} from '@/app/(teacher)/gradebook/[sectionId]/_components/cell-words';
import { scaleFrom, spreadOf } from '@/app/(teacher)/gradebook/[sectionId]/_components/spread';
import type { GradebookCell } from '@/lib/contracts/gradebook';

const cell = (more: Partial<GradebookCell> = {}): GradebookCell => ({
  attemptId: 'a',
  attemptNumber: 1,
  published: true,
  status: 'scored',
  score: 8600,
  total: 10_000,
  lost: { under: 0, over: 0, dearestUnder: 0, dearestOver: 0 },
  missing: 0,
  held: 0,
  daysLate: 0,
  notArrived: 0,
  changed: false,
  ...more,
});

describe('a cell of the gradebook', () => {
  it.each([
    [null, 'not given'],
    [cell({ status: 'absent', score: null }), 'absent'],
    [cell({ status: 'not read', score: null }), 'not read'],
    [cell({ status: 'conflict', score: 8600 }), 'two readings'],
    [cell({ status: 'zero', score: 0 }), null],
    [cell(), null],
  ])('has a word only where it has no number', (given, word) => {
    expect(wordOf(given)).toBe(word);
  });

  it('says all of itself to those who hear it', () => {
    expect(
      cellSaid('Quispe, Wayra, Desk caddy', cell({ daysLate: 2, attemptNumber: 2, published: false })),
    ).toBe('Quispe, Wayra, Desk caddy, 86, still being recorded, attempt 2, 2 days late');
    expect(cellSaid('Quispe, Wayra, Desk caddy', cell({ status: 'zero', score: 0 }))).toBe(
      'Quispe, Wayra, Desk caddy, 0, published, a zero',
    );
  });

  it('notes what a reader should know beside the number', () => {
    expect(notesOf(cell({ notArrived: 3, held: 1, missing: 2, daysLate: 1, changed: true }))).toEqual([
      '3 not sent',
      '1 held',
      '2 missing',
      '1 day late',
      'changed since',
    ]);
    expect(notesOf(cell({ status: 'reading' }))).toEqual(['begun']);
  });

  it.each<[Shown, Partial<GradebookCell>]>([
    ['not read', { status: 'reading' }],
    ['two readings', { status: 'conflict' }],
    ['absent', { status: 'absent', score: null }],
    ['excused', { status: 'excused', score: null }],
    ['zero', { status: 'zero', score: 0 }],
    ['late', { daysLate: 1 }],
    ['a redo', { attemptNumber: 2 }],
    ['changed since', { changed: true }],
  ])('is found by “%s” and by nothing else', (shown, more) => {
    const found = SHOWN.filter((each) => isShown([null, cell(more)], each));
    expect(found).toEqual(['everyone', shown]);
  });

  it('writes a mean in tenths', () => {
    expect([857, 1000, 4].map(tenthsAsText)).toEqual(['85.7', '100.0', '0.4']);
  });
});

describe('the picture of a class', () => {
  it.each([
    [[88], { median: 88, low: 88, high: 88 }],
    [[80, 90, 100, 70], { median: 80, low: 70, high: 90 }],
    [[85, 88, 90, 93, 95], { median: 90, low: 88, high: 93 }],
  ])('gives the middle and the middle half of %j by nearest rank', (values, spread) => {
    expect(spreadOf(values)).toEqual(spread);
  });

  it('has neither for nobody', () => {
    expect(spreadOf([])).toBeNull();
  });

  it.each([
    [[], 60],
    [[95, 96, 97], 70],
    [[41, 80, 90], 40],
    [[0, 82, 84, 86, 88, 90, 91, 92, 93, 94, 95], 70],
  ])('begins its scale for %j at %i', (values, from) => {
    expect(scaleFrom(values)).toBe(from);
  });
});
