import 'server-only';
import { redirect } from 'next/navigation';
import { ROLE_HOME } from '@/lib/auth/roles';
import { rememberSchool } from '@/lib/auth/school-cookie';
import { startSession } from '@/lib/auth/session';
import type { SignedInView } from '@/lib/data/account/sign-in-staff';

/** Lets in who has just proved who they are: a new session, the school kept in mind, and on to their first screen. */
export async function enter(person: SignedInView): Promise<never> {
  await startSession(person);
  await rememberSchool({ code: person.schoolCode, name: person.schoolName });
  redirect(ROLE_HOME[person.role]);
}
