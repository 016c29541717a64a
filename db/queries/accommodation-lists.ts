import { and, asc, desc, eq, inArray, isNull, or, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Transaction } from '@/db/client';
import {
  accommodationReasons,
  accommodations,
  attempts,
  enrollments,
  people,
  practicals,
  rubricVersions,
  schools,
  scoreSheets,
  sectionStaff,
  sections,
  sittings,
  terms,
} from '@/db/schema';
import { schoolToday } from './sections';

const makers = alias(people, 'makers');
const enders = alias(people, 'enders');

/** Where a modified rubric is at home: the sitting's section, or those of the term that the student is in today. */
const sectionIds = sql<string[]>`(case when ${accommodations.sittingId} is null then array(
    select e.section_id from ${enrollments} e
    join ${sections} s on s.school_id = e.school_id and s.id = e.section_id
    where e.school_id = ${accommodations.schoolId} and e.student_id = ${accommodations.studentId}
      and s.department_id = ${accommodations.departmentId} and s.term_id = ${accommodations.termId}
      and (e.left_on is null or e.left_on > ${schoolToday}))
  else array[${sittings.sectionId}] end)`;

const teacherIds = sql<string[]>`array(
  select distinct staff.person_id from ${sectionStaff} staff
  where staff.school_id = ${accommodations.schoolId} and staff.duty = 'teacher'
    and staff.section_id = any(${sectionIds}) and (staff.to_day is null or staff.to_day >= ${schoolToday}))`;

const fullName = (person: typeof makers | typeof enders) =>
  sql<string | null>`btrim(${person.givenName} || ' ' || ${person.familyName})`;

function accommodationRows(tx: Transaction, where: SQL | undefined) {
  return tx
    .select({
      accommodationId: accommodations.id,
      schoolId: accommodations.schoolId,
      departmentId: accommodations.departmentId,
      termId: accommodations.termId,
      termName: terms.name,
      sittingId: accommodations.sittingId,
      sittingTitle: practicals.title,
      rubric: rubricVersions.rubric,
      studentId: accommodations.studentId,
      familyName: people.familyName,
      givenName: people.givenName,
      modification: accommodations.modification,
      madeBy: sql<string>`btrim(${makers.givenName} || ' ' || ${makers.familyName})`,
      madeAt: accommodations.madeAt,
      endedBy: fullName(enders),
      endedAt: accommodations.endedAt,
      sectionIds,
      teacherIds,
    })
    .from(accommodations)
    .innerJoin(schools, eq(schools.id, accommodations.schoolId))
    .innerJoin(terms, and(eq(terms.schoolId, accommodations.schoolId), eq(terms.id, accommodations.termId)))
    .innerJoin(
      people,
      and(eq(people.schoolId, accommodations.schoolId), eq(people.id, accommodations.studentId)),
    )
    .innerJoin(
      makers,
      and(eq(makers.schoolId, accommodations.schoolId), eq(makers.id, accommodations.madeBy)),
    )
    .leftJoin(
      enders,
      and(eq(enders.schoolId, accommodations.schoolId), eq(enders.id, accommodations.endedBy)),
    )
    .leftJoin(
      sittings,
      and(eq(sittings.schoolId, accommodations.schoolId), eq(sittings.id, accommodations.sittingId)),
    )
    .leftJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .leftJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(where);
}

/** A modified rubric, standing or ended, with the sections it is at home in and their teachers. */
export async function selectAccommodation(tx: Transaction, schoolId: string, accommodationId: string) {
  const [row] = await accommodationRows(
    tx,
    and(eq(accommodations.schoolId, schoolId), eq(accommodations.id, accommodationId)),
  );
  return row;
}

export type AccommodationRow = NonNullable<Awaited<ReturnType<typeof selectAccommodation>>>;

/** Every modified rubric of a department, or of one of its sections, by student, the latest first. */
export function selectAccommodations(
  tx: Transaction,
  schoolId: string,
  { departmentId, sectionId }: { departmentId: string; sectionId?: string },
) {
  return accommodationRows(
    tx,
    and(
      eq(accommodations.schoolId, schoolId),
      eq(accommodations.departmentId, departmentId),
      sectionId === undefined ? undefined : sql`${sectionId}::uuid = any(${sectionIds})`,
    ),
  ).orderBy(
    sql`lower(${people.familyName})`,
    sql`lower(${people.givenName})`,
    asc(people.id),
    desc(accommodations.madeAt),
    asc(accommodations.id),
  );
}

/** For whom, and for what: one sitting, or all of the department's in a term. */
export interface AccommodationScope {
  studentId: string;
  departmentId: string;
  termId: string;
  sittingId: string | null;
}

