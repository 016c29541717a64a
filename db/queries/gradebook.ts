import { and, asc, desc, eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { exportFiles, people, practicals, rubricVersions, sittings } from '@/db/schema';

/** The sittings of a section, the first one first, with the versions they stand under. */
export function selectSittingsOf(tx: Transaction, schoolId: string, sectionId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      title: practicals.title,
      state: sittings.state,
      openedAt: sittings.openedAt,
      rubricVersionId: sittings.rubricVersionId,
      versionNumber: rubricVersions.number,
    })
    .from(sittings)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.sectionId, sectionId)))
    .orderBy(asc(sittings.openedAt), asc(sittings.id));
}

export async function selectVersion(tx: Transaction, schoolId: string, versionId: string) {
  const [row] = await tx
    .select({
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.id, versionId)));
  return row;
}

const FILE = {
  fileId: exportFiles.id,
  schoolId: exportFiles.schoolId,
  sectionId: exportFiles.sectionId,
  kind: exportFiles.kind,
  fileName: exportFiles.fileName,
  storageKey: exportFiles.storageKey,
  sha256: exportFiles.sha256,
  byteCount: exportFiles.byteCount,
  rowCount: exportFiles.rowCount,
  exportedAt: exportFiles.exportedAt,
  givenName: people.givenName,
  familyName: people.familyName,
};

/** The last files that went out of a section, the latest first. */
export function selectFiles(tx: Transaction, schoolId: string, sectionId: string, most: number) {
  return tx
    .select(FILE)
    .from(exportFiles)
    .innerJoin(people, and(eq(people.schoolId, exportFiles.schoolId), eq(people.id, exportFiles.exportedBy)))
    .where(and(eq(exportFiles.schoolId, schoolId), eq(exportFiles.sectionId, sectionId)))
    .orderBy(desc(exportFiles.exportedAt), desc(exportFiles.id))
    .limit(most);
}

export async function selectFile(tx: Transaction, schoolId: string, fileId: string) {
  const [row] = await tx
    .select(FILE)
    .from(exportFiles)
    .innerJoin(people, and(eq(people.schoolId, exportFiles.schoolId), eq(people.id, exportFiles.exportedBy)))
    .where(and(eq(exportFiles.schoolId, schoolId), eq(exportFiles.id, fileId)));
  return row;
}

export async function insertFile(tx: Transaction, row: typeof exportFiles.$inferInsert): Promise<string> {
  const [made] = await tx.insert(exportFiles).values(row).returning({ id: exportFiles.id });
  if (!made) throw new Error('The database kept no file.');
  return made.id;
}
