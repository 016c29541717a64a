import { and, asc, count, eq, inArray, isNotNull, isNull, ne, notExists, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { credentials, departments, enrollments, people, personRoles, schools, tokens } from '@/db/schema';
import type { Role } from '@/lib/auth/roles';

export interface PeopleFilter {
  shown: 'staff' | 'students' | 'left';
  search: string;
}

interface HeldRole {
  role: Role;
  departmentId: string | null;
  departmentName: string | null;
}

// Inside a selection from one table drizzle drops the table's name, so the outer columns are written out.
const heldRoles = sql<HeldRole[]>`coalesce((
  select json_agg(json_build_object('role', held.role, 'departmentId', held.department_id, 'departmentName', place.name)
    order by held.role)
  from ${personRoles} held
  left join ${departments} place on place.school_id = held.school_id and place.id = held.department_id
  where held.school_id = people.school_id and held.person_id = people.id), '[]'::json)`;

const PERSON = {
  personId: people.id,
  schoolId: people.schoolId,
  givenName: people.givenName,
  familyName: people.familyName,
  email: people.email,
  localId: people.localId,
  leftAt: people.leftAt,
  roles: heldRoles,
  hasPassword: sql<boolean>`exists (
    select 1 from ${credentials} known
    where known.school_id = people.school_id and known.person_id = people.id)`,
  invitedUntil: sql<Date | null>`(
    select max(link.expires_at) from ${tokens} link
    where link.school_id = people.school_id and link.person_id = people.id
      and link.kind = 'invitation' and link.used_at is null)`.mapWith(people.leftAt),
};

function filtered(tx: Transaction, schoolId: string, { shown, search }: PeopleFilter) {
  const staff = tx
    .select({ one: sql`1` })
    .from(personRoles)
    .where(
      and(
        eq(personRoles.schoolId, people.schoolId),
        eq(personRoles.personId, people.id),
        ne(personRoles.role, 'student'),
      ),
    );
  const pattern = `%${search.replaceAll(/[\\%_]/g, '\\$&')}%`;
  return and(
    eq(people.schoolId, schoolId),
    shown === 'left' ? isNotNull(people.leftAt) : isNull(people.leftAt),
    shown === 'staff' ? sql`exists ${staff}` : undefined,
    shown === 'students' ? notExists(staff) : undefined,
    search === ''
      ? undefined
      : sql`(${people.givenName} || ' ' || ${people.familyName} || ' ' || coalesce(${people.email}, '') || ' '
          || coalesce(${people.localId}, '')) ilike ${pattern}`,
  );
}

export async function selectPeople(
  tx: Transaction,
  schoolId: string,
  filter: PeopleFilter,
  { page, pageSize }: { page: number; pageSize: number },
) {
  const where = filtered(tx, schoolId, filter);
  const rows = await tx
    .select(PERSON)
    .from(people)
    .where(where)
    .orderBy(asc(people.familyName), asc(people.givenName), asc(people.id))
    .limit(pageSize)
    .offset((page - 1) * pageSize);
  const [total] = await tx.select({ found: count() }).from(people).where(where);
  return { rows, total: total?.found ?? 0 };
}

export async function selectPerson(tx: Transaction, schoolId: string, personId: string) {
  const [row] = await tx
    .select(PERSON)
    .from(people)
    .where(and(eq(people.schoolId, schoolId), eq(people.id, personId)));
  return row;
}

export async function selectPersonByEmail(tx: Transaction, schoolId: string, email: string) {
  const [row] = await tx
    .select(PERSON)
    .from(people)
    .where(and(eq(people.schoolId, schoolId), sql`lower(${people.email}) = ${email}`));
  return row;
}

/** How many staff were invited and have not chosen a password yet. */
export async function countWaiting(tx: Transaction, schoolId: string): Promise<number> {
  const { rows } = await selectPeople(
    tx,
    schoolId,
    { shown: 'staff', search: '' },
    { page: 1, pageSize: 1_000 },
  );
  return rows.filter(({ hasPassword }) => !hasPassword).length;
}

/** Adds a person; undefined when the email is in use, at whichever school. */
export async function insertPerson(
  tx: Transaction,
  row: typeof people.$inferInsert,
): Promise<string | undefined> {
  const [made] = await tx.insert(people).values(row).onConflictDoNothing().returning({ id: people.id });
  return made?.id;
}

/** Makes these, of all staff roles, the ones that the person holds; the role of student is left as it is. */
export async function replaceStaffRoles(
  tx: Transaction,
  schoolId: string,
  personId: string,
  roles: readonly { role: Role; departmentId: string | null }[],
): Promise<void> {
  await tx
    .delete(personRoles)
    .where(
      and(
        eq(personRoles.schoolId, schoolId),
        eq(personRoles.personId, personId),
        inArray(personRoles.role, ['teacher', 'head', 'aide', 'admin']),
      ),
    );
  if (roles.length > 0) {
    await tx.insert(personRoles).values(roles.map((held) => ({ schoolId, personId, ...held })));
  }
}

export async function updateLeft(
  tx: Transaction,
  schoolId: string,
  personId: string,
  leftAt: Date | null,
): Promise<void> {
  await tx
    .update(people)
    .set({ leftAt })
    .where(and(eq(people.schoolId, schoolId), eq(people.id, personId)));
}

/** Takes a person off every roster they are on: today is the first day without them. */
export async function endEnrollments(tx: Transaction, schoolId: string, studentId: string): Promise<void> {
  await tx
    .update(enrollments)
    .set({
      leftOn: sql`(select greatest(${enrollments.joinedOn}, (now() at time zone ${schools.timeZone})::date)
        from ${schools} where ${schools.id} = ${schoolId})`,
    })
    .where(
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.studentId, studentId),
        isNull(enrollments.leftOn),
      ),
    );
}
