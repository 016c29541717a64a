import { and, asc, desc, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Transaction } from '@/db/client';
import { people, rubricVersions, sittingMoves, sittings } from '@/db/schema';

/** The moves of the sittings that were not taken back, the first one first. */
export function selectStandingMoves(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  return tx
    .select({
      moveId: sittingMoves.id,
      sittingId: sittingMoves.sittingId,
      number: sittingMoves.number,
      fromVersionId: sittingMoves.fromVersionId,
      toVersionId: sittingMoves.toVersionId,
      holdHarmless: sittingMoves.holdHarmless,
      afterPublication: sittingMoves.afterPublication,
    })
    .from(sittingMoves)
    .where(
      and(
        eq(sittingMoves.schoolId, schoolId),
        inArray(sittingMoves.sittingId, [...sittingIds]),
        isNull(sittingMoves.undoneAt),
      ),
    )
    .orderBy(asc(sittingMoves.sittingId), asc(sittingMoves.number));
}

export type StandingMove = Awaited<ReturnType<typeof selectStandingMoves>>[number];

/** All moves of a sitting with who made and who undid them, the latest first. */
export function selectMoves(tx: Transaction, schoolId: string, sittingId: string) {
  const mover = alias(people, 'mover');
  const undoer = alias(people, 'undoer');
  const from = alias(rubricVersions, 'from_version');
  const to = alias(rubricVersions, 'to_version');
  return tx
    .select({
      moveId: sittingMoves.id,
      number: sittingMoves.number,
      movedAt: sittingMoves.movedAt,
      movedBy: sql<string>`btrim(${mover.givenName} || ' ' || ${mover.familyName})`,
      from: from.number,
      to: to.number,
      holdHarmless: sittingMoves.holdHarmless,
      afterPublication: sittingMoves.afterPublication,
      undoneAt: sittingMoves.undoneAt,
      undoneBy: sql<string | null>`btrim(${undoer.givenName} || ' ' || ${undoer.familyName})`,
    })
    .from(sittingMoves)
    .innerJoin(mover, and(eq(mover.schoolId, sittingMoves.schoolId), eq(mover.id, sittingMoves.movedBy)))
    .leftJoin(undoer, and(eq(undoer.schoolId, sittingMoves.schoolId), eq(undoer.id, sittingMoves.undoneBy)))
    .innerJoin(from, and(eq(from.schoolId, sittingMoves.schoolId), eq(from.id, sittingMoves.fromVersionId)))
    .innerJoin(to, and(eq(to.schoolId, sittingMoves.schoolId), eq(to.id, sittingMoves.toVersionId)))
    .where(and(eq(sittingMoves.schoolId, schoolId), eq(sittingMoves.sittingId, sittingId)))
    .orderBy(desc(sittingMoves.number));
}

/** Every version that the sitting stands or once stood under, undone moves included; the present one first. */
export function selectStoodVersions(tx: Transaction, schoolId: string, sittingId: string) {
  return tx
    .selectDistinct({
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      rubric: rubricVersions.rubric,
      present: sql<boolean>`${rubricVersions.id} = ${sittings.rubricVersionId}`,
    })
    .from(sittings)
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
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)))
    .orderBy(desc(sql`${rubricVersions.id} = ${sittings.rubricVersionId}`), desc(rubricVersions.number));
}

/** The published versions of a practical, whole, the latest first. */
export function selectWholeVersions(tx: Transaction, schoolId: string, practicalId: string) {
  return tx
    .select({
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
      publishedAt: rubricVersions.publishedAt,
    })
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), eq(rubricVersions.practicalId, practicalId)))
    .orderBy(desc(rubricVersions.number));
}

/** Makes the move and takes the sitting there: the one way in which a sitting's version changes. */
export async function insertMove(
  tx: Transaction,
  row: Omit<typeof sittingMoves.$inferInsert, 'number'>,
): Promise<string> {
  const { schoolId, sittingId, toVersionId } = row;
  const last = sql<number>`(select coalesce(max(before.number), 0) + 1 from ${sittingMoves} before
    where before.school_id = ${schoolId} and before.sitting_id = ${sittingId})`;
  const [made] = await tx
    .insert(sittingMoves)
    .values({ ...row, number: last })
    .returning({ id: sittingMoves.id });
  if (!made) throw new Error('The database kept no move.');
  await updateVersion(tx, schoolId, sittingId, toVersionId);
  return made.id;
}

/** Takes a move back: it stays, with who undid it, and the sitting returns to where it came from. */
export async function undoMoveRow(
  tx: Transaction,
  schoolId: string,
  move: Pick<StandingMove, 'moveId' | 'sittingId' | 'fromVersionId'>,
  personId: string,
): Promise<void> {
  await tx
    .update(sittingMoves)
    .set({ undoneBy: personId, undoneAt: sql`now()` })
    .where(and(eq(sittingMoves.schoolId, schoolId), eq(sittingMoves.id, move.moveId)));
  await updateVersion(tx, schoolId, move.sittingId, move.fromVersionId);
}

async function updateVersion(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  rubricVersionId: string,
): Promise<void> {
  await tx
    .update(sittings)
    .set({ rubricVersionId })
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
}
