import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  enrollments,
  people,
  practicals,
  readingEvents,
  rubricVersions,
  schools,
  scoreSheets,
  sections,
  sittings,
  terms,
} from '@/db/schema';
import { inSectionToday, schoolToday, teacherIds } from './sections';

/** A sitting with its section, its version and what permission depends on. */
export async function selectSitting(tx: Transaction, schoolId: string, sittingId: string) {
  const [row] = await tx
    .select({
      sittingId: sittings.id,
      schoolId: sittings.schoolId,
      sectionId: sittings.sectionId,
      practicalId: sittings.practicalId,
      rubricVersionId: sittings.rubricVersionId,
      state: sittings.state,
      dueOn: sittings.dueOn,
      openedAt: sittings.openedAt,
      sectionName: sections.name,
      period: sections.period,
      departmentId: sections.departmentId,
      termName: terms.name,
      timeZone: schools.timeZone,
      today: sql<string>`${schoolToday}::text`,
      title: practicals.title,
      versionNumber: rubricVersions.number,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
      teacherIds,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(terms, and(eq(terms.schoolId, sections.schoolId), eq(terms.id, sections.termId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
  return row;
}

export type SittingRow = NonNullable<Awaited<ReturnType<typeof selectSitting>>>;

/** Two that publish the same sitting, or publish and change it, go one after the other. */
export async function lockSitting(tx: Transaction, schoolId: string, sittingId: string): Promise<void> {
  await tx
    .select({ id: sittings.id })
    .from(sittings)
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)))
    .for('update');
}

/** Published versions of a department's practicals in use: a person's own first, the latest of each first. */
export function selectVersionsToGive(
  tx: Transaction,
  schoolId: string,
  { departmentId, personId }: { departmentId: string; personId: string },
) {
  return tx
    .select({
      versionId: rubricVersions.id,
      practicalId: practicals.id,
      title: practicals.title,
      number: rubricVersions.number,
      publishedAt: rubricVersions.publishedAt,
      own: sql<boolean>`${practicals.ownerId} = ${personId}`,
      ownerName: sql<string>`btrim(${people.givenName} || ' ' || ${people.familyName})`,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(
      and(
        eq(rubricVersions.schoolId, schoolId),
        eq(practicals.departmentId, departmentId),
        isNull(practicals.archivedAt),
      ),
    )
    .orderBy(
      desc(sql`${practicals.ownerId} = ${personId}`),
      asc(sql`lower(${practicals.title})`),
      asc(practicals.id),
      desc(rubricVersions.number),
    );
}

/** The practicals that each of these sections already has. */
export function selectGivenPracticals(tx: Transaction, schoolId: string, sectionIds: readonly string[]) {
  return tx
    .select({ sectionId: sittings.sectionId, practicalId: sittings.practicalId, sittingId: sittings.id })
    .from(sittings)
    .where(and(eq(sittings.schoolId, schoolId), inArray(sittings.sectionId, [...sectionIds])));
}

export async function insertSitting(tx: Transaction, row: typeof sittings.$inferInsert): Promise<string> {
  const [made] = await tx.insert(sittings).values(row).returning({ id: sittings.id });
  if (!made) throw new Error('The database kept no sitting.');
  return made.id;
}

export async function updateSitting(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  values: { dueOn?: string | null; state?: 'open' | 'published' },
): Promise<void> {
  await tx
    .update(sittings)
    .set(values)
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
}

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

/** The sittings of the sections that a person teaches, the open ones first, by period. */
export function selectSittingsOfTeacher(tx: Transaction, schoolId: string, personId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      sectionId: sections.id,
      title: practicals.title,
      sectionName: sections.name,
      period: sections.period,
      versionNumber: rubricVersions.number,
      dueOn: sittings.dueOn,
      state: sittings.state,
      timeZone: schools.timeZone,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        isNull(sections.archivedAt),
        sql`${personId}::uuid = any(${teacherIds})`,
      ),
    )
    .orderBy(
      asc(sittings.state),
      sql`substring(${sections.period} from '^[0-9]+')::numeric nulls last`,
      asc(sections.period),
      asc(sections.name),
      desc(sittings.openedAt),
    );
}

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
