import { describe, expect, test } from 'vitest';
import { predictedSheet } from '@/lib/practicals/own-record';
import { recordOf, sheetOf } from '@/lib/round/record';
import { withEvents } from '@/lib/round/record-events';
import { startRound } from '@/lib/round/start-round';
import { nextStudent, studentStatus } from '@/lib/round/students';
import { hasCell } from '@/lib/sync/cells';
import { pressesOf } from '@/lib/sync/client/presses-of';
import { planFor, STUDENTS, TestBench } from '@/tests/support/bench';
import { recordOfAll } from '@/tests/support/own-readings';
import { defaultRubric } from '@/tests/support/rubrics';

const full = defaultRubric();
const fewer = { ...full, lines: full.lines.filter(({ id }) => id !== 'divider'), workChecks: [] };

/** A bench under the full rubric on which everything of the first student was recorded. */
function recordedBench(): TestBench {
  const bench = new TestBench(planFor(full));
  bench.tap({ do: 'rest-ok' });
  bench.tap({ do: 'all-good' });
  return bench;
}

describe('events of what the bundle’s rubric does not ask for', () => {
  test('are left aside at the bench, which counts and prices the rest', () => {
    const { made } = recordedBench();
    const state = startRound(planFor(fewer), made);
    const [student] = STUDENTS;
    if (!student) throw new Error('there is a student');
    expect(studentStatus(state, student)).toMatchObject({ unread: 0, conflicts: 0, sizes: 15 });
    expect(sheetOf(fewer, recordOf(state, student.attemptId))).toMatchObject({ complete: true, lost: 0 });
    const known = [...state.events.values()].flat();
    expect(known.length).toBeLessThan(made.length);
    expect(known.every(({ cell }) => hasCell(fewer, cell))).toBe(true);
    expect(nextStudent(state)?.attemptId).toBe(STUDENTS[1]?.attemptId);
  });

  test('neither tear a student’s work nor stand in the way of going on', () => {
    const { made } = recordedBench();
    const again = made
      .filter(({ cell }) => cell.lineId === 'divider' && cell.what === 'length')
      .map((event, at) => ({
        ...event,
        id: `10000000-0000-4000-8000-${String(at).padStart(12, '0')}`,
        value: { kind: 'spoiled' as const },
      }));
    const state = withEvents(startRound(planFor(fewer), made), again);
    const [student] = STUDENTS;
    if (!student) throw new Error('there is a student');
    expect(studentStatus(state, student).conflicts).toBe(0);
    const there = withEvents(startRound(planFor(full), made), again);
    expect(studentStatus(there, student).conflicts).toBe(4);
  });

  test('a place on a piece that is gone is not returned to, and its presses are not undone', () => {
    const { made } = recordedBench();
    const left = {
      attemptId: STUDENTS[1]?.attemptId ?? '',
      spot: { lineId: 'divider', ordinal: 1, axis: 'width' as const },
      order: 'piece' as const,
      skipped: [],
    };
    expect(startRound(planFor(full), made, left).spot).toEqual(left.spot);
    expect(startRound(planFor(fewer), made, left).spot).toEqual({
      lineId: 'base',
      ordinal: 1,
      axis: 'thickness',
    });
    const ofDivider = made.filter(({ cell }) => cell.lineId === 'divider');
    const stored = [
      { id: 'all', attemptId: left.attemptId, events: made },
      { id: 'gone', attemptId: left.attemptId, events: ofDivider },
    ];
    expect(pressesOf(full, stored).map(({ id }) => id)).toEqual(['all', 'gone']);
    const presses = pressesOf(fewer, stored);
    expect(presses.map(({ id }) => id)).toEqual(['all']);
    expect(presses[0]?.eventIds).toHaveLength(made.filter(({ cell }) => hasCell(fewer, cell)).length);
  });

  test('do not break what a student’s own readings are predicted to score', () => {
    const sheet = predictedSheet(fewer, recordOfAll(full));
    expect(sheet.pieces).toHaveLength(5);
    expect(sheet.lost).toBe(0);
  });

  test('a rubric has its cells and no others', () => {
    const at = (lineId: string, ordinal: number, what: string) => hasCell(full, { lineId, ordinal, what });
    expect([at('end', 2, 'width'), at('end', 1, 'piece'), at('end', 1, 'square')]).toEqual([
      true,
      true,
      true,
    ]);
    expect([at('', 0, 'labelled'), at('', 0, '@lock')]).toEqual([true, true]);
    expect([at('end', 3, 'width'), at('end', 0, 'width'), at('lid', 1, 'width')]).toEqual([
      false,
      false,
      false,
    ]);
    expect([at('end', 1, 'polish'), at('', 1, 'labelled'), at('', 0, 'width')]).toEqual([
      false,
      false,
      false,
    ]);
  });
});
