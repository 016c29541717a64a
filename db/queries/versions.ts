import { and, asc, desc, eq, getTableColumns, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, rubricVersions, schools, sectionStaff, sections, sittingMoves, sittings } from '@/db/schema';
import { schoolToday, teacherIds } from './sections';

const publisherName = sql<string>`${people.givenName} || ' ' || ${people.familyName}`;

/** All versions of a practical in full, newest first, each with who published it and how many sittings stand on it. */
export function selectVersionsInFull(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .select({
      ...getTableColumns(rubricVersions),
      publisherName,
      sittings: sql<number>`(select count(*)::int from ${sittings} s
        where s.school_id = ${rubricVersions.schoolId} and s.rubric_version_id = ${rubricVersions.id})`,
    })
    .from(rubricVersions)
    .innerJoin(
      people,
      and(eq(people.schoolId, rubricVersions.schoolId), eq(people.id, rubricVersions.publishedBy)),
    )
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.practicalId, practicalId)))
    .orderBy(desc(rubricVersions.number));
}

/**
 * Who teaches a section today whose sitting stands under a version of the practical, or stood under it before it was moved,
 * with that sitting.
 */
export function selectTeachersUnder(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .selectDistinct({
      versionId: rubricVersions.id,
      personId: sectionStaff.personId,
      sittingId: sittings.id,
      sectionName: sections.name,
      period: sections.period,
      stands: sql<boolean>`${sittings.rubricVersionId} = ${rubricVersions.id}`,
    })
    .from(sittings)
    .innerJoin(
      sectionStaff,
      and(
        eq(sectionStaff.schoolId, sittings.schoolId),
        eq(sectionStaff.sectionId, sittings.sectionId),
        eq(sectionStaff.duty, 'teacher'),
      ),
    )
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .leftJoin(
      sittingMoves,
      and(eq(sittingMoves.schoolId, sittings.schoolId), eq(sittingMoves.sittingId, sittings.id)),
    )
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, sittings.schoolId),
        or(
          eq(rubricVersions.id, sittings.rubricVersionId),
          eq(rubricVersions.id, sittingMoves.fromVersionId),
          eq(rubricVersions.id, sittingMoves.toVersionId),
        ),
      ),
    )
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        eq(sittings.practicalId, practicalId),
        or(isNull(sectionStaff.toDay), sql`${sectionStaff.toDay} >= ${schoolToday}`),
      ),
    )
    .orderBy(asc(sections.period), asc(sections.name));
}

/** The person's own sittings of a practical that stand on an older version than its newest, by period. */
export function selectSittingsBehind(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
  personId: string,
) {
  return tx
    .select({
      sittingId: sittings.id,
      sectionName: sections.name,
      period: sections.period,
      number: rubricVersions.number,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        eq(sittings.practicalId, practicalId),
        isNull(sections.archivedAt),
        sql`${personId}::uuid = any(${teacherIds})`,
        sql`exists (select from ${rubricVersions} newer where newer.school_id = ${sittings.schoolId}
          and newer.practical_id = ${sittings.practicalId} and newer.number > ${rubricVersions.number})`,
      ),
    )
    .orderBy(asc(sections.period), asc(sections.name));
}
