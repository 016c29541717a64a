import { describe, expect, test } from 'vitest';
import type { Cell, CellValue, Side } from '@/lib/sync/cells';
import { refuseCell } from '@/lib/sync/refuse-cell';
import { defaultRubric } from '../../support/rubrics';

const rubric = defaultRubric();
const at = (what: string, lineId = 'end', ordinal = 2): Cell => ({ lineId, ordinal, what });
const own = (what: string): Cell => ({ lineId: '', ordinal: 0, what });
const value: CellValue = { kind: 'value', ticks: 5 };
const level = (n: number): CellValue => ({ kind: 'level', level: n });
const state = (name: 'present' | 'missing' | 'held' | 'excused'): CellValue => ({
  kind: 'state',
  state: name,
});

const KEPT: [Side, Cell, CellValue][] = [
  ['bench', at('length'), value],
  ['bench', at('length'), { kind: 'gauged' }],
  ['bench', at('length'), { kind: 'spoiled' }],
  ['bench', at('length'), { kind: 'cleared' }],
  ['bench', at('piece'), state('held')],
  ['bench', at('piece'), { kind: 'cleared' }],
  ['bench', at('square'), level(1)],
  ['bench', own('labelled'), level(0)],
  ['bench', own('@finish'), { kind: 'finish', done: true }],
  ['bench', own('@zero'), { kind: 'zero', ticks: -3 }],
  ['own', at('length'), value],
  ['own', at('length'), { kind: 'unreadable' }],
  ['own', at('piece'), state('missing')],
  ['own', own('@lock'), { kind: 'lock', locked: true, receipt: '' }],
];

const REFUSED: [Side, Cell, CellValue][] = [
  ['own', at('length'), { kind: 'gauged' }],
  ['own', at('length'), { kind: 'excused' }],
  ['bench', at('length'), { kind: 'unreadable' }],
  ['bench', at('length'), level(0)],
  ['bench', at('length'), state('missing')],
  ['bench', at('piece'), value],
  ['own', at('piece'), state('held')],
  ['bench', at('square'), value],
  ['bench', at('square'), level(2)],
  ['bench', at('polish'), level(0)],
  ['bench', at('length', 'lid', 1), value],
  ['bench', at('length', 'end', 0), value],
  ['bench', at('length', 'end', 3), value],
  ['bench', { lineId: '', ordinal: 1, what: 'labelled' }, level(0)],
  ['bench', own('square'), level(0)],
  ['bench', { lineId: 'end', ordinal: 1, what: '@finish' }, { kind: 'finish', done: true }],
  ['own', own('@finish'), { kind: 'finish', done: true }],
  ['bench', own('@lock'), { kind: 'lock', locked: true, receipt: '' }],
  ['bench', own('@finish'), value],
];

describe('cells of a sitting’s rubric', () => {
  test.each(KEPT)('%s %j holds %j', (side, cell, held) => {
    expect(refuseCell([rubric], side, cell, held)).toBeNull();
  });

  test.each(REFUSED)('%s %j does not hold %j, with a reason', (side, cell, held) => {
    expect(refuseCell([rubric], side, cell, held)).toMatch(/^[A-Z“].*\.$/);
  });
});
