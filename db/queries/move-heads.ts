import { type AnyColumn, and, asc, eq, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Transaction } from '@/db/client';
import { attempts, enrollments, people, results, schools, scoreSheets, sittings } from '@/db/schema';
import { anyOf } from './any-of';
import { schoolToday } from './sections';

/**
 * Every attempt of a sitting with what its stored score follows from, without the readings; roster order, then the
 * attempt's number.
 */
export function selectMoveHeads(tx: Transaction, schoolId: string, sittingId: string) {
  const own = alias(scoreSheets, 'own_sheets');
  return tx
    .select({
      attemptId: attempts.id,
      studentId: attempts.studentId,
      attemptNumber: attempts.number,
      standing: attempts.standing,
      familyName: people.familyName,
      givenName: people.givenName,
      here: sql<boolean>`${enrollments.studentId} is not null and (${enrollments.leftOn} is null or ${enrollments.leftOn} > ${schoolToday})`,
      versionId: scoreSheets.rubricVersionId,
      engineVersion: scoreSheets.engineVersion,
      accommodationId: scoreSheets.accommodationId,
      scorePoints: scoreSheets.scorePoints,
      totalPoints: scoreSheets.totalPoints,
      conflicts: scoreSheets.conflicts,
      lockedAt: own.lockedAt,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(schools, eq(schools.id, attempts.schoolId))
    .innerJoin(people, and(eq(people.schoolId, attempts.schoolId), eq(people.id, attempts.studentId)))
    .leftJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, attempts.schoolId),
        eq(enrollments.sectionId, sittings.sectionId),
        eq(enrollments.studentId, attempts.studentId),
      ),
    )
    .leftJoin(scoreSheets, sheetOf(scoreSheets, 'bench'))
    .leftJoin(own, sheetOf(own, 'own'))
    .where(and(eq(attempts.schoolId, schoolId), eq(attempts.sittingId, sittingId)))
    .orderBy(
      sql`lower(${people.familyName})`,
      sql`lower(${people.givenName})`,
      asc(people.id),
      asc(attempts.number),
    );
}

export type MoveHead = Awaited<ReturnType<typeof selectMoveHeads>>[number];

function sheetOf(sheets: Record<'schoolId' | 'attemptId' | 'side', AnyColumn>, side: 'bench' | 'own') {
  return and(
    eq(sheets.schoolId, attempts.schoolId),
    eq(sheets.attemptId, attempts.id),
    eq(sheets.side, side),
  );
}

/** What is recorded on one side of the attempts; those without anything are left out. */
export function selectRecorded(
  tx: Transaction,
  schoolId: string,
  side: 'bench' | 'own',
  attemptIds: readonly string[],
) {
  return tx
    .select({ attemptId: scoreSheets.attemptId, recorded: scoreSheets.recorded })
    .from(scoreSheets)
    .where(
      and(
        eq(scoreSheets.schoolId, schoolId),
        eq(scoreSheets.side, side),
        anyOf(scoreSheets.attemptId, attemptIds),
      ),
    );
}

/** What a publication told of each attempt, in numbers. */
export function selectToldNumbers(tx: Transaction, schoolId: string, publicationId: string) {
  return tx
    .select({
      attemptId: results.attemptId,
      scorePoints: results.scorePoints,
      bonusPoints: results.bonusPoints,
    })
    .from(results)
    .where(and(eq(results.schoolId, schoolId), eq(results.publicationId, publicationId)));
}
