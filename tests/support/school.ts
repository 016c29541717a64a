import { randomBytes, randomUUID } from 'node:crypto';
import type { Actor } from '@/lib/auth/actor';
import { hashPassword } from '@/lib/auth/password';
import type { Role } from '@/lib/auth/roles';
import { ownerSql } from './database';

export interface TestSchool {
  id: string;
  code: string;
  name: string;
  departmentId: string;
  termId: string;
}

export interface TestPerson {
  personId: string;
  givenName: string;
  familyName: string;
  email: string | null;
  localId: string | null;
  roles: Role[];
}

/** A school of the test's own, with one department and a term that today lies in. */
export async function makeSchool(name = 'Cedar Fork High School'): Promise<TestSchool> {
  const sql = ownerSql();
  const school = { id: randomUUID(), code: `school-${randomBytes(4).toString('hex')}`, name };
  const departmentId = randomUUID();
  const termId = randomUUID();
  await sql`insert into schools ${sql({ ...school, time_zone: 'America/Chicago', unit: 'in' })}`;
  await sql`insert into departments ${sql({ school_id: school.id, id: departmentId, name: 'Wood and design' })}`;
  await sql`
    insert into terms (school_id, id, name, starts_on, ends_on)
    values (${school.id}, ${termId}, 'this term', current_date - 60, current_date + 60)`;
  return { ...school, departmentId, termId };
}

interface PersonChoice {
  givenName?: string;
  familyName?: string;
  email?: string | null;
  localId?: string | null;
  /** Without one the person cannot sign in yet. */
  password?: string;
  mustChange?: boolean;
  left?: boolean;
}

/** A person of the school in these roles: staff get an email, students a local ID, unless told otherwise. */
export async function makePerson(
  school: TestSchool,
  roles: Role[],
  choice: PersonChoice = {},
): Promise<TestPerson> {
  const sql = ownerSql();
  const tag = randomBytes(4).toString('hex');
  const isStudent = roles.every((role) => role === 'student');
  const person = {
    personId: randomUUID(),
    givenName: choice.givenName ?? 'Rut',
    familyName: choice.familyName ?? `Lindqvist ${tag}`,
    email: choice.email === undefined ? (isStudent ? null : `rut.${tag}@cedarfork.example`) : choice.email,
    localId: choice.localId === undefined ? (isStudent ? `00${tag}` : null) : choice.localId,
    roles,
  };
  await sql`insert into people ${sql({
    school_id: school.id,
    id: person.personId,
    given_name: person.givenName,
    family_name: person.familyName,
    email: person.email,
    local_id: person.localId,
    left_at: choice.left ? new Date() : null,
  })}`;
  for (const role of roles) {
    const departmentId = role === 'head' || role === 'teacher' ? school.departmentId : null;
    await sql`insert into person_roles ${sql({
      school_id: school.id,
      person_id: person.personId,
      role,
      department_id: departmentId,
    })}`;
  }
  if (choice.password) {
    await sql`insert into credentials ${sql({
      school_id: school.id,
      person_id: person.personId,
      password_hash: await hashPassword(choice.password),
      must_change: choice.mustChange ?? false,
    })}`;
  }
  return person;
}

/** The person as somebody who is signed in and acts in this role. */
export function actorOf(school: TestSchool, person: TestPerson, role: Role): Actor {
  return {
    personId: person.personId,
    schoolId: school.id,
    role,
    roles: person.roles,
    departmentId: role === 'head' || role === 'teacher' ? school.departmentId : null,
    givenName: person.givenName,
    familyName: person.familyName,
    schoolName: school.name,
    mustChangePassword: false,
  };
}

/** A new person of the school, acting in the role. */
export async function makeActor(school: TestSchool, role: Role, choice: PersonChoice = {}): Promise<Actor> {
  return actorOf(school, await makePerson(school, [role], choice), role);
}

/** A section with its teachers and students. */
export async function makeSection(
  school: TestSchool,
  { teacherIds = [], studentIds = [] }: { teacherIds?: string[]; studentIds?: string[] },
): Promise<string> {
  const sql = ownerSql();
  const sectionId = randomUUID();
  const at = { school_id: school.id, section_id: sectionId };
  await sql`insert into sections ${sql({
    school_id: school.id,
    id: sectionId,
    department_id: school.departmentId,
    term_id: school.termId,
    name: 'Woods 2',
    period: '3',
  })}`;
  for (const person_id of teacherIds) {
    await sql`insert into section_staff ${sql({ ...at, person_id, duty: 'teacher' })}`;
  }
  for (const student_id of studentIds) {
    await sql`insert into enrollments ${sql({ ...at, student_id, joined_on: '2026-01-12' })}`;
  }
  return sectionId;
}

export async function signIn(school: TestSchool, personId: string, role: Role): Promise<string> {
  const sql = ownerSql();
  const id = randomBytes(20).toString('hex');
  await sql`insert into sessions ${sql({
    id,
    school_id: school.id,
    user_id: personId,
    active_role: role,
    expires_at: new Date(Date.now() + 3_600_000),
  })}`;
  return id;
}

/** What the log says of a school, the newest last. */
export function logOf(school: { id: string }) {
  return ownerSql()<
    { action: string; actor_id: string | null; about_person_id: string | null; details: unknown }[]
  >`
    select action, actor_id, about_person_id, details from access_log
    where school_id = ${school.id} order by at, id`;
}

/** The mails that wait to be sent to an address. */
export async function mailsTo(
  address: string,
): Promise<{ template: string; data: Record<string, unknown> }[]> {
  const rows = await ownerSql()<
    { payload: { to: string; template: string; data: Record<string, unknown> } }[]
  >`
    select payload from graphile_worker._private_jobs where payload->>'to' = ${address} order by id`;
  return rows.map(({ payload }) => payload);
}

/** The secret at the end of a link that was mailed. */
export function secretOf(mail: { data: Record<string, unknown> } | undefined): string {
  const link = String(mail?.data.link ?? '');
  const secret = new URL(link).pathname.split('/').at(-1);
  if (!secret) throw new Error(`There is no secret in ${link}.`);
  return secret;
}

/** Runs the work while the access log takes nothing, as if the process died at a transaction's last write. */
export async function whileLogFails<T>(work: () => Promise<T>): Promise<unknown> {
  const sql = ownerSql();
  await sql.unsafe(`
    create or replace function test_refuse_log() returns trigger language plpgsql
    as $$ begin raise exception 'the log takes nothing' using errcode = 'P0001'; end $$;
    create trigger test_refuse_log before insert on access_log for each row execute function test_refuse_log()`);
  try {
    return await work().catch((error: unknown) => error);
  } finally {
    await sql`drop trigger test_refuse_log on access_log`;
  }
}
