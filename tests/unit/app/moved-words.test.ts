import { describe, expect, it } from 'vitest';
import { sayMoved, standingMove } from '@/app/(teacher)/sittings/[sittingId]/_components/moved-words';
import type { MoveMade } from '@/lib/contracts/moves';

const made = (number: number, more: Partial<MoveMade> = {}): MoveMade => ({
  moveId: `move ${number}`,
  number,
  movedAt: '2026-12-01T15:00:00.000Z',
  movedBy: 'Rut Lindqvist',
  from: number,
  to: number + 1,
  holdHarmless: false,
  undone: null,
  canUndo: false,
  ...more,
});

const UNDONE = { at: '2026-12-01T16:00:00.000Z', by: 'Rut Lindqvist' };

const version = (number: number) => ({ versionId: 'v', number, publishedAt: '2026-12-01T08:00:00.000Z' });

describe('where a sitting stands', () => {
  it('is its version, with where it was moved from and whether nobody drops', () => {
    expect(sayMoved({ version: version(1), moves: [] })).toBe('version 1');
    expect(sayMoved({ version: version(2), moves: [made(1)] })).toBe('version 2, moved from 1');
    expect(sayMoved({ version: version(2), moves: [made(1, { holdHarmless: true })] })).toBe(
      'version 2, moved from 1, nobody drops',
    );
  });

  it('goes by the latest move that was not taken back', () => {
    const moves = [made(2, { undone: UNDONE }), made(1)];
    expect(standingMove({ moves })?.number).toBe(1);
    expect(sayMoved({ version: version(1), moves: [made(1, { undone: UNDONE })] })).toBe('version 1');
  });
});
