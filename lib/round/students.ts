import { listUnread } from './cursor';
import { listPieces } from './pieces';
import { pieceStateAt, recordOf, valueAt } from './record';
import type { RoundState, Student } from './types';

export interface StudentStatus {
  student: Student;
  sizes: number;
  unread: number;
  /** Checks that nobody recorded and the rubric does not assume. */
  openChecks: number;
  held: number;
  conflicts: number;
  finished: boolean;
  standing: 'expected' | 'absent' | 'excused' | 'zero';
  /** Something was recorded. */
  begun: boolean;
  skipped: boolean;
  elsewhere: boolean;
}

/** How far a student has come, without any score. */
export function studentStatus(state: RoundState, student: Student): StudentStatus {
  const { rubric } = state.plan;
  const record = recordOf(state, student.attemptId);
  const pieces = listPieces(rubric);
  return {
    student,
    sizes: pieces.length * 3,
    unread: listUnread(rubric, record).length,
    openChecks: countOpenChecks(state, student),
    held: pieces.filter(({ line, ordinal }) => pieceStateAt(record, { lineId: line.id, ordinal }) === 'held')
      .length,
    conflicts: record.derived.conflicts.length,
    finished: record.derived.finished,
    standing: record.derived.standing,
    begun: record.derived.measuredAt !== null,
    skipped: state.skipped.includes(student.attemptId),
    elsewhere: state.elsewhere.includes(student.attemptId),
  };
}

function countOpenChecks(state: RoundState, student: Student): number {
  const { rubric } = state.plan;
  const record = recordOf(state, student.attemptId);
  const open = listPieces(rubric).flatMap(({ line, ordinal }) => {
    if (pieceStateAt(record, { lineId: line.id, ordinal }) !== 'present') return [];
    return line.checks.filter(
      ({ id, assume }) => assume === null && valueAt(record, { lineId: line.id, ordinal, what: id }) === null,
    );
  });
  const work = rubric.workChecks.filter(
    ({ id, assume }) => assume === null && valueAt(record, { lineId: '', ordinal: 0, what: id }) === null,
  );
  return open.length + work.length;
}

function isDone(state: RoundState, status: StudentStatus): boolean {
  if (status.standing !== 'expected' || status.finished) return true;
  return !state.plan.mayFinish && status.unread === 0;
}

/**
 * The next present student who still has something to be done, after the one in hand and going round; one who is in
 * another's hands comes last. Null when the round is done.
 */
export function nextStudent(state: RoundState): Student | null {
  const { students } = state.plan;
  const here = students.findIndex(({ attemptId }) => attemptId === state.attemptId);
  const others = [...students.slice(here + 1), ...students.slice(0, Math.max(here, 0))];
  const waiting = others
    .map((student) => studentStatus(state, student))
    .filter((status) => !isDone(state, status));
  return (waiting.find(({ elsewhere }) => !elsewhere) ?? waiting[0])?.student ?? null;
}

export function fullName(student: Student): string {
  return `${student.givenName} ${student.familyName}`.trim();
}
