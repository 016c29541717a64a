import { and, asc, count, desc, eq, gte, isNull, lte, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { departments, people, personRoles, schools, sectionStaff, sections, terms } from '@/db/schema';
import type { Role } from '@/lib/auth/roles';

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
      today: sql<string>`(now() at time zone ${schools.timeZone})::date::text`,
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

export function selectDepartments(tx: Transaction, schoolId: string) {
  return tx
    .select({
      departmentId: departments.id,
      name: departments.name,
      sectionCount: sql<number>`(
        select count(*)::int from ${sections} held
        where held.school_id = departments.school_id and held.department_id = departments.id
          and held.archived_at is null)`,
      heads: sql<string[]>`array(
        select btrim(lead.given_name || ' ' || lead.family_name) from ${people} lead
        join ${personRoles} held on held.school_id = lead.school_id and held.person_id = lead.id
        where held.school_id = departments.school_id and held.department_id = departments.id
          and held.role = 'head' and lead.left_at is null order by lead.family_name)`,
    })
    .from(departments)
    .where(eq(departments.schoolId, schoolId))
    .orderBy(asc(sql`lower(${departments.name})`));
}

export async function selectDepartment(tx: Transaction, schoolId: string, departmentId: string) {
  const [row] = await tx
    .select({ schoolId: departments.schoolId, departmentId: departments.id, name: departments.name })
    .from(departments)
    .where(and(eq(departments.schoolId, schoolId), eq(departments.id, departmentId)));
  return row;
}

/** Whether another department of the school has this name, in any case. */
export async function isDepartmentNameTaken(
  tx: Transaction,
  schoolId: string,
  name: string,
  exceptId: string | null,
): Promise<boolean> {
  const [row] = await tx
    .select({ id: departments.id })
    .from(departments)
    .where(
      and(
        eq(departments.schoolId, schoolId),
        sql`lower(${departments.name}) = lower(${name})`,
        exceptId === null ? undefined : ne(departments.id, exceptId),
      ),
    );
  return row !== undefined;
}

export async function insertDepartment(tx: Transaction, schoolId: string, name: string): Promise<string> {
  const [row] = await tx.insert(departments).values({ schoolId, name }).returning({ id: departments.id });
  if (!row) throw new Error('The database kept no department.');
  return row.id;
}

export async function updateDepartment(
  tx: Transaction,
  schoolId: string,
  departmentId: string,
  name: string,
) {
  await tx
    .update(departments)
    .set({ name })
    .where(and(eq(departments.schoolId, schoolId), eq(departments.id, departmentId)));
}

export function selectTerms(tx: Transaction, schoolId: string) {
  return tx
    .select({
      termId: terms.id,
      name: terms.name,
      startsOn: terms.startsOn,
      endsOn: terms.endsOn,
      sectionCount: sql<number>`(
        select count(*)::int from ${sections} held
        where held.school_id = terms.school_id and held.term_id = terms.id and held.archived_at is null)`,
    })
    .from(terms)
    .where(eq(terms.schoolId, schoolId))
    .orderBy(desc(terms.startsOn), asc(terms.name));
}

export async function selectTerm(tx: Transaction, schoolId: string, termId: string) {
  const [row] = await tx
    .select({ schoolId: terms.schoolId, termId: terms.id, name: terms.name })
    .from(terms)
    .where(and(eq(terms.schoolId, schoolId), eq(terms.id, termId)));
  return row;
}

/** The term that a day lies in; of several the one that began last. */
export async function selectTermOn(tx: Transaction, schoolId: string, day: string) {
  const [row] = await tx
    .select({ termId: terms.id, name: terms.name, startsOn: terms.startsOn, endsOn: terms.endsOn })
    .from(terms)
    .where(and(eq(terms.schoolId, schoolId), lte(terms.startsOn, day), gte(terms.endsOn, day)))
    .orderBy(desc(terms.startsOn))
    .limit(1);
  return row;
}

/** Whether another term of the school has this name, in any case. */
export async function isTermNameTaken(
  tx: Transaction,
  schoolId: string,
  name: string,
  exceptId: string | null,
): Promise<boolean> {
  const [row] = await tx
    .select({ id: terms.id })
    .from(terms)
    .where(
      and(
        eq(terms.schoolId, schoolId),
        sql`lower(${terms.name}) = lower(${name})`,
        exceptId === null ? undefined : ne(terms.id, exceptId),
      ),
    );
  return row !== undefined;
}

export async function insertTerm(tx: Transaction, row: typeof terms.$inferInsert): Promise<string> {
  const [made] = await tx.insert(terms).values(row).returning({ id: terms.id });
  if (!made) throw new Error('The database kept no term.');
  return made.id;
}

export async function updateTerm(
  tx: Transaction,
  schoolId: string,
  termId: string,
  values: { name: string; startsOn: string; endsOn: string },
): Promise<void> {
  await tx
    .update(terms)
    .set(values)
    .where(and(eq(terms.schoolId, schoolId), eq(terms.id, termId)));
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
          and (joined.left_on is null or joined.left_on > current_date))`,
      sittingCount: sql<number>`(
        select count(*)::int from sittings given
        where given.school_id = ${sections.schoolId} and given.section_id = ${sections.id})`,
    })
    .from(sections)
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
