import { and, asc, eq, inArray, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  credentials,
  enrollments,
  people,
  personRoles,
  schools,
  sectionStaff,
  sittings,
} from '@/db/schema';
import { inSectionToday } from './sections';

const isStaff = sql<boolean>`exists (
  select from ${personRoles} held
  where held.school_id = ${people.schoolId} and held.person_id = ${people.id} and held.role <> 'student')`;

/** Everybody who is or was in the section, by name. */
export function selectRoster(tx: Transaction, schoolId: string, sectionId: string) {
  return tx
    .select({
      studentId: people.id,
      localId: people.localId,
      familyName: people.familyName,
      givenName: people.givenName,
      joinedOn: enrollments.joinedOn,
      leftOn: enrollments.leftOn,
      here: sql<boolean>`${inSectionToday}`,
      leftSchool: sql<boolean>`${people.leftAt} is not null`,
      isStaff,
      mustChange: credentials.mustChange,
    })
    .from(enrollments)
    .innerJoin(schools, eq(schools.id, enrollments.schoolId))
    .innerJoin(people, and(eq(people.schoolId, enrollments.schoolId), eq(people.id, enrollments.studentId)))
    .leftJoin(
      credentials,
      and(eq(credentials.schoolId, people.schoolId), eq(credentials.personId, people.id)),
    )
    .where(and(eq(enrollments.schoolId, schoolId), eq(enrollments.sectionId, sectionId)))
    .orderBy(sql`lower(${people.familyName})`, sql`lower(${people.givenName})`, asc(people.id));
}

/** Whoever of the school has one of these IDs or is, or was, in the section; `mine` as the teacher's own sections go. */
export function selectKnownPeople(
  tx: Transaction,
  schoolId: string,
  { sectionId, teacherId, localIds }: { sectionId: string; teacherId: string; localIds: readonly string[] },
) {
  const mine = sql<boolean>`exists (
    select from ${enrollments} e
    join ${sectionStaff} s on s.school_id = e.school_id and s.section_id = e.section_id and s.duty = 'teacher'
    where e.school_id = ${people.schoolId} and e.student_id = ${people.id} and s.person_id = ${teacherId})`;
  return tx
    .select({
      personId: people.id,
      localId: people.localId,
      familyName: people.familyName,
      givenName: people.givenName,
      left: sql<boolean>`${people.leftAt} is not null`,
      isStaff,
      mine,
      joinedOn: enrollments.joinedOn,
      here: sql<boolean>`${enrollments.studentId} is not null and ${inSectionToday}`,
    })
    .from(people)
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .leftJoin(
      enrollments,
      and(
        eq(enrollments.schoolId, people.schoolId),
        eq(enrollments.studentId, people.id),
        eq(enrollments.sectionId, sectionId),
      ),
    )
    .where(
      and(
        eq(people.schoolId, schoolId),
        or(
          localIds.length > 0 ? inArray(people.localId, [...localIds]) : sql`false`,
          sql`${enrollments.studentId} is not null`,
        ),
      ),
    )
    .orderBy(asc(people.id));
}

/** Rosters of one school change one after the other, so that an ID is made once. */
export async function lockRosters(tx: Transaction, schoolId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`rosters of ${schoolId}`}, 0))`);
}

/** The IDs of the school that the product may have made. */
export async function selectMadeIds(tx: Transaction, schoolId: string): Promise<string[]> {
  const rows = await tx
    .select({ localId: people.localId })
    .from(people)
    .where(and(eq(people.schoolId, schoolId), sql`${people.localId} ~ '^W[0-9]+$'`));
  return rows.flatMap(({ localId }) => localId ?? []);
}

export interface NewStudent {
  personId: string;
  localId: string;
  familyName: string;
  givenName: string;
}

export async function insertStudents(
  tx: Transaction,
  schoolId: string,
  students: readonly NewStudent[],
): Promise<void> {
  if (students.length === 0) return;
  await tx
    .insert(people)
    .values(students.map(({ personId: id, ...student }) => ({ schoolId, id, ...student })));
  await insertStudentRoles(
    tx,
    schoolId,
    students.map(({ personId }) => personId),
  );
}

/** Whoever joins a section is a student of the school. */
export async function insertStudentRoles(
  tx: Transaction,
  schoolId: string,
  personIds: readonly string[],
): Promise<void> {
  if (personIds.length === 0) return;
  await tx
    .insert(personRoles)
    .values(personIds.map((personId) => ({ schoolId, personId, role: 'student' as const })))
    .onConflictDoNothing();
}

/** Puts people into the section from today on; those who left it are back, with their first day kept. */
export async function enrollToday(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
  { studentIds, today }: { studentIds: readonly string[]; today: string },
): Promise<void> {
  if (studentIds.length === 0) return;
  await tx
    .insert(enrollments)
    .values(studentIds.map((studentId) => ({ schoolId, sectionId, studentId, joinedOn: today })))
    .onConflictDoUpdate({
      target: [enrollments.schoolId, enrollments.sectionId, enrollments.studentId],
      set: { leftOn: null },
    });
}

export async function selectEnrollment(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
  studentId: string,
) {
  const [row] = await tx
    .select({
      studentId: enrollments.studentId,
      joinedOn: enrollments.joinedOn,
      leftOn: enrollments.leftOn,
      familyName: people.familyName,
      givenName: people.givenName,
    })
    .from(enrollments)
    .innerJoin(people, and(eq(people.schoolId, enrollments.schoolId), eq(people.id, enrollments.studentId)))
    .where(
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.sectionId, sectionId),
        eq(enrollments.studentId, studentId),
      ),
    );
  return row;
}

export async function updateLeftOn(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
  { studentId, leftOn }: { studentId: string; leftOn: string | null },
): Promise<void> {
  await tx
    .update(enrollments)
    .set({ leftOn })
    .where(
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.sectionId, sectionId),
        eq(enrollments.studentId, studentId),
      ),
    );
}

export async function updateStudent(
  tx: Transaction,
  schoolId: string,
  personId: string,
  values: { familyName?: string; givenName?: string; localId?: string },
): Promise<void> {
  await tx
    .update(people)
    .set(values)
    .where(and(eq(people.schoolId, schoolId), eq(people.id, personId)));
}

/** A first attempt, in every open sitting of the section, for those who are in it today and have none. */
export async function insertAttemptsInOpenSittings(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
): Promise<void> {
  await tx.execute(sql`
    insert into ${attempts} (school_id, sitting_id, student_id, number)
    select ${enrollments.schoolId}, ${sittings.id}, ${enrollments.studentId}, 1
    from ${enrollments}
    join ${schools} on ${schools.id} = ${enrollments.schoolId}
    join ${sittings} on ${sittings.schoolId} = ${enrollments.schoolId}
      and ${sittings.sectionId} = ${enrollments.sectionId} and ${sittings.state} = 'open'
    where ${enrollments.schoolId} = ${schoolId} and ${enrollments.sectionId} = ${sectionId} and ${inSectionToday}
    on conflict (school_id, sitting_id, student_id, number) do nothing`);
}
