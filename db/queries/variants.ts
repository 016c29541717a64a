import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { practicalDrafts, practicals, rubricVersions, sections, sittings } from '@/db/schema';

/** The versions of a practical, of which any may be the one that a variant was made from. */
function versionsOf(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .select({ id: rubricVersions.id })
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.practicalId, practicalId)));
}

/** The variants of a practical in the order in which they were made, each with its draft. */
export function selectVariants(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .select({
      practicalId: practicals.id,
      title: practicals.title,
      archivedAt: practicals.archivedAt,
      content: practicalDrafts.content,
      revision: practicalDrafts.revision,
      fromNumber: sql<number>`(select version.number from ${rubricVersions} version
        where version.school_id = ${practicals.schoolId} and version.id = ${practicals.copiedFromVersionId})`,
    })
    .from(practicals)
    .innerJoin(
      practicalDrafts,
      and(eq(practicalDrafts.schoolId, practicals.schoolId), eq(practicalDrafts.practicalId, practicals.id)),
    )
    .where(
      and(
        eq(practicals.schoolId, schoolId),
        eq(practicals.sourceKind, 'variant'),
        inArray(practicals.copiedFromVersionId, versionsOf(tx, schoolId, practicalId)),
      ),
    )
    .orderBy(asc(practicals.createdAt), asc(practicals.title));
}

/** The version of each practical that was published last. */
export function selectLatestVersions(tx: Transaction, schoolId: string, practicalIds: readonly string[]) {
  return tx
    .selectDistinctOn([rubricVersions.practicalId], {
      practicalId: rubricVersions.practicalId,
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), inArray(rubricVersions.practicalId, [...practicalIds])))
    .orderBy(asc(rubricVersions.practicalId), desc(rubricVersions.number));
}

/** The periods that practicals are given to, in their order. */
export function selectPeriodsGiven(tx: Transaction, schoolId: string, practicalIds: readonly string[]) {
  return tx
    .select({
      practicalId: sittings.practicalId,
      sittingId: sittings.id,
      sectionId: sections.id,
      period: sections.period,
      sectionName: sections.name,
      termId: sections.termId,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        inArray(sittings.practicalId, [...practicalIds]),
        isNull(sections.archivedAt),
      ),
    )
    .orderBy(
      sql`substring(${sections.period} from '^[0-9]+')::numeric nulls last`,
      asc(sections.period),
      asc(sections.name),
    );
}

/** Of these practicals the variants, each with the practical that it is one of. */
export function selectOriginals(tx: Transaction, schoolId: string, practicalIds: readonly string[]) {
  return tx
    .select({ practicalId: practicals.id, of: rubricVersions.practicalId })
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
        eq(practicals.sourceKind, 'variant'),
        inArray(practicals.id, [...practicalIds]),
      ),
    );
}
