import { and, asc, desc, eq, isNotNull, isNull, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, practicalDrafts, practicals, rubricVersions, sittings } from '@/db/schema';

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

/** What others of the department have published last and offer, by title. */
export function selectOthersPublished(
  tx: Transaction,
  schoolId: string,
  departmentId: string,
  personId: string,
) {
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
