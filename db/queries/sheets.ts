import { and, asc, eq, not, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { attempts, readingEvents, rubricVersions, scoreSheets, sittings } from '@/db/schema';
import { anyOf } from './any-of';

/** Rows a statement: well under the protocol's 65 535 parameters. */
const CHUNK = 500;

export type EventRow = typeof readingEvents.$inferSelect;
export type SheetRow = typeof scoreSheets.$inferInsert;

/** The attempts named, each with its sitting and the rubric version that it stands under. */
export function selectAttemptVersions(tx: Transaction, schoolId: string, attemptIds: readonly string[]) {
  return tx
    .select({
      attemptId: attempts.id,
      sittingId: attempts.sittingId,
      rubricVersionId: sittings.rubricVersionId,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .where(and(eq(attempts.schoolId, schoolId), anyOf(attempts.id, attemptIds)))
    .orderBy(asc(attempts.id));
}

export function selectAttemptIds(tx: Transaction, schoolId: string, sittingId: string) {
  return tx
    .select({ attemptId: attempts.id })
    .from(attempts)
    .where(and(eq(attempts.schoolId, schoolId), eq(attempts.sittingId, sittingId)))
    .orderBy(asc(attempts.id));
}

export function selectPricedVersions(tx: Transaction, schoolId: string, versionIds: readonly string[]) {
  return tx
    .select({
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(rubricVersions)
    .where(and(eq(rubricVersions.schoolId, schoolId), anyOf(rubricVersions.id, versionIds)));
}

/** Every event of the attempts, in the order they arrived. */
export function selectEventsOf(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
): Promise<EventRow[]> {
  return tx
    .select()
    .from(readingEvents)
    .where(and(eq(readingEvents.schoolId, schoolId), anyOf(readingEvents.attemptId, attemptIds)))
    .orderBy(asc(readingEvents.receivedAt), asc(readingEvents.sequence), asc(readingEvents.id));
}

export async function upsertSheets(tx: Transaction, rows: readonly SheetRow[]): Promise<void> {
  for (let from = 0; from < rows.length; from += CHUNK) {
    await tx
      .insert(scoreSheets)
      .values(rows.slice(from, from + CHUNK))
      .onConflictDoUpdate({
        target: [scoreSheets.schoolId, scoreSheets.attemptId, scoreSheets.side],
        set: {
          rubricVersionId: sql`excluded.rubric_version_id`,
          engineVersion: sql`excluded.engine_version`,
          recorded: sql`excluded.recorded`,
          sheet: sql`excluded.sheet`,
          scorePoints: sql`excluded.score_points`,
          provisionalPoints: sql`excluded.provisional_points`,
          totalPoints: sql`excluded.total_points`,
          heldPoints: sql`excluded.held_points`,
          accommodationId: sql`excluded.accommodation_id`,
          lostPoints: sql`excluded.lost_points`,
          complete: sql`excluded.complete`,
          conflicts: sql`excluded.conflicts`,
          finished: sql`excluded.finished`,
          lockedAt: sql`excluded.locked_at`,
          measuredAt: sql`excluded.measured_at`,
          updatedAt: sql`now()`,
        },
      });
  }
}

/** Sheets of a side that has no events (any more) would be stale; the attempts named keep the sides named. */
export async function deleteOtherSheets(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
  kept: { side: 'bench' | 'own'; attemptIds: readonly string[] },
): Promise<void> {
  await tx
    .delete(scoreSheets)
    .where(
      and(
        eq(scoreSheets.schoolId, schoolId),
        eq(scoreSheets.side, kept.side),
        anyOf(scoreSheets.attemptId, attemptIds),
        not(anyOf(scoreSheets.attemptId, kept.attemptIds)),
      ),
    );
}

export interface StandingRow {
  attemptId: string;
  standing: 'expected' | 'absent' | 'excused' | 'zero';
  daysLate: number;
}

/** Sets what follows from the events of an attempt's own cells, in one statement. */
export async function updateStandings(
  tx: Transaction,
  schoolId: string,
  rows: readonly StandingRow[],
): Promise<void> {
  for (let from = 0; from < rows.length; from += CHUNK) {
    const values = rows
      .slice(from, from + CHUNK)
      .map((row) => sql`(${row.attemptId}::uuid, ${row.standing}::text, ${row.daysLate}::integer)`);
    await tx.execute(sql`
      update ${attempts} as a set standing = v.standing, days_late = v.days_late
      from (values ${sql.join(values, sql`, `)}) as v (id, standing, days_late)
      where a.school_id = ${schoolId} and a.id = v.id
        and (a.standing, a.days_late) is distinct from (v.standing, v.days_late)`);
  }
}
