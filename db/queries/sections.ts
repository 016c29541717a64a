import { and, asc, desc, eq, isNull, or, type SQL, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  departments,
  enrollments,
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