/** The one that stands, held fast until the transaction ends; a result can point at it all the while. */
export async function lockStanding(tx: Transaction, schoolId: string, scope: AccommodationScope) {
  const { studentId, departmentId, termId, sittingId } = scope;
  const [row] = await tx
    .select({ accommodationId: accommodations.id })
    .from(accommodations)
    .where(
      and(
        eq(accommodations.schoolId, schoolId),
        eq(accommodations.studentId, studentId),
        eq(accommodations.departmentId, departmentId),
        eq(accommodations.termId, termId),
        sittingId === null ? isNull(accommodations.sittingId) : eq(accommodations.sittingId, sittingId),
        isNull(accommodations.endedAt),
      ),
    )
    .for('no key update');
  return row;
}

export async function insertAccommodation(
  tx: Transaction,
  row: typeof accommodations.$inferInsert & { madeBy: string },
  reason: string,
): Promise<string> {
  const [made] = await tx.insert(accommodations).values(row).returning({ id: accommodations.id });
  if (!made) throw new Error('The database kept no modified rubric.');
  await tx
    .insert(accommodationReasons)
    .values({ schoolId: row.schoolId, accommodationId: made.id, reason, writtenBy: row.madeBy });
  return made.id;
}

/** Ends a standing one; false when it had ended already. */
export async function endStanding(
  tx: Transaction,
  schoolId: string,
  accommodationId: string,
  endedBy: string,
): Promise<boolean> {
  const ended = await tx
    .update(accommodations)
    .set({ endedBy, endedAt: sql`now()` })
    .where(
      and(
        eq(accommodations.schoolId, schoolId),
        eq(accommodations.id, accommodationId),
        isNull(accommodations.endedAt),
      ),
    )
    .returning({ id: accommodations.id });
  return ended.length > 0;
}

export async function selectReason(tx: Transaction, schoolId: string, accommodationId: string) {
  const [row] = await tx
    .select({
      reason: accommodationReasons.reason,
      writtenAt: accommodationReasons.writtenAt,
      writtenBy: sql<string>`btrim(${makers.givenName} || ' ' || ${makers.familyName})`,
    })
    .from(accommodationReasons)
    .innerJoin(
      makers,
      and(eq(makers.schoolId, accommodationReasons.schoolId), eq(makers.id, accommodationReasons.writtenBy)),
    )
    .where(
      and(
        eq(accommodationReasons.schoolId, schoolId),
        eq(accommodationReasons.accommodationId, accommodationId),
      ),
    );
  return row;
}

/**
 * The student's attempts that a modified rubric of this scope can price, locked in the order of their ids, as a round
 * that is being recorded locks them.
 */
export async function lockConcerned(
  tx: Transaction,
  schoolId: string,
  { studentId, departmentId, termId, sittingId }: AccommodationScope,
): Promise<string[]> {
  const inScope = tx
    .select({ id: sittings.id })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        sittingId === null
          ? and(eq(sections.departmentId, departmentId), eq(sections.termId, termId))
          : eq(sittings.id, sittingId),
      ),
    );
  const rows = await tx
    .select({ id: attempts.id })
    .from(attempts)
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        eq(attempts.studentId, studentId),
        inArray(attempts.sittingId, inScope),
      ),
    )
    .orderBy(asc(attempts.id))
    .for('update');
  return rows.map(({ id }) => id);
}

/** The sittings of a section with the rubric each of them stands under, the latest first. */
export function selectSectionSittings(tx: Transaction, schoolId: string, sectionId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      title: practicals.title,
      versionNumber: rubricVersions.number,
      rubric: rubricVersions.rubric,
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
    .orderBy(desc(sittings.openedAt), asc(sittings.id));
}

/** What the bench has recorded of one student in these sittings. */
export function selectRecorded(
  tx: Transaction,
  schoolId: string,
  { studentId, sittingIds }: { studentId: string; sittingIds: readonly string[] },
) {
  return tx
    .select({
      attemptId: attempts.id,
      sittingId: attempts.sittingId,
      number: attempts.number,
      recorded: scoreSheets.recorded,
    })
    .from(attempts)
    .innerJoin(
      scoreSheets,
      and(
        eq(scoreSheets.schoolId, attempts.schoolId),
        eq(scoreSheets.attemptId, attempts.id),
        eq(scoreSheets.side, 'bench'),
      ),
    )
    .where(
      and(
        eq(attempts.schoolId, schoolId),
        eq(attempts.studentId, studentId),
        eq(attempts.standing, 'expected'),
        or(sittingIds.length > 0 ? inArray(attempts.sittingId, [...sittingIds]) : sql`false`),
      ),
    )
    .orderBy(asc(attempts.number));
}
