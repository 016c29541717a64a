import { and, asc, count, desc, eq, isNull, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { departments, people, personRoles, schools, sectionStaff, sections, terms } from '@/db/schema';
import type { Role } from '@/lib/auth/roles';
import { schoolToday } from './sections';

export async function isSchoolCodeTaken(tx: Transaction, code: string): Promise<boolean> {
  const [row] = await tx.select({ id: schools.id }).from(schools).where(eq(schools.code, code));
  return row !== undefined;
}

export async function insertSchool(tx: Transaction, row: typeof schools.$inferInsert): Promise<void> {
  await tx.insert(schools).values(row);
}

interface FirstAdmin {
  schoolId: string;
  personId: string;
  givenName: string;
  familyName: string;
  email: string;
  departmentName: string;
  roles: readonly Role[];
}

/** The first department and the first person of a school, with the person's roles. */
export async function insertFirstAdmin(tx: Transaction, admin: FirstAdmin): Promise<void> {
  const { schoolId, personId, givenName, familyName, email } = admin;
  const [department] = await tx
    .insert(departments)
    .values({ schoolId, name: admin.departmentName })
    .returning({ id: departments.id });
  await tx.insert(people).values({ schoolId, id: personId, givenName, familyName, email });
  await tx.insert(personRoles).values(
    admin.roles.map((role) => ({
      schoolId,
      personId,
      role,
      departmentId: role === 'admin' ? null : department?.id,
    })),
  );
}

export async function updateSchool(
  tx: Transaction,
  schoolId: string,
  values: { name: string; timeZone: string; unit: 'in' | 'mm' },
): Promise<void> {
  await tx.update(schools).set(values).where(eq(schools.id, schoolId));
}

export async function selectSchool(tx: Transaction, schoolId: string) {
  const [row] = await tx
    .select({
      id: schools.id,
      code: schools.code,
      name: schools.name,
      timeZone: schools.timeZone,
      unit: schools.unit,
      today: sql<string>`${schoolToday}::text`,
    })
    .from(schools)
    .where(eq(schools.id, schoolId));
  return row;
}

/** How many people hold each role, those who left not counted. */
export async function countRoles(tx: Transaction, schoolId: string): Promise<Map<Role, number>> {
  const rows = await tx
    .select({ role: personRoles.role, held: count() })
    .from(personRoles)
    .innerJoin(people, and(eq(people.schoolId, personRoles.schoolId), eq(people.id, personRoles.personId)))
    .where(and(eq(personRoles.schoolId, schoolId), isNull(people.leftAt)))
    .groupBy(personRoles.role);
  return new Map(rows.map(({ role, held }) => [role, held]));
}

/** Every section in use, with its teachers and how many students are in it now; current terms first. */
export function selectSectionsOverview(tx: Transaction, schoolId: string) {
  return tx
    .select({
      sectionId: sections.id,
      name: sections.name,
      period: sections.period,
      termName: terms.name,
      departmentName: departments.name,
      teachers: sql<string[]>`array(
        select btrim(staff.given_name || ' ' || staff.family_name) from ${people} staff
        join ${sectionStaff} given on given.school_id = staff.school_id and given.person_id = staff.id
        where given.school_id = ${sections.schoolId} and given.section_id = ${sections.id}
          and given.duty = 'teacher' order by staff.family_name)`,
      studentCount: sql<number>`(
        select count(*)::int from enrollments joined
        where joined.school_id = ${sections.schoolId} and joined.section_id = ${sections.id}
          and (joined.left_on is null or joined.left_on > ${schoolToday}))`,
      sittingCount: sql<number>`(
        select count(*)::int from sittings given
        where given.school_id = ${sections.schoolId} and given.section_id = ${sections.id})`,
    })
    .from(sections)
    .innerJoin(schools, eq(schools.id, sections.schoolId))
    .innerJoin(terms, and(eq(terms.schoolId, sections.schoolId), eq(terms.id, sections.termId)))
    .innerJoin(
      departments,
      and(eq(departments.schoolId, sections.schoolId), eq(departments.id, sections.departmentId)),
    )
    .where(and(eq(sections.schoolId, schoolId), isNull(sections.archivedAt)))
    .orderBy(desc(terms.startsOn), asc(sections.period), asc(sections.name));
}

export async function countSections(tx: Transaction, schoolId: string): Promise<number> {
  const [row] = await tx
    .select({ held: count() })
    .from(sections)
    .where(and(eq(sections.schoolId, schoolId), isNull(sections.archivedAt)));
  return row?.held ?? 0;
}
