import { and, asc, desc, eq, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  practicals,
  publications,
  readingEvents,
  results,
  rubricVersions,
  scoreSheets,
  sections,
  sittings,
} from '@/db/schema';

/** The sittings of every section the student is in, with the student's latest attempt at each. */
export function selectOwnSittings(tx: Transaction, schoolId: string, studentId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      state: sittings.state,
      dueOn: sittings.dueOn,
      openedAt: sittings.openedAt,
      title: practicals.title,
      sectionName: sections.name,
      period: sections.period,
      attemptId: attempts.id,
      attemptNumber: attempts.number,
      lockedAt: scoreSheets.lockedAt,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .leftJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'own'),
      ),
    )
    .where(and(eq(attempts.schoolId, schoolId), eq(attempts.studentId, studentId), isLatest))
    .orderBy(desc(sittings.openedAt));
}

const isLatest = sql`not exists (
  select from ${attempts} later
  where later.school_id = ${attempts.schoolId} and later.sitting_id = ${attempts.sittingId}
    and later.student_id = ${attempts.studentId} and later.number > ${attempts.number})`;

/** One student's latest attempt at a sitting, with what the sitting asks for. */
export async function selectOwnAttempt(
  tx: Transaction,
  schoolId: string,
  studentId: string,
  sittingId: string,
) {
  const [row] = await tx
    .select({
      schoolId: attempts.schoolId,
      studentId: attempts.studentId,
      attemptId: attempts.id,
      attemptNumber: attempts.number,
      standing: attempts.standing,
      sittingId: sittings.id,
      state: sittings.state,
      dueOn: sittings.dueOn,
      sectionName: sections.name,
      period: sections.period,
      versionNumber: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        eq(attempts.sittingId, sittingId),
        eq(attempts.studentId, studentId),
        isLatest,
      ),
    );
  return row;
}

export function selectOwnEvents(tx: Transaction, schoolId: string, attemptId: string) {
  return tx
    .select({
      id: readingEvents.id,
      side: readingEvents.side,
      lineId: readingEvents.lineId,
      ordinal: readingEvents.ordinal,
      what: readingEvents.what,
      value: readingEvents.value,
      typed: readingEvents.typed,
      unit: readingEvents.unit,
      supersedes: readingEvents.supersedes,
      capturedAt: readingEvents.capturedAt,
      authorId: readingEvents.authorId,
    })
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        eq(readingEvents.attemptId, attemptId),
        eq(readingEvents.side, 'own'),
      ),
    )
    .orderBy(asc(readingEvents.receivedAt), asc(readingEvents.sequence));
}

/** What the latest publication said of this attempt; nothing before the first. */
export async function selectOwnResult(tx: Transaction, schoolId: string, attemptId: string) {
  const [row] = await tx
    .select({
      status: results.status,
      scorePoints: results.scorePoints,
      totalPoints: results.totalPoints,
      bonusPoints: results.bonusPoints,
      predictedPoints: results.predictedPoints,
      measuredAt: results.measuredAt,
      sheet: results.sheet,
      ownSheet: results.ownSheet,
      judgement: results.judgement,
      publishedAt: publications.publishedAt,
      publicationNumber: publications.number,
      versionNumber: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(results)
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
    .where(and(eq(results.schoolId, schoolId), eq(results.attemptId, attemptId)))
    .orderBy(desc(publications.number))
    .limit(1);
  return row;
}
