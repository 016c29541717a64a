import { and, asc, desc, eq, isNotNull, isNull, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, practicalDrafts, practicals, rubricApprovals, rubricVersions, sittings } from '@/db/schema';

const approvedNumber = sql<number | null>`(select version.number from ${rubricApprovals} approval
  join ${rubricVersions} version
    on version.school_id = approval.school_id and version.id = approval.rubric_version_id
  where approval.school_id = ${practicals.schoolId} and approval.practical_id = ${practicals.id}
    and approval.ended_at is null)`;

const approvedVersionId = sql<
  string | null
>`(select approval.rubric_version_id from ${rubricApprovals} approval
  where approval.school_id = ${practicals.schoolId} and approval.practical_id = ${practicals.id}
    and approval.ended_at is null)`;

const ownerName = sql<string>`${people.givenName} || ' ' || ${people.familyName}`;

/** The latest published version of each practical. */
function latestVersions(tx: Transaction, schoolId: string) {
  return tx
    .selectDistinctOn([rubricVersions.practicalId], {
      practicalId: rubricVersions.practicalId,
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      task: rubricVersions.task,
      publishedAt: rubricVersions.publishedAt,
    })
    .from(rubricVersions)
    .where(eq(rubricVersions.schoolId, schoolId))
    .orderBy(asc(rubricVersions.practicalId), desc(rubricVersions.number))
    .as('latest');
}

/** One's own practicals, the one kept last first. */
export function selectOwnPracticals(
  tx: Transaction,
  schoolId: string,
  ownerId: string,
  { archived }: { archived: boolean },
) {
  const latest = latestVersions(tx, schoolId);
  return tx
    .select({
      practicalId: practicals.id,
      title: practicals.title,
      unit: practicals.unit,
      content: practicalDrafts.content,
      savedAt: practicalDrafts.savedAt,
      versionId: latest.versionId,
      number: latest.number,
      publishedAt: latest.publishedAt,
      offeredAt: practicals.offeredAt,
      copiedFromVersionId: practicals.copiedFromVersionId,
      sourceKind: practicals.sourceKind,
      approvedNumber,
      sittings: sql<number>`(select count(*)::int from ${sittings} s
        where s.school_id = ${practicals.schoolId} and s.practical_id = ${practicals.id})`,
    })
    .from(practicals)
    .innerJoin(
      practicalDrafts,
      and(eq(practicalDrafts.schoolId, practicals.schoolId), eq(practicalDrafts.practicalId, practicals.id)),
    )
    .leftJoin(latest, eq(latest.practicalId, practicals.id))
    .where(
      and(
        eq(practicals.schoolId, schoolId),
        eq(practicals.ownerId, ownerId),
        archived ? isNotNull(practicals.archivedAt) : isNull(practicals.archivedAt),
      ),
    )
    .orderBy(desc(practicalDrafts.savedAt));
}

/** What others of the department offer, each as it was published last, by title. */
export function selectOffered(tx: Transaction, schoolId: string, departmentId: string, personId: string) {
  const latest = latestVersions(tx, schoolId);
  return tx
    .select({
      practicalId: practicals.id,
      unit: practicals.unit,
      ownerName,
      versionId: latest.versionId,
      number: latest.number,
      task: latest.task,
      publishedAt: latest.publishedAt,
      approvedNumber,
      approvedVersionId,
      /** A copy of any of its versions that the person has already and has not put away. */
      taken: sql<boolean>`exists (select from ${practicals} mine
        join ${rubricVersions} version
          on version.school_id = mine.school_id and version.id = mine.copied_from_version_id
        where mine.school_id = ${practicals.schoolId} and mine.owner_id = ${personId}
          and mine.archived_at is null and version.practical_id = ${practicals.id})`,
    })
    .from(practicals)
    .innerJoin(latest, eq(latest.practicalId, practicals.id))
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(
      and(
        eq(practicals.schoolId, schoolId),
        eq(practicals.departmentId, departmentId),
        ne(practicals.ownerId, personId),
        isNotNull(practicals.offeredAt),
        isNull(practicals.archivedAt),
      ),
    )
    .orderBy(asc(practicals.title));
}
