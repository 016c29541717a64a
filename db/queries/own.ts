import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Transaction } from '@/db/client';
import {
  attempts,
  practicals,
  publications,
  readingEvents,
  results,
  rubricVersions,
  sections,
  sittings,
} from '@/db/schema';

const isLatest = sql`not exists (
  select from ${attempts} later
  where later.school_id = ${attempts.schoolId} and later.sitting_id = ${attempts.sittingId}
    and later.student_id = ${attempts.studentId} and later.number > ${attempts.number})`;

/** The number of the student's latest attempt at the sitting that a publication told of. */
const toldAttempt = sql<number | null>`(
  select max(tried.number) from ${results} told join ${attempts} tried
    on tried.school_id = told.school_id and tried.id = told.attempt_id
  where told.school_id = ${attempts.schoolId} and tried.sitting_id = ${attempts.sittingId}
    and tried.student_id = ${attempts.studentId})`;

/** An attempt that was told of keeps the version it was told by, until the next publication; others have the sitting's. */
const versionId = sql<string>`coalesce((
  select by.rubric_version_id from ${results} told join ${publications} by
    on by.school_id = told.school_id and by.id = told.publication_id
  where told.school_id = ${attempts.schoolId} and told.attempt_id = ${attempts.id}
  order by by.number desc limit 1), ${sittings.rubricVersionId})`;

const ofLatestAttempt = {
  schoolId: attempts.schoolId,
  studentId: attempts.studentId,
  attemptId: attempts.id,
  attemptNumber: attempts.number,
  sittingId: sittings.id,
  state: sittings.state,
  dueOn: sittings.dueOn,
  openedAt: sittings.openedAt,
  title: practicals.title,
  sectionName: sections.name,
  period: sections.period,
  toldAttempt,
  versionNumber: rubricVersions.number,
  task: rubricVersions.task,
  form: rubricVersions.form,
  rubric: rubricVersions.rubric,
};

/** The student's latest attempt at each sitting of theirs, with what it asks for; nothing that the bench recorded. */
function latestAttempts(tx: Transaction) {
  return tx
    .select(ofLatestAttempt)
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, versionId)),
    )
    .$dynamic();
}

export function selectOwnAttempts(tx: Transaction, schoolId: string, studentId: string) {
  return latestAttempts(tx)
    .where(and(eq(attempts.schoolId, schoolId), eq(attempts.studentId, studentId), isLatest))
    .orderBy(desc(sittings.openedAt), asc(practicals.title));
}

export async function selectOwnAttempt(
  tx: Transaction,
  schoolId: string,
  studentId: string,
  sittingId: string,
) {
  const [row] = await latestAttempts(tx).where(
    and(
      eq(attempts.schoolId, schoolId),
      eq(attempts.sittingId, sittingId),
      eq(attempts.studentId, studentId),
      isLatest,
    ),
  );
  return row;
}

/** What was recorded on the students' own side of the attempts; never anything of the bench's. */
export function selectOwnEvents(tx: Transaction, schoolId: string, attemptIds: readonly string[]) {
  return tx
    .select({
      id: readingEvents.id,
      attemptId: readingEvents.attemptId,
      side: readingEvents.side,
      lineId: readingEvents.lineId,
      ordinal: readingEvents.ordinal,
      what: readingEvents.what,
      value: readingEvents.value,
      typed: readingEvents.typed,
      unit: readingEvents.unit,
      instrument: readingEvents.instrument,
      supersedes: readingEvents.supersedes,
      capturedAt: readingEvents.capturedAt,
      authorId: readingEvents.authorId,
    })
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        inArray(readingEvents.attemptId, [...attemptIds]),
        eq(readingEvents.side, 'own'),
      ),
    )
    .orderBy(asc(readingEvents.receivedAt), asc(readingEvents.sequence));
}

export type OwnEventRow = Awaited<ReturnType<typeof selectOwnEvents>>[number];

export interface ToldBefore {
  status: 'scored' | 'absent' | 'excused' | 'zero' | 'not read';
  score: number | null;
  total: number;
}

/** What the publication before told of the same attempt; null where there was none. */
const toldBefore = sql<ToldBefore | null>`(
  select json_build_object('status', told.status, 'score', told.score_points, 'total', told.total_points)
  from ${results} told join ${publications} earlier
    on earlier.school_id = told.school_id and earlier.id = told.publication_id
  where told.school_id = ${results.schoolId} and told.attempt_id = ${results.attemptId}
    and earlier.number < ${publications.number}
  order by earlier.number desc limit 1)`;

/** The sittings of a student in which the latest publication told another result than the one before it. */
export async function selectChangedResults(
  tx: Transaction,
  schoolId: string,
  studentId: string,
): Promise<string[]> {
  const rows = await tx
    .selectDistinctOn([attempts.sittingId], {
      sittingId: attempts.sittingId,
      status: results.status,
      score: results.scorePoints,
      total: results.totalPoints,
      before: toldBefore,
    })
    .from(results)
    .innerJoin(attempts, and(eq(attempts.schoolId, results.schoolId), eq(attempts.id, results.attemptId)))
    .innerJoin(
      publications,
      and(eq(publications.schoolId, results.schoolId), eq(publications.id, results.publicationId)),
    )
    .where(and(eq(results.schoolId, schoolId), eq(attempts.studentId, studentId)))
    .orderBy(asc(attempts.sittingId), desc(attempts.number), desc(publications.number));
  return rows.filter(isCorrected).map(({ sittingId }) => sittingId);
}

/** Whether a result says something else than it did before. */
export function isCorrected({ before, ...now }: ToldBefore & { before: ToldBefore | null }): boolean {
  if (before === null) return false;
  return before.status !== now.status || before.score !== now.score || before.total !== now.total;
}

const heldVersion = alias(rubricVersions, 'held_version');

/** What the latest publication said of the student's latest attempt that was published; nothing before the first. */
export async function selectOwnResult(
  tx: Transaction,
  schoolId: string,
  studentId: string,
  sittingId: string,
) {
  const [row] = await tx
    .select({
      schoolId: attempts.schoolId,
      studentId: attempts.studentId,
      attemptNumber: attempts.number,
      sectionName: sections.name,
      period: sections.period,
      status: results.status,
      scorePoints: results.scorePoints,
      totalPoints: results.totalPoints,
      bonusPoints: results.bonusPoints,
      heldPoints: results.heldPoints,
      heldVersionNumber: heldVersion.number,
      accommodationId: results.accommodationId,
      predictedPoints: results.predictedPoints,
      measuredAt: results.measuredAt,
      sheet: results.sheet,
      ownSheet: results.ownSheet,
      judgement: results.judgement,
      publishedAt: publications.publishedAt,
      before: toldBefore,
      versionNumber: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(results)
    .innerJoin(attempts, and(eq(attempts.schoolId, results.schoolId), eq(attempts.id, results.attemptId)))
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(
      publications,
      and(eq(publications.schoolId, results.schoolId), eq(publications.id, results.publicationId)),
    )
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, publications.schoolId),
        eq(rubricVersions.id, publications.rubricVersionId),
      ),
    )
    .leftJoin(
      heldVersion,
      and(eq(heldVersion.schoolId, results.schoolId), eq(heldVersion.id, results.heldVersionId)),
    )
    .where(
      and(
        eq(results.schoolId, schoolId),
        eq(attempts.studentId, studentId),
        eq(attempts.sittingId, sittingId),
      ),
    )
    .orderBy(desc(attempts.number), desc(publications.number))
    .limit(1);
  return row;
}
