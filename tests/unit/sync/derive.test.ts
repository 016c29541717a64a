import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { CellValue } from '@/lib/sync/cells';
import { type CellEvent, deriveAttempt, deriveCells } from '@/lib/sync/derive';

const LENGTH = { lineId: 'base', ordinal: 1, what: 'length' };

function event(id: string, value: CellValue, change: Partial<CellEvent> = {}): CellEvent {
  return {
    id,
    side: 'bench',
    cell: LENGTH,
    value,
    supersedes: [],
    capturedAt: `2026-12-01T15:00:0${id.length % 10}.000Z`,
    authorId: 'teacher',
    ...change,
  };
}

const GAUGED: CellValue = { kind: 'gauged' };
const SPOILED: CellValue = { kind: 'spoiled' };
const value = (ticks: number): CellValue => ({ kind: 'value', ticks });
const own = (what: string) => ({ lineId: '', ordinal: 0, what });

function standing(events: CellEvent[]) {
  return deriveCells(events, 'bench').get('base/1/length');
}

describe('the state of a cell', () => {
  test('is the event that no other replaces, whatever the clocks say', () => {
    const old = event('a', value(1), { capturedAt: '2030-01-01T00:00:00.000Z' });
    const later = event('b', value(2), { supersedes: ['a'], capturedAt: '2001-01-01T00:00:00.000Z' });
    expect(standing([later, old])?.value).toEqual(value(2));
  });

  test('two that replace nothing, or the same one, stand against each other, whoever made them', () => {
    expect(standing([event('a', value(1)), event('b', value(2))])).toMatchObject({ value: null });
    const fork = [
      event('a', value(1)),
      event('b', value(2), { supersedes: ['a'] }),
      event('c', value(3), { supersedes: ['a'] }),
    ];
    expect(standing(fork)?.heads.map(({ id }) => id)).toEqual(['b', 'c']);
  });

  test('equal values merge, key order aside; a chosen one settles', () => {
    const held = { kind: 'state', state: 'held', note: 'x' } as const;
    const same = { note: 'x', state: 'held', kind: 'state' } as const;
    expect(standing([event('a', held), event('b', same)])?.value).toEqual(held);
    const settled = [
      event('a', GAUGED),
      event('b', SPOILED),
      event('c', SPOILED, { supersedes: ['a', 'b'] }),
    ];
    expect(standing(settled)?.value).toEqual(SPOILED);
  });

  test('an event that names one not arrived yet stands; two that name each other both stand', () => {
    expect(standing([event('b', GAUGED, { supersedes: ['not here'] })])?.value).toEqual(GAUGED);
    const circle = [event('a', GAUGED, { supersedes: ['b'] }), event('b', SPOILED, { supersedes: ['a'] })];
    expect(standing(circle)?.heads).toHaveLength(2);
  });

  test('neither the order of arrival nor repeats change what is derived', () => {
    const ids = ['a', 'b', 'c', 'd', 'e', 'f'];
    const events = fc.tuple(
      ...ids.map((id, index) =>
        fc.record({
          id: fc.constant(id),
          value: fc.constantFrom(GAUGED, SPOILED, value(1), value(2), { kind: 'cleared' } as const),
          supersedes: fc.subarray(ids.slice(0, index)),
          what: fc.constantFrom('length', 'width'),
        }),
      ),
    );
    fc.assert(
      fc.property(events, fc.infiniteStream(fc.nat()), (drawn, random) => {
        const made = drawn.map(({ id, value: held, supersedes, what }) =>
          event(id, held, { supersedes, cell: { ...LENGTH, what } }),
        );
        const shuffled = [...made, ...made]
          .map((each) => ({ each, at: random.next().value }))
          .sort((a, b) => a.at - b.at)
          .map(({ each }) => each);
        const heads = (events: CellEvent[]) =>
          [...deriveCells(events, 'bench')]
            .map(([key, state]) => [
              key,
              state.heads
                .map(({ id }) => id)
                .sort()
                .join(),
              state.value,
            ])
            .sort();
        expect(heads(shuffled)).toEqual(heads(made));
      }),
    );
  });

  test('the student’s own side and the bench never meet', () => {
    const events = [event('a', value(1)), event('b', value(2), { side: 'own', supersedes: ['a'] })];
    expect(standing(events)?.value).toEqual(value(1));
    expect(deriveAttempt(events, 'own').attempt.pieces).toMatchObject([{ sizes: { length: value(2) } }]);
  });
});

describe('an attempt from its events', () => {
  test('has pieces, checks, work, standing, lateness, finish and receipt', () => {
    const events = [
      event('a', value(7)),
      event('b', { kind: 'level', level: 1 }, { cell: { ...LENGTH, what: 'square' } }),
      event('c', { kind: 'level', level: 0 }, { cell: own('labelled') }),
      event('d', { kind: 'standing', standing: 'absent' }, { cell: own('@standing') }),
      event('e', { kind: 'days-late', days: 3 }, { cell: own('@days-late') }),
      event('f', { kind: 'finish', done: true }, { cell: own('@finish') }),
      event('g', { kind: 'receipt', receipt: 'ABCD-EFGH' }, { cell: own('@receipt') }),
    ];
    expect(deriveAttempt(events, 'bench')).toMatchObject({
      attempt: {
        pieces: [
          {
            lineId: 'base',
            ordinal: 1,
            state: 'present',
            sizes: { length: value(7) },
            checks: { square: 1 },
          },
        ],
        work: { labelled: 0 },
        daysLate: 3,
      },
      standing: 'absent',
      finished: true,
      receiptTaken: 'ABCD-EFGH',
      conflicts: [],
    });
  });

  test('a cell in conflict is not read; what was taken back leaves no trace', () => {
    const torn = deriveAttempt([event('a', value(1)), event('b', value(2))], 'bench');
    expect(torn).toMatchObject({ conflicts: [LENGTH], attempt: { pieces: [] } });
    const back = [event('a', value(1)), event('b', { kind: 'cleared' }, { supersedes: ['a'] })];
    expect(deriveAttempt(back, 'bench')).toMatchObject({ conflicts: [], attempt: { pieces: [] } });
  });

  test('zero checks stand beside each other and are no conflict', () => {
    const zeros = [1, 2].map((ticks) => event(`z${ticks}`, { kind: 'zero', ticks }, { cell: own('@zero') }));
    expect(deriveAttempt(zeros, 'bench')).toMatchObject({ conflicts: [], measuredAt: null });
  });

  test('called missing at one bench and measured at another is a conflict of the piece; on the own side it is not', () => {
    const piece = { ...LENGTH, what: 'piece' };
    const events = [event('a', value(1)), event('b', { kind: 'state', state: 'missing' }, { cell: piece })];
    expect(deriveAttempt(events, 'bench').conflicts).toEqual([piece]);
    const own = events.map((each) => ({ ...each, side: 'own' as const }));
    expect(deriveAttempt(own, 'own').conflicts).toEqual([]);
  });
});
