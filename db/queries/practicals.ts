import { and, count, desc, eq, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { people, practicalDrafts, practicals, rubricVersions, sittings } from '@/db/schema';

export type PracticalRow = typeof practicals.$inferSelect;

export async function selectPractical(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
): Promise<PracticalRow | undefined> {
  const [row] = await tx
    .select()
    .from(practicals)
    .where(and(eq(practicals.schoolId, schoolId), eq(practicals.id, practicalId)));
  return row;
}

/** The same, and nobody else changes the practical, its draft or its versions until the transaction ends. */
export async function lockPractical(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
): Promise<PracticalRow | undefined> {
  const [row] = await tx
    .select()
    .from(practicals)
    .where(and(eq(practicals.schoolId, schoolId), eq(practicals.id, practicalId)))
    .for('update');
  return row;
}

export async function insertPractical(
  tx: Transaction,
  row: typeof practicals.$inferInsert,
  draft: { content: unknown; savedBy: string },
): Promise<string> {
  const [made] = await tx.insert(practicals).values(row).returning({ id: practicals.id });
  if (!made) throw new Error('An inserted practical gave no row back.');
  await tx
    .insert(practicalDrafts)
    .values({ schoolId: row.schoolId, practicalId: made.id, revision: 1, ...draft });
  return made.id;
}

export async function updatePractical(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
  values: Partial<Pick<PracticalRow, 'title' | 'archivedAt' | 'offeredAt' | 'copiedFromVersionId'>>,
): Promise<void> {
  await tx
    .update(practicals)
    .set(values)
    .where(and(eq(practicals.schoolId, schoolId), eq(practicals.id, practicalId)));
}

export async function selectDraft(tx: Transaction, schoolId: string, practicalId: string) {
  const [row] = await tx
    .select({
      content: practicalDrafts.content,
      revision: practicalDrafts.revision,
      savedAt: practicalDrafts.savedAt,
      replaced: practicalDrafts.replaced,
    })
    .from(practicalDrafts)
    .where(and(eq(practicalDrafts.schoolId, schoolId), eq(practicalDrafts.practicalId, practicalId)));
  return row;
}

/** Keeps the draft under the next revision and gives it back; nothing when `revision` is no longer the kept one. */
export async function updateDraft(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
  revision: number,
  kept: { content: unknown; savedBy: string; replaced?: unknown },
) {
  const [row] = await tx
    .update(practicalDrafts)
    .set({ ...kept, revision: revision + 1, savedAt: sql`now()` })
    .where(
      and(
        eq(practicalDrafts.schoolId, schoolId),
        eq(practicalDrafts.practicalId, practicalId),
        eq(practicalDrafts.revision, revision),
      ),
    )
    .returning({ revision: practicalDrafts.revision, savedAt: practicalDrafts.savedAt });
  return row;
}

/** What a draft had replaced can no longer be put back. */
export async function forgetReplaced(tx: Transaction, schoolId: string, practicalId: string): Promise<void> {
  await tx
    .update(practicalDrafts)
    .set({ replaced: null })
    .where(and(eq(practicalDrafts.schoolId, schoolId), eq(practicalDrafts.practicalId, practicalId)));
}

export async function selectLatestVersion(tx: Transaction, schoolId: string, practicalId: string) {
  const [row] = await tx
    .select()
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.practicalId, practicalId)))
    .orderBy(desc(rubricVersions.number))
    .limit(1);
  return row;
}

export async function insertVersion(
  tx: Transaction,
  row: typeof rubricVersions.$inferInsert,
): Promise<string> {
  const [made] = await tx.insert(rubricVersions).values(row).returning({ id: rubricVersions.id });
  if (!made) throw new Error('An inserted version gave no row back.');
  return made.id;
}

/** A version with what permission to read it depends on. */
export async function selectVersion(tx: Transaction, schoolId: string, versionId: string) {
  const [row] = await tx
    .select({
      schoolId: rubricVersions.schoolId,
      versionId: rubricVersions.id,
      practicalId: rubricVersions.practicalId,
      departmentId: practicals.departmentId,
      ownerId: practicals.ownerId,
      offeredAt: practicals.offeredAt,
      number: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
      publishedAt: rubricVersions.publishedAt,
      ownerName: ownerName,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.id, versionId)));
  return row;
}

const ownerName = sql<string>`${people.givenName} || ' ' || ${people.familyName}`;

/** The versions of a practical, newest first, with the number of sittings on each. */
export function selectVersions(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .select({
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      publishedAt: rubricVersions.publishedAt,
      sittings: count(sittings.id),
    })
    .from(rubricVersions)
    .leftJoin(
      sittings,
      and(eq(sittings.schoolId, rubricVersions.schoolId), eq(sittings.rubricVersionId, rubricVersions.id)),
    )
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.practicalId, practicalId)))
    .groupBy(rubricVersions.id, rubricVersions.number, rubricVersions.publishedAt)
    .orderBy(desc(rubricVersions.number));
}
