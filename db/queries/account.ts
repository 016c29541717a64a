import { and, asc, eq, gte, inArray, isNull, ne, or, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import {
  credentials,
  enrollments,
  people,
  personRoles,
  rateLimits,
  schools,
  sectionStaff,
  sections,
  sessions,
  setupTokens,
  tokens,
} from '@/db/schema';
import type { Role } from '@/lib/auth/roles';
import { inSectionToday, schoolToday, teacherIds } from './sections';

type Reader = Database | Transaction;
type LinkKind = (typeof tokens.$inferSelect)['kind'];

const PERSON = {
  personId: people.id,
  schoolId: people.schoolId,
  givenName: people.givenName,
  familyName: people.familyName,
  email: people.email,
  localId: people.localId,
  schoolName: schools.name,
  schoolCode: schools.code,
};

const rolesHeld = sql<Role[]>`array(
  select held.role from ${personRoles} held
  where held.school_id = ${people.schoolId} and held.person_id = ${people.id})`;

/** The person whom an email names, unless they left. */
export async function selectByEmail(db: Reader, email: string) {
  const [row] = await db
    .select({ ...PERSON, roles: rolesHeld })
    .from(people)
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .where(and(sql`lower(${people.email}) = ${email.toLowerCase()}`, isNull(people.leftAt)));
  return row;
}

/** The person whom a school's code and a local ID name, unless they left. */
export async function selectByLocalId(db: Reader, schoolCode: string, localId: string) {
  const [row] = await db
    .select({ ...PERSON, roles: rolesHeld })
    .from(people)
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .where(and(eq(schools.code, schoolCode), eq(people.localId, localId), isNull(people.leftAt)));
  return row;
}

export async function selectOwner(db: Reader, schoolId: string, personId: string) {
  const [row] = await db
    .select({ ...PERSON, roles: rolesHeld })
    .from(people)
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .where(and(eq(people.schoolId, schoolId), eq(people.id, personId), isNull(people.leftAt)));
  return row;
}

/** A link with the person it was made for; `lock` holds it until the transaction ends, so that it is used once. */
export async function selectLink(db: Reader, kind: LinkKind, secretHash: string, lock: boolean) {
  const query = db
    .select({
      ...PERSON,
      tokenId: tokens.id,
      expiresAt: tokens.expiresAt,
      usedAt: tokens.usedAt,
      leftAt: people.leftAt,
    })
    .from(tokens)
    .innerJoin(people, and(eq(people.schoolId, tokens.schoolId), eq(people.id, tokens.personId)))
    .innerJoin(schools, eq(schools.id, tokens.schoolId))
    .where(and(eq(tokens.kind, kind), eq(tokens.secretHash, secretHash)));
  const [row] = await (lock ? query.for('update', { of: tokens }) : query);
  return row;
}

/** Ends every link of a person that still works. */
export async function endLinks(tx: Transaction, schoolId: string, personId: string): Promise<void> {
  await tx
    .update(tokens)
    .set({ usedAt: sql`now()` })
    .where(and(eq(tokens.schoolId, schoolId), eq(tokens.personId, personId), isNull(tokens.usedAt)));
}

export async function insertLink(tx: Transaction, row: typeof tokens.$inferInsert): Promise<void> {
  await tx.insert(tokens).values(row);
}

export async function selectSetupLink(db: Reader, secretHash: string, lock: boolean) {
  const query = db
    .select({ expiresAt: setupTokens.expiresAt, usedAt: setupTokens.usedAt })
    .from(setupTokens)
    .where(eq(setupTokens.secretHash, secretHash));
  const [row] = await (lock ? query.for('update') : query);
  return row;
}

/** Ends every set-up link: there is a school now. */
export async function endSetupLinks(tx: Transaction): Promise<void> {
  await tx.update(setupTokens).set({ usedAt: sql`now()` }).where(isNull(setupTokens.usedAt));
}

export async function deleteSessions(tx: Transaction, schoolId: string, personId: string): Promise<void> {
  await tx.delete(sessions).where(and(eq(sessions.schoolId, schoolId), eq(sessions.userId, personId)));
}

/** A student of the school, with the roles they hold and the teachers of the sections they are in now. */
export async function selectStudent(tx: Transaction, schoolId: string, studentId: string) {
  const owner = await selectOwner(tx, schoolId, studentId);
  if (!owner?.roles.includes('student')) return undefined;
  const teachers = await tx
    .selectDistinct({ personId: sectionStaff.personId })
    .from(enrollments)
    .innerJoin(schools, eq(schools.id, enrollments.schoolId))
    .innerJoin(
      sectionStaff,
      and(
        eq(sectionStaff.schoolId, enrollments.schoolId),
        eq(sectionStaff.sectionId, enrollments.sectionId),
        eq(sectionStaff.duty, 'teacher'),
        or(isNull(sectionStaff.toDay), gte(sectionStaff.toDay, schoolToday)),
      ),
    )
    .where(and(eq(enrollments.schoolId, schoolId), eq(enrollments.studentId, studentId), inSectionToday));
  return { ...owner, teacherIds: teachers.map(({ personId }) => personId) };
}

/** A section with its teachers and its school's code, as far as giving out passphrases needs it. */
export async function selectSectionForSlips(tx: Transaction, schoolId: string, sectionId: string) {
  const [section] = await tx
    .select({
      sectionId: sections.id,
      schoolId: sections.schoolId,
      departmentId: sections.departmentId,
      name: sections.name,
      period: sections.period,
      schoolName: schools.name,
      schoolCode: schools.code,
      teacherIds,
    })
    .from(sections)
    .innerJoin(schools, eq(schools.id, sections.schoolId))
    .where(and(eq(sections.schoolId, schoolId), eq(sections.id, sectionId)));
  return section;
}

/** Students of a section who cannot sign in yet and hold no other role, by name. */
export function selectWithoutPassphrase(tx: Transaction, schoolId: string, sectionId: string) {
  const isStaff = tx
    .select({ one: sql`1` })
    .from(personRoles)
    .where(
      and(
        eq(personRoles.schoolId, people.schoolId),
        eq(personRoles.personId, people.id),
        ne(personRoles.role, 'student'),
      ),
    );
  const known = tx
    .select({ personId: credentials.personId })
    .from(credentials)
    .where(eq(credentials.schoolId, schoolId));
  return tx
    .select({
      studentId: people.id,
      givenName: people.givenName,
      familyName: people.familyName,
      localId: people.localId,
    })
    .from(enrollments)
    .innerJoin(schools, eq(schools.id, enrollments.schoolId))
    .innerJoin(people, and(eq(people.schoolId, enrollments.schoolId), eq(people.id, enrollments.studentId)))
    .where(
      and(
        eq(enrollments.schoolId, schoolId),
        eq(enrollments.sectionId, sectionId),
        inSectionToday,
        isNull(people.leftAt),
        sql`${people.id} not in ${known}`,
        sql`not exists ${isStaff}`,
      ),
    )
    .orderBy(asc(people.familyName), asc(people.givenName), asc(people.localId));
}

export async function deleteCounters(tx: Transaction, keys: readonly string[]): Promise<void> {
  await tx.delete(rateLimits).where(inArray(rateLimits.key, [...keys]));
}
