import { type OwnEvent, type OwnRecord, ownRecordOf } from '@/lib/practicals/own-record';
import { AXES, type Axis, type Rubric } from '@/lib/scoring';
import type { Cell, CellValue } from '@/lib/sync/cells';

let made = 0;

/** An event of a student's own side, changed as the test wants. */
export function ownEvent(cell: Cell, value: CellValue, change: Partial<OwnEvent> = {}): OwnEvent {
  made += 1;
  return {
    id: `00000000-0000-4000-8000-${String(made).padStart(12, '0')}`,
    attemptId: 'attempt',
    side: 'own',
    cell,
    value,
    typed: value.kind === 'value' ? String(value.ticks) : null,
    unit: value.kind === 'value' ? 'in' : null,
    instrument: value.kind === 'value' ? 'rule' : null,
    supersedes: [],
    capturedAt: '2026-12-01T15:00:00.000Z',
    authorId: 'student',
    ...change,
  };
}

export function sizeCell(lineId: string, ordinal: number, axis: Axis): Cell {
  return { lineId, ordinal, what: axis };
}

/** Every size of a rubric read on its target, but for the changes: deviations by "base 1 length". */
export function readAll(rubric: Rubric, off: Record<string, number> = {}): OwnEvent[] {
  return rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => index + 1).flatMap((ordinal) =>
      AXES.map((axis) =>
        ownEvent(sizeCell(line.id, ordinal, axis), {
          kind: 'value',
          ticks: line.target[axis] + (off[`${line.id} ${ordinal} ${axis}`] ?? 0),
        }),
      ),
    ),
  );
}

export function recordOfAll(rubric: Rubric, off: Record<string, number> = {}): OwnRecord {
  return ownRecordOf(readAll(rubric, off));
}
