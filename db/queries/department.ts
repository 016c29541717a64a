import { and, asc, count, desc, eq, inArray, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, practicals, rubricApprovals, rubricVersions, sections, sittings } from '@/db/schema';

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
      differenceReason: rubricVersions.differenceReason,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(and(eq(rubricVersions.schoolId, schoolId), inArray(rubricVersions.id, [...versionIds])));
}

/** Every version of the practicals that a department is offered, or of which it approved one; the newest first. */
export function selectSharedVersions(tx: Transaction, schoolId: string, departmentId: string) {
  const approved = sql`exists (select from ${rubricApprovals} approval
    where approval.school_id = ${practicals.schoolId} and approval.practical_id = ${practicals.id}
      and approval.ended_at is null)`;
  return tx
    .select({
      versionId: rubricVersions.id,
      practicalId: practicals.id,
      unit: practicals.unit,
      offeredAt: practicals.offeredAt,
      ownerName,
      number: rubricVersions.number,
      task: rubricVersions.task,
      publishedAt: rubricVersions.publishedAt,
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
        or(isNotNull(practicals.offeredAt), approved),
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
    .orderBy(asc(practicals.title), asc(people.familyName), asc(practicals.id), desc(rubricVersions.number));
}

/** How many practicals were taken from any version of each practical and are in use. */
export async function countTaken(tx: Transaction, schoolId: string): Promise<Map<string, number>> {
  const rows = await tx
    .select({ practicalId: rubricVersions.practicalId, copies: count(practicals.id) })
    .from(practicals)
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, practicals.schoolId),
        eq(rubricVersions.id, practicals.copiedFromVersionId),
      ),
    )
    .where(
      and(
        eq(practicals.schoolId, schoolId),
        eq(practicals.sourceKind, 'adopted'),
        isNull(practicals.archivedAt),
      ),
    )
    .groupBy(rubricVersions.practicalId);
  return new Map(rows.map(({ practicalId, copies }) => [practicalId, copies]));
}
