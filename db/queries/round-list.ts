import { and, asc, count, desc, eq, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  enrollments,
  practicals,
  rubricVersions,
  schools,
  scoreSheets,
  sectionStaff,
  sections,
  sittings,
} from '@/db/schema';
import { inSectionToday, schoolToday } from './sections';

/** A redo counts in place of the attempt before it. */
const isLatestAttempt = sql`not exists (
  select from ${attempts} later
  where later.school_id = ${attempts.schoolId} and later.sitting_id = ${attempts.sittingId}
    and later.student_id = ${attempts.studentId} and later.number > ${attempts.number})`;

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
    .innerJoin(sittings, and(eq(sittings.schoolId, attempts.schoolId), eq(sittings.id, attempts.sittingId)))
    .innerJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, attempts.schoolId),
        eq(enrollments.sectionId, sittings.sectionId),
        eq(enrollments.studentId, attempts.studentId),
      ),
    )
    .innerJoin(schools, eq(schools.id, attempts.schoolId))
    .leftJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .where(and(eq(attempts.schoolId, schoolId), inSectionToday, isLatestAttempt))
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
    .orderBy(asc(sittings.state), asc(sections.period), asc(sections.name), desc(sittings.openedAt));
}
