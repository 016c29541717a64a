import { and, asc, count, desc, eq, inArray, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  accommodations,
  attempts,
  people,
  practicals,
  rubricApprovals,
  rubricVersions,
  scoreSheets,
  sections,
  sittings,
  terms,
} from '@/db/schema';

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
