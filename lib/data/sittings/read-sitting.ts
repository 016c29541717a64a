import 'server-only';
import { type AttemptRow, selectAttempts, selectMissingNumbers } from '@/db/queries/attempts';
import { selectPublications } from '@/db/queries/publications';
import { insertMissingAttempts } from '@/db/queries/rounds';
import { selectSitting } from '@/db/queries/sittings';
import { sittingIdInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';

export interface SittingStudentView {
  attemptId: string;
  attemptNumber: number;
  studentId: string;
  familyName: string;
  givenName: string;
  standing: 'expected' | 'absent' | 'excused' | 'zero';
  /** How far the bench has come with the pieces. */
  progress: 'not read' | 'begun' | 'read';
  finished: boolean;
  conflicts: number;
  daysLate: number;
  /** The student has locked a prediction. */
  locked: boolean;
  /** The student's latest attempt, and still in the section: what the desk can change. */
  current: boolean;
}

export interface SittingView {
  sittingId: string;
  title: string;
  practicalId: string;
  sectionId: string;
  sectionName: string;
  period: string;
  termName: string;
  versionNumber: number;
  dueOn: string | null;
  openedAt: string;
  published: boolean;
  publications: { number: number; publishedAt: string }[];
  students: SittingStudentView[];
  today: string;
  timeZone: string;
  /** Readings that a tablet has numbered and that have not arrived, by whose tablet it is. */
  notArrived: { name: string; readings: number }[];
}

/** A sitting with how far it has come. Those who joined since it was opened get their attempt. */
export const readSitting = defineVerb({
  action: 'sitting.read',
  input: sittingIdInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<SittingView> {
    const { schoolId } = actor;
    const { sittingId } = input;
    const sitting = found(await selectSitting(tx, schoolId, sittingId));
    authorize(sectionSubject(sitting));
    if (sitting.state === 'open') await insertMissingAttempts(tx, schoolId, sittingId, sitting.sectionId);
    const rows = await selectAttempts(tx, schoolId, [sittingId]);
    const publications = await selectPublications(tx, schoolId, [sittingId]);
    const missing = await selectMissingNumbers(tx, schoolId, [sittingId]);
    await logView({ subjectKind: 'sitting', subjectId: sittingId, details: { students: rows.length } });
    const { title, practicalId, sectionId, sectionName, period, termName, versionNumber, dueOn } = sitting;
    const shown = rows.filter((row) => row.here || row.recorded !== null || row.standing !== 'expected');
    return {
      sittingId,
      title,
      practicalId,
      sectionId,
      sectionName,
      period,
      termName,
      versionNumber,
      dueOn,
      openedAt: sitting.openedAt.toISOString(),
      published: sitting.state === 'published',
      publications: publications.map(({ number, publishedAt }) => ({
        number,
        publishedAt: publishedAt.toISOString(),
      })),
      students: shown.map((row, index) => asStudent(row, shown[index + 1])),
      today: sitting.today,
      timeZone: sitting.timeZone,
      notArrived: byName(missing),
    };
  },
});

function asStudent(row: AttemptRow, next: AttemptRow | undefined): SittingStudentView {
  const { attemptId, studentId, familyName, givenName, standing, daysLate, here } = row;
  return {
    attemptId,
    attemptNumber: row.number,
    studentId,
    familyName,
    givenName,
    standing,
    daysLate,
    progress: row.measuredAt === null ? 'not read' : row.complete ? 'read' : 'begun',
    finished: row.finished ?? false,
    conflicts: row.conflicts ?? 0,
    locked: row.lockedAt !== null,
    current: here && next?.studentId !== studentId,
  };
}

function byName(missing: readonly { name: string; missing: number }[]): SittingView['notArrived'] {
  const sums = new Map<string, number>();
  for (const row of missing) sums.set(row.name, (sums.get(row.name) ?? 0) + row.missing);
  return [...sums].map(([name, readings]) => ({ name, readings }));
}
