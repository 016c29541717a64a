import { describe, expect, it } from 'vitest';
import { heldVersions } from '@/lib/data/pricing/held-versions';

const hold = (number: number, fromVersionId: string) => ({ number, fromVersionId, holdHarmless: true });
const asIs = (number: number, fromVersionId: string) => ({ number, fromVersionId, holdHarmless: false });

describe('the versions under which nobody may drop', () => {
  it('keeps the promise of its example', () => {
    expect(heldVersions('v3', [hold(1, 'v1')])).toEqual(['v1']);
  });

  it.each([
    ['no move', 'v1', [], []],
    ['one as it is', 'v2', [asIs(1, 'v1')], []],
    ['two that hold, the latest first', 'v3', [hold(1, 'v1'), hold(2, 'v2')], ['v2', 'v1']],
    ['in any order', 'v3', [hold(2, 'v2'), hold(1, 'v1')], ['v2', 'v1']],
    ['one as it is ends the chain', 'v3', [asIs(1, 'v1'), hold(2, 'v2')], ['v2']],
    ['one as it is after others ends all', 'v3', [hold(1, 'v1'), asIs(2, 'v2')], []],
    ['there and back holds the other alone', 'v1', [hold(1, 'v1'), hold(2, 'v2')], ['v2']],
    ['each once', 'v3', [hold(1, 'v1'), hold(2, 'v2'), hold(3, 'v1'), hold(4, 'v2')], ['v2', 'v1']],
  ])('after %s', (_, version, moves, held) => {
    expect(heldVersions(version, moves)).toEqual(held);
  });

  it('does not change what it was given', () => {
    const moves = [hold(1, 'v1'), hold(2, 'v2')];
    heldVersions('v3', moves);
    expect(moves.map(({ number }) => number)).toEqual([1, 2]);
  });
});
