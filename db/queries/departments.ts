import { and, asc, eq, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { departments, people, personRoles, sections } from '@/db/schema';

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

/** Two heads who approve rubrics of one department go one after the other. */
export async function lockDepartment(tx: Transaction, schoolId: string, departmentId: string): Promise<void> {
  await tx
    .select({ id: departments.id })
    .from(departments)
    .where(and(eq(departments.schoolId, schoolId), eq(departments.id, departmentId)))
    .for('no key update');
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
