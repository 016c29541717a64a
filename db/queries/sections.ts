import { and, asc, desc, eq, inArray, isNull, or, type SQL, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  attempts,
  credentials,
  departments,
  enrollments,
  people,
  personRoles,
  schools,
  sectionStaff,
  sections,
  sittings,
  terms,
} from '@/db/schema';

/** Today by the school's own clock. */
export const schoolToday = sql`(now() at time zone ${schools.timeZone})::date`;

/** In the section today: the day somebody leaves on is the first without them. */
export const inSectionToday = or(isNull(enrollments.leftOn), sql`${enrollments.leftOn} > ${schoolToday}`);

/** The teachers of a section, but those whose days there are over; where sections and schools are joined. */
export const teacherIds = sql<string[]>`array(
  select staff.person_id from ${sectionStaff} staff
  where staff.school_id = ${sections.schoolId} and staff.section_id = ${sections.id} and staff.duty = 'teacher'
    and (staff.to_day is null or staff.to_day >= ${schoolToday}))`;

const studentCount = sql<number>`(
  select count(*)::int from ${enrollments} joined
  where joined.school_id = ${sections.schoolId} and joined.section_id = ${sections.id}
    and (joined.left_on is null or joined.left_on > ${schoolToday}))`;

const SECTION = {
  sectionId: sections.id,
  schoolId: sections.schoolId,
  departmentId: sections.departmentId,
  name: sections.name,
  period: sections.period,
  termId: terms.id,
  termName: terms.name,
  termStartsOn: terms.startsOn,
  termEndsOn: terms.endsOn,
  teacherIds,
  studentCount,
  today: sql<string>`${schoolToday}::text`,
};

function sectionRows(tx: Transaction, where: SQL | undefined) {
  return tx
    .select({ ...SECTION, timeZone: schools.timeZone, schoolName: schools.name, unit: schools.unit })
    .from(sections)
    .innerJoin(schools, eq(schools.id, sections.schoolId))
    .innerJoin(terms, and(eq(terms.schoolId, sections.schoolId), eq(terms.id, sections.termId)))
    .where(where);
}

/** A section with its term, its teachers and the school's clock. */
export async function selectSection(tx: Transaction, schoolId: string, sectionId: string) {
  const [row] = await sectionRows(tx, and(eq(sections.schoolId, schoolId), eq(sections.id, sectionId)));
  return row;
}

export type SectionRow = NonNullable<Awaited<ReturnType<typeof selectSection>>>;

export interface SectionScope {
  teacherId?: string;
  departmentId?: string;
}

/** Sections in use, the latest term first, by period; of one teacher, of one department, or all of the school. */
export function selectSections(tx: Transaction, schoolId: string, { teacherId, departmentId }: SectionScope) {
  return sectionRows(
    tx,
    and(
      eq(sections.schoolId, schoolId),
      isNull(sections.archivedAt),
      teacherId === undefined ? undefined : sql`${teacherId}::uuid = any(${teacherIds})`,
      departmentId === undefined ? undefined : eq(sections.departmentId, departmentId),
    ),
  ).orderBy(
    desc(terms.startsOn),
    sql`substring(${sections.period} from '^[0-9]+')::numeric nulls last`,
    asc(sections.period),
    asc(sections.name),
    asc(sections.id),
  );
}

/** How many sittings each section has, and how many of them are still open. */
export function countSittings(tx: Transaction, schoolId: string) {
  return tx
    .select({
      sectionId: sittings.sectionId,
      given: sql<number>`count(*)::int`,
      open: sql<number>`count(*) filter (where ${sittings.state} = 'open')::int`,
    })
    .from(sittings)
    .where(eq(sittings.schoolId, schoolId))
    .groupBy(sittings.sectionId);
}

/** The departments that the person teaches in; all of the school's when none is named for them. */
export async function selectTeachingDepartments(tx: Transaction, schoolId: string, personId: string) {
  const all = await tx
    .select({ departmentId: departments.id, name: departments.name })
    .from(departments)
    .where(eq(departments.schoolId, schoolId))
    .orderBy(asc(sql`lower(${departments.name})`));
  const named = await tx
    .select({ departmentId: personRoles.departmentId })
    .from(personRoles)
    .where(
      and(
        eq(personRoles.schoolId, schoolId),
        eq(personRoles.personId, personId),
        eq(personRoles.role, 'teacher'),
      ),
    );
  const own = new Set(named.flatMap(({ departmentId }) => departmentId ?? []));
  const mine = all.filter(({ departmentId }) => own.has(departmentId));
  return mine.length > 0 ? mine : all;
}

export async function insertSection(
  tx: Transaction,
  row: typeof sections.$inferInsert,
  teacherId: string,
): Promise<string> {
  const [made] = await tx.insert(sections).values(row).returning({ id: sections.id });
  if (!made) throw new Error('The database kept no section.');
  await tx
    .insert(sectionStaff)
    .values({ schoolId: row.schoolId, sectionId: made.id, personId: teacherId, duty: 'teacher' });
  return made.id;
}

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
