import { and, asc, count, desc, eq, inArray, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  enrollments,
  people,
  readingEvents,
  rubricVersions,
  schools,
  sectionStaff,
  sections,
  sittings,
} from '@/db/schema';
import { inSectionToday, schoolToday } from './sections';

/** A sitting with all that permission and recording depend on. */
export async function selectRound(tx: Transaction, schoolId: string, sittingId: string) {
  const [row] = await tx
    .select({
      sittingId: sittings.id,
      schoolId: sittings.schoolId,
      sectionId: sittings.sectionId,
      state: sittings.state,
      sectionName: sections.name,
      period: sections.period,
      departmentId: sections.departmentId,
      schoolName: schools.name,
      timeZone: schools.timeZone,
      versionNumber: rubricVersions.number,
      task: rubricVersions.task,
      rubric: rubricVersions.rubric,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
  return row;
}

/** Who works in the section; an aide's days have come (`begun`) and may be over (`ended`). */
export function selectStaff(tx: Transaction, schoolId: string, sectionId: string) {
  return tx
    .select({
      personId: sectionStaff.personId,
      duty: sectionStaff.duty,
      begun: sql<boolean>`${sectionStaff.fromDay} is null or ${sectionStaff.fromDay} <= ${schoolToday}`,
      ended: sql<boolean>`${sectionStaff.toDay} is not null and ${sectionStaff.toDay} < ${schoolToday}`,
    })
    .from(sectionStaff)
    .innerJoin(schools, eq(schools.id, sectionStaff.schoolId))
    .where(and(eq(sectionStaff.schoolId, schoolId), eq(sectionStaff.sectionId, sectionId)));
}

/** Locks the attempts in the order of their ids, so that two batches that meet wait instead of deadlocking. */
export function lockAttempts(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  attemptIds: readonly string[],
) {
  return tx
    .select({ id: attempts.id, studentId: attempts.studentId })
    .from(attempts)
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        eq(attempts.sittingId, sittingId),
        inArray(attempts.id, [...attemptIds]),
      ),
    )
    .orderBy(asc(attempts.id))
    .for('update');
}

/** Stored events that share an id, or a number of this device, with what has arrived. */
export function selectSameEvents(
  tx: Transaction,
  schoolId: string,
  deviceId: string,
  ids: readonly string[],
  sequences: readonly number[],
) {
  return tx
    .select()
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        or(
          inArray(readingEvents.id, [...ids]),
          and(eq(readingEvents.deviceId, deviceId), inArray(readingEvents.sequence, [...sequences])),
        ),
      ),
    );
}

/**
 * Received when they are written, not when their transaction began: then whether an event had come by a publication,
 * which holds its attempt, can be told from the two moments.
 */
export async function insertEvents(
  tx: Transaction,
  rows: readonly (typeof readingEvents.$inferInsert)[],
): Promise<void> {
  const receivedAt = sql`clock_timestamp()`;
  if (rows.length > 0) await tx.insert(readingEvents).values(rows.map((row) => ({ ...row, receivedAt })));
}

export async function isOwnSitting(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  studentId: string,
): Promise<boolean> {
  const rows = await tx
    .select({ id: attempts.id })
    .from(attempts)
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        eq(attempts.sittingId, sittingId),
        eq(attempts.studentId, studentId),
      ),
    )
    .limit(1);
  return rows.length > 0;
}

/** Whether the sitting has this attempt. Locks nothing: whoever publishes holds the sitting before its attempts. */
export async function hasAttempt(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  attemptId: string,
): Promise<boolean> {
  const rows = await tx
    .select({ id: attempts.id })
    .from(attempts)
    .where(
      and(eq(attempts.schoolId, schoolId), eq(attempts.sittingId, sittingId), eq(attempts.id, attemptId)),
    );
  return rows.length > 0;
}

/** A first attempt for everyone enrolled now who has none, such as those who joined after the sitting was opened. */
export async function insertMissingAttempts(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  sectionId: string,
): Promise<void> {
  await tx.execute(sql`
    insert into ${attempts} (school_id, sitting_id, student_id, number)
    select e.school_id, ${sittingId}, e.student_id, 1
    from ${enrollments} e join ${schools} on schools.id = e.school_id
    where e.school_id = ${schoolId} and e.section_id = ${sectionId}
      and (e.left_on is null or e.left_on > ${schoolToday})
    on conflict (school_id, sitting_id, student_id, number) do nothing`);
}

/** Those enrolled now, in roster order, each with the latest attempt. */
export function selectRoundStudents(tx: Transaction, schoolId: string, sittingId: string, sectionId: string) {
  const latest = tx
    .selectDistinctOn([attempts.studentId], {
      attemptId: attempts.id,
      attemptNumber: attempts.number,
      studentId: attempts.studentId,
    })
    .from(attempts)
    .where(and(eq(attempts.schoolId, schoolId), eq(attempts.sittingId, sittingId)))
    .orderBy(asc(attempts.studentId), desc(attempts.number))
    .as('latest');
  return tx
    .select({
      attemptId: latest.attemptId,
      attemptNumber: latest.attemptNumber,
      studentId: latest.studentId,
      givenName: people.givenName,
      familyName: people.familyName,
    })
    .from(latest)
    .innerJoin(people, and(eq(people.schoolId, schoolId), eq(people.id, latest.studentId)))
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .innerJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.sectionId, sectionId),
        eq(enrollments.studentId, latest.studentId),
        inSectionToday,
      ),
    )
    .orderBy(sql`lower(${people.familyName})`, sql`lower(${people.givenName})`, asc(people.id));
}

/** The bench's own events of the attempts; never what students recorded themselves. */
export function selectBenchEvents(tx: Transaction, schoolId: string, attemptIds: readonly string[]) {
  return tx
    .select()
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        eq(readingEvents.side, 'bench'),
        inArray(readingEvents.attemptId, [...attemptIds]),
      ),
    )
    .orderBy(asc(readingEvents.receivedAt), asc(readingEvents.sequence), asc(readingEvents.id));
}

export function selectNames(tx: Transaction, schoolId: string, personIds: readonly string[]) {
  return tx
    .select({ id: people.id, givenName: people.givenName, familyName: people.familyName })
    .from(people)
    .where(and(eq(people.schoolId, schoolId), inArray(people.id, [...personIds])));
}

export async function countBenchEvents(tx: Transaction, schoolId: string, sittingId: string) {
  const [row] = await tx
    .select({ total: count() })
    .from(readingEvents)
    .where(
      and(
        eq(readingEvents.schoolId, schoolId),
        eq(readingEvents.sittingId, sittingId),
        eq(readingEvents.side, 'bench'),
      ),
    );
  return row?.total ?? 0;
}
