import 'server-only';
import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { and, eq, isNull } from 'drizzle-orm';
import { Lucia, TimeSpan } from 'lucia';
import { cookies } from 'next/headers';
import { cache } from 'react';
import { credentials, people, personRoles, schools, sessions } from '@/db/schema';
import { authDatabase, withoutValues } from '@/lib/data/database';
import type { Actor } from './actor';
import { ROLES, type Role } from './roles';

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof makeLucia>;
    UserId: string;
    DatabaseSessionAttributes: { schoolId: string; activeRole: Role };
  }
}

/** A period's work must not end by itself; Lucia renews the session while it is used. */
const SESSION_LENGTH = new TimeSpan(12, 'h');

function makeLucia() {
  return new Lucia(new DrizzlePostgreSQLAdapter(authDatabase(), sessions, people), {
    sessionExpiresIn: SESSION_LENGTH,
    sessionCookie: {
      name: '__Host-trymark',
      expires: false,
      attributes: { secure: true, sameSite: 'lax', path: '/' },
    },
    getSessionAttributes: (row) => ({ schoolId: row.schoolId, activeRole: row.activeRole }),
  });
}

let made: ReturnType<typeof makeLucia> | undefined;

function lucia() {
  made ??= makeLucia();
  return made;
}

/** Starts a session for a person who has just proved who they are; any session the browser had ends first. */
export async function startSession(person: {
  personId: string;
  schoolId: string;
  role: Role;
}): Promise<void> {
  await endSession();
  const session = await lucia().createSession(person.personId, {
    schoolId: person.schoolId,
    activeRole: person.role,
  });
  await setCookie(lucia().createSessionCookie(session.id));
}

export async function endSession(): Promise<void> {
  const id = await sessionId();
  if (!id) return;
  await lucia().invalidateSession(id);
  await setCookie(lucia().createBlankSessionCookie());
}

/** Acts in another of the person's own roles from now on; false when they do not hold it. */
export async function switchRole(role: Role): Promise<boolean> {
  const actor = await currentActor();
  const id = await sessionId();
  if (!actor || !id || !actor.roles.includes(role)) return false;
  await authDatabase().update(sessions).set({ activeRole: role }).where(eq(sessions.id, id));
  return true;
}

/** The signed-in person, once a request; null without a valid session. */
export const currentActor = cache(async (): Promise<Actor | null> => {
  const id = await sessionId();
  if (!id) return null;
  try {
    const { session } = await lucia().validateSession(id);
    return session && (await loadActor(session.userId, session.activeRole));
  } catch (error) {
    throw withoutValues(error);
  }
});

async function loadActor(personId: string, activeRole: Role): Promise<Actor | null> {
  const rows = await authDatabase()
    .select({
      schoolId: people.schoolId,
      givenName: people.givenName,
      familyName: people.familyName,
      schoolName: schools.name,
      role: personRoles.role,
      departmentId: personRoles.departmentId,
      mustChange: credentials.mustChange,
    })
    .from(people)
    .innerJoin(schools, eq(schools.id, people.schoolId))
    .innerJoin(
      personRoles,
      and(eq(personRoles.schoolId, people.schoolId), eq(personRoles.personId, people.id)),
    )
    .innerJoin(
      credentials,
      and(eq(credentials.schoolId, people.schoolId), eq(credentials.personId, people.id)),
    )
    .where(and(eq(people.id, personId), isNull(people.leftAt)));
  const held = rows.find((row) => row.role === activeRole);
  if (!held) return null;
  return {
    personId,
    schoolId: held.schoolId,
    role: held.role,
    roles: ROLES.filter((role) => rows.some((row) => row.role === role)),
    departmentId: held.departmentId,
    givenName: held.givenName,
    familyName: held.familyName,
    schoolName: held.schoolName,
    mustChangePassword: held.mustChange,
  };
}

async function sessionId(): Promise<string | null> {
  return (await cookies()).get(lucia().sessionCookieName)?.value ?? null;
}

async function setCookie(cookie: ReturnType<Lucia['createSessionCookie']>): Promise<void> {
  (await cookies()).set(cookie.name, cookie.value, cookie.attributes);
}
