import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { publications, results, rubricVersions } from '@/db/schema';

/** The publications of the sittings, the latest first. */
export function selectPublications(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  return tx
    .select({
      publicationId: publications.id,
      sittingId: publications.sittingId,
      number: publications.number,
      rubricVersionId: publications.rubricVersionId,
      versionNumber: rubricVersions.number,
      publishedAt: publications.publishedAt,
    })
    .from(publications)
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, publications.schoolId),
        eq(rubricVersions.id, publications.rubricVersionId),
      ),
    )
    .where(and(eq(publications.schoolId, schoolId), inArray(publications.sittingId, [...sittingIds])))
    .orderBy(asc(publications.sittingId), desc(publications.number));
}

export type PublicationRow = Awaited<ReturnType<typeof selectPublications>>[number];

export function selectResults(tx: Transaction, schoolId: string, publicationIds: readonly string[]) {
  return tx
    .select()
    .from(results)
    .where(and(eq(results.schoolId, schoolId), inArray(results.publicationId, [...publicationIds])));
}

export type ResultRow = Awaited<ReturnType<typeof selectResults>>[number];

/** Published when it is written, as events are received. */
export async function insertPublication(
  tx: Transaction,
  row: typeof publications.$inferInsert,
): Promise<string> {
  const [made] = await tx
    .insert(publications)
    .values({ publishedAt: sql`clock_timestamp()`, ...row })
    .returning({ id: publications.id });
  if (!made) throw new Error('The database kept no publication.');
  return made.id;
}

export async function insertResults(
  tx: Transaction,
  rows: readonly (typeof results.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(results).values([...rows]);
}
