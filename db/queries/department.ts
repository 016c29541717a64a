import { and, asc, count, desc, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, practicals, rubricVersions, sections, sittings } from '@/db/schema';

const ownerName = sql<string>`${people.givenName} || ' ' || ${people.familyName}`;
const periods = sql<string[]>`coalesce(array_agg(${sections.period} order by ${sections.period})
  filter (where ${sittings.id} is not null), '{}')`;

/**
 * Every published version of the department's practicals that a sitting uses or that is its practical's newest,
 * with the periods it is used in; by title, owner, newest first.
 */
export function selectDepartmentVersions(tx: Transaction, schoolId: string, departmentId: string) {
  const isNewest = sql<boolean>`not exists (select from ${rubricVersions} later
    where later.school_id = ${rubricVersions.schoolId} and later.practical_id = ${rubricVersions.practicalId}
      and later.number > ${rubricVersions.number})`;
  return tx
    .select({
      versionId: rubricVersions.id,
      practicalId: practicals.id,
      title: practicals.title,
      unit: practicals.unit,
      ownerId: practicals.ownerId,
      ownerName,
      number: rubricVersions.number,
      task: rubricVersions.task,
      publishedAt: rubricVersions.publishedAt,
      isNewest,
      sittings: count(sittings.id),
      periods,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .leftJoin(
      sittings,
      and(eq(sittings.schoolId, rubricVersions.schoolId), eq(sittings.rubricVersionId, rubricVersions.id)),
    )
    .leftJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .where(
      and(
        eq(rubricVersions.schoolId, schoolId),
        eq(practicals.departmentId, departmentId),
        or(isNull(practicals.archivedAt), sql`${sittings.id} is not null`),
      ),
    )
    .groupBy(
      rubricVersions.schoolId,
      rubricVersions.id,
      practicals.schoolId,
      practicals.id,
      people.schoolId,
      people.id,
    )
    .having(or(isNewest, sql`count(${sittings.id}) > 0`))
    .orderBy(asc(practicals.title), asc(people.familyName), desc(rubricVersions.number));
}

/** Versions to be compared, in no particular order, with what permission depends on. */
export function selectVersionsById(tx: Transaction, schoolId: string, versionIds: readonly string[]) {
  return tx
    .select({
      schoolId: rubricVersions.schoolId,
      versionId: rubricVersions.id,
      departmentId: practicals.departmentId,
      ownerName,
      familyName: people.familyName,
      number: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
      publishedAt: rubricVersions.publishedAt,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(and(eq(rubricVersions.schoolId, schoolId), inArray(rubricVersions.id, [...versionIds])));
}
