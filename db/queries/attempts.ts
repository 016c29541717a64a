import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { attempts, enrollments, people, readingEvents, schools, scoreSheets, sittings } from '@/db/schema';
import { inSectionToday, schoolToday } from './sections';

/** Every attempt of the sittings with its student and both sheets; roster order, then the attempt's number. */
export function selectAttempts(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  const own = tx
    .select({
      attemptId: scoreSheets.attemptId,
      recorded: scoreSheets.recorded,
      sheet: scoreSheets.sheet,
      provisionalPoints: scoreSheets.provisionalPoints,
      lockedAt: scoreSheets.lockedAt,
    })
    .from(scoreSheets)
    .where(and(eq(scoreSheets.schoolId, schoolId), eq(scoreSheets.side, 'own')))
    .as('own_sheets');
  return tx
    .select({
      attemptId: attempts.id,
      sittingId: attempts.sittingId,
      number: attempts.number,
      studentId: attempts.studentId,
      standing: attempts.standing,
      daysLate: attempts.daysLate,
      familyName: people.familyName,
      givenName: people.givenName,
      localId: people.localId,
      here: sql<boolean>`${enrollments.studentId} is not null and (${enrollments.leftOn} is null or ${enrollments.leftOn} > ${schoolToday})`,
      recorded: scoreSheets.recorded,
      sheet: scoreSheets.sheet,
      scorePoints: scoreSheets.scorePoints,
      provisionalPoints: scoreSheets.provisionalPoints,
      totalPoints: scoreSheets.totalPoints,
      heldPoints: scoreSheets.heldPoints,
      accommodationId: scoreSheets.accommodationId,
      complete: scoreSheets.complete,
      conflicts: scoreSheets.conflicts,
      finished: scoreSheets.finished,
      measuredAt: scoreSheets.measuredAt,
      ownRecorded: own.recorded,
      ownSheet: own.sheet,
      ownProvisional: own.provisionalPoints,
      lockedAt: own.lockedAt,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(schools, eq(schools.id, attempts.schoolId))
    .innerJoin(people, and(eq(people.schoolId, attempts.schoolId), eq(people.id, attempts.studentId)))
    .leftJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, attempts.schoolId),
        eq(enrollments.sectionId, sittings.sectionId),
        eq(enrollments.studentId, attempts.studentId),
      ),
    )
    .leftJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .leftJoin(own, eq(own.attemptId, attempts.id))
    .where(and(eq(attempts.schoolId, schoolId), inArray(attempts.sittingId, [...sittingIds])))
    .orderBy(
      sql`lower(${people.familyName})`,
      sql`lower(${people.givenName})`,
      asc(people.id),
      asc(attempts.number),
    );
}

export type AttemptRow = Awaited<ReturnType<typeof selectAttempts>>[number];

/** How far each sitting has come, by the latest attempt of everyone who is in its section today. */
export async function selectProgress(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  if (sittingIds.length === 0) return [];
  const current = tx
    .selectDistinctOn([attempts.sittingId, attempts.studentId], {
      sittingId: attempts.sittingId,
      attemptId: attempts.id,
      standing: attempts.standing,
    })
    .from(attempts)
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(schools, eq(schools.id, attempts.schoolId))
    .innerJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, attempts.schoolId),
        eq(enrollments.sectionId, sittings.sectionId),
        eq(enrollments.studentId, attempts.studentId),
        inSectionToday,
      ),
    )
    .where(and(eq(attempts.schoolId, schoolId), inArray(attempts.sittingId, [...sittingIds])))
    .orderBy(asc(attempts.sittingId), asc(attempts.studentId), desc(attempts.number))
    .as('current');
  const expected = sql`${current.standing} = 'expected'`;
  return tx
    .select({
      sittingId: current.sittingId,
      away: sql<number>`(count(*) filter (where ${current.standing} in ('absent', 'excused')))::int`,
      read: sql<number>`(count(*) filter (where ${current.standing} = 'zero' or (${expected} and ${scoreSheets.complete})))::int`,
      begun: sql<number>`(count(*) filter (where ${expected} and not ${scoreSheets.complete} and ${scoreSheets.measuredAt} is not null))::int`,
      conflicts: sql<number>`coalesce(sum(${scoreSheets.conflicts}), 0)::int`,
      students: sql<number>`count(*)::int`,
    })
    .from(current)
    .leftJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, schoolId),
        eq(scoreSheets.attemptId, current.attemptId),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .groupBy(current.sittingId);
}

/** The lock cells of a sitting's own sides, with what the server noted about them. */
export function selectLockEvents(tx: Transaction, schoolId: string, sittingId: string) {
  return tx
    .select()
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        eq(readingEvents.sittingId, sittingId),
        eq(readingEvents.side, 'own'),
        eq(readingEvents.what, '@lock'),
      ),
    );
}

/**
 * Numbers that a device of the bench has used for readings that have not arrived, where the next one that did is in
 * one of these sittings. `sameAttempt`: both neighbours are of one attempt, so what is missing is too.
 */
export async function selectMissingNumbers(tx: Transaction, schoolId: string, sittingIds: readonly string[]) {
  if (sittingIds.length === 0) return [];
  const inThese = sql.join(
    sittingIds.map((id) => sql`${id}::uuid`),
    sql`, `,
  );
  const rows = await tx.execute<{
    sitting_id: string;
    attempt_id: string;
    same_attempt: boolean | null;
    missing: number;
    given_name: string;
    family_name: string;
  }>(sql`
    with numbered as (
      select sitting_id, attempt_id, author_id, side,
        sequence - coalesce(lag(sequence) over device, 0) - 1 as missing,
        lag(attempt_id) over device = attempt_id as same_attempt
      from ${readingEvents}
      where school_id = ${schoolId} and device_id in (
        select device_id from ${readingEvents}
        where school_id = ${schoolId} and side = 'bench' and sitting_id in (${inThese}))
      window device as (partition by device_id order by sequence))
    select n.sitting_id, n.attempt_id, n.same_attempt, n.missing::int, p.given_name, p.family_name
    from numbered n join ${people} p on p.school_id = ${schoolId} and p.id = n.author_id
    where n.missing > 0 and n.side = 'bench' and n.sitting_id in (${inThese})`);
  return rows.map((row) => ({
    sittingId: row.sitting_id,
    attemptId: row.attempt_id,
    sameAttempt: row.same_attempt === true,
    missing: row.missing,
    name: `${row.given_name} ${row.family_name}`.trim(),
  }));
}

/** The desk of one person counts its events like a device; two acts of that person go one after the other. */
export async function nextSequence(tx: Transaction, schoolId: string, deviceId: string): Promise<number> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`desk ${schoolId} ${deviceId}`}, 0))`);
  const [row] = await tx
    .select({ last: sql<number>`coalesce(max(${readingEvents.sequence}), 0)` })
    .from(readingEvents)
    .where(and(eq(readingEvents.schoolId, schoolId), eq(readingEvents.deviceId, deviceId)));
  return (row?.last ?? 0) + 1;
}

export async function insertAttempt(tx: Transaction, row: typeof attempts.$inferInsert): Promise<string> {
  const [made] = await tx.insert(attempts).values(row).returning({ id: attempts.id });
  if (!made) throw new Error('The database kept no attempt.');
  return made.id;
}
