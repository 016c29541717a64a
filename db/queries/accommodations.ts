import { and, asc, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { accommodations, attempts, sections, sittings } from '@/db/schema';
import { anyOf } from './any-of';

/**
 * The modified rubric that stands for each of these attempts, where one does: the sitting's own, or else the one of
 * the student's term in the section's department.
 */
export function selectStandingAccommodations(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
) {
  return tx
    .selectDistinctOn([attempts.id], {
      attemptId: attempts.id,
      accommodationId: accommodations.id,
      modification: accommodations.modification,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(
      accommodations,
      and(
        eq(accommodations.schoolId, attempts.schoolId),
        eq(accommodations.studentId, attempts.studentId),
        isNull(accommodations.endedAt),
        or(
          eq(accommodations.sittingId, sittings.id),
          and(
            isNull(accommodations.sittingId),
            eq(accommodations.departmentId, sections.departmentId),
            eq(accommodations.termId, sections.termId),
          ),
        ),
      ),
    )
    .where(and(eq(attempts.schoolId, schoolId), anyOf(attempts.id, attemptIds)))
    .orderBy(asc(attempts.id), sql`${accommodations.sittingId} nulls last`);
}

/** Modifications by their ids, ended ones too: a result keeps the one that priced it. */
export function selectModifications(tx: Transaction, schoolId: string, accommodationIds: readonly string[]) {
  return tx
    .select({ accommodationId: accommodations.id, modification: accommodations.modification })
    .from(accommodations)
    .where(and(eq(accommodations.schoolId, schoolId), inArray(accommodations.id, [...accommodationIds])));
}
