import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  accommodations,
  attempts,
  people,
  practicals,
  rubricVersions,
  scoreSheets,
  sections,
  sittings,
  terms,
} from '@/db/schema';

const ownerName = sql<string>`${people.givenName} || ' ' || ${people.familyName}`;

/** The sittings of a department's sections with the version each stands under, by period. */
export function selectDepartmentSittings(tx: Transaction, schoolId: string, departmentId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      sectionName: sections.name,
      period: sections.period,
      termName: terms.name,
      versionNumber: rubricVersions.number,
      ownerName,
      task: rubricVersions.task,
      rubric: rubricVersions.rubric,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(terms, and(eq(terms.schoolId, sections.schoolId), eq(terms.id, sections.termId)))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(and(eq(sittings.schoolId, schoolId), eq(sections.departmentId, departmentId)))
    .orderBy(
      sql`substring(${sections.period} from '^[0-9]+')::numeric nulls last`,
      asc(sections.period),
      asc(sittings.openedAt),
      asc(sittings.id),
    );
}

/** Of each student in the sittings, the latest attempt that the bench has read to the end and nothing contradicts. */
export async function selectReadAttempts(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  if (sittingIds.length === 0) return [];
  return tx
    .selectDistinctOn([attempts.sittingId, attempts.studentId], {
      sittingId: attempts.sittingId,
      recorded: scoreSheets.recorded,
      modification: accommodations.modification,
    })
    .from(attempts)
    .innerJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .leftJoin(
      accommodations,
      and(
        eq(accommodations.schoolId, scoreSheets.schoolId),
        eq(accommodations.id, scoreSheets.accommodationId),
      ),
    )
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        inArray(attempts.sittingId, [...sittingIds]),
        eq(attempts.standing, 'expected'),
        eq(scoreSheets.complete, true),
        eq(scoreSheets.conflicts, 0),
      ),
    )
    .orderBy(asc(attempts.sittingId), asc(attempts.studentId), desc(attempts.number));
}
