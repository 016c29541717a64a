import { and, asc, count, desc, eq, gt, inArray, isNotNull, isNull, ne, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  enrollments,
  inHand,
  people,
  practicals,
  readingEvents,
  rubricVersions,
  schools,
  scoreSheets,
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

export async function insertEvents(
  tx: Transaction,
  rows: readonly (typeof readingEvents.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(readingEvents).values([...rows]);
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

/** A device that has not been heard of for this long has put the pieces down. */
const IN_HAND_FOR = sql`interval '2 minutes'`;

export function selectInHand(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  exceptDevice: string | null,
) {
  return tx
    .select({
      attemptId: inHand.attemptId,
      deviceId: inHand.deviceId,
      since: inHand.since,
      givenName: people.givenName,
      familyName: people.familyName,
    })
    .from(inHand)
    .innerJoin(people, and(eq(people.schoolId, inHand.schoolId), eq(people.id, inHand.personId)))
    .where(
      and(
        eq(inHand.schoolId, schoolId),
        eq(inHand.sittingId, sittingId),
        exceptDevice === null ? undefined : ne(inHand.deviceId, exceptDevice),
        gt(inHand.seenAt, sql`now() - ${IN_HAND_FOR}`),
      ),
    )
    .orderBy(asc(inHand.since), asc(inHand.deviceId));
}

export async function upsertInHand(tx: Transaction, row: typeof inHand.$inferInsert): Promise<void> {
  await tx
    .insert(inHand)
    .values(row)
    .onConflictDoUpdate({
      target: [inHand.schoolId, inHand.sittingId, inHand.deviceId],
      set: {
        personId: sql`excluded.person_id`,
        attemptId: sql`excluded.attempt_id`,
        since: sql`case when ${inHand.attemptId} = excluded.attempt_id then ${inHand.since} else now() end`,
        seenAt: sql`now()`,
      },
    });
}

export async function deleteInHand(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  deviceId: string,
): Promise<void> {
  await tx
    .delete(inHand)
    .where(
      and(eq(inHand.schoolId, schoolId), eq(inHand.sittingId, sittingId), eq(inHand.deviceId, deviceId)),
    );
}

/** Open sittings of the sections in which the person works today in that duty, with how far each has come. */
export function selectRounds(tx: Transaction, schoolId: string, personId: string, duty: 'teacher' | 'aide') {
  const enrolled = tx
    .select({ sectionId: enrollments.sectionId, students: count().as('students') })
    .from(enrollments)
    .innerJoin(schools, eq(schools.id, enrollments.schoolId))
    .where(and(eq(enrollments.schoolId, schoolId), inSectionToday))
    .groupBy(enrollments.sectionId)
    .as('enrolled');
  const progress = tx
    .select({
      sittingId: attempts.sittingId,
      finished: sql<number>`count(*) filter (where ${scoreSheets.finished})::int`.as('finished'),
      begun:
        sql<number>`count(*) filter (where not ${scoreSheets.finished} and ${isNotNull(scoreSheets.measuredAt)})::int`.as(
          'begun',
        ),
      absent: sql<number>`count(*) filter (where ${attempts.standing} = 'absent')::int`.as('absent'),
      conflicts: sql<number>`coalesce(sum(${scoreSheets.conflicts}), 0)::int`.as('conflicts'),
    })
    .from(attempts)
    .leftJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .where(eq(attempts.schoolId, schoolId))
    .groupBy(attempts.sittingId)
    .as('progress');
  return tx
    .select({
      sittingId: sittings.id,
      title: practicals.title,
      sectionName: sections.name,
      period: sections.period,
      state: sittings.state,
      dueOn: sittings.dueOn,
      openedAt: sittings.openedAt,
      versionNumber: rubricVersions.number,
      students: sql<number>`coalesce(${enrolled.students}, 0)::int`,
      finished: sql<number>`coalesce(${progress.finished}, 0)`,
      begun: sql<number>`coalesce(${progress.begun}, 0)`,
      absent: sql<number>`coalesce(${progress.absent}, 0)`,
      conflicts: sql<number>`coalesce(${progress.conflicts}, 0)`,
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
    .innerJoin(
      sectionStaff,
      and(
        eq(sectionStaff.schoolId, sittings.schoolId),
        eq(sectionStaff.sectionId, sittings.sectionId),
        eq(sectionStaff.personId, personId),
        eq(sectionStaff.duty, duty),
        or(isNull(sectionStaff.fromDay), sql`${sectionStaff.fromDay} <= ${schoolToday}`),
        or(isNull(sectionStaff.toDay), sql`${sectionStaff.toDay} >= ${schoolToday}`),
      ),
    )
    .leftJoin(enrolled, eq(enrolled.sectionId, sections.id))
    .leftJoin(progress, eq(progress.sittingId, sittings.id))
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        isNull(sections.archivedAt),
        duty === 'aide' ? eq(sittings.state, 'open') : undefined,
      ),
    )
    .orderBy(desc(sittings.state), asc(sections.period), asc(sections.name), desc(sittings.openedAt));
}
