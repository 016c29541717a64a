import 'server-only';
import { redirect } from 'next/navigation';
import { rememberSchool } from '@/lib/auth/school-cookie';
import { startSession } from '@/lib/auth/session';
import type { SignedInView } from '@/lib/data/account/sign-in-staff';

/** Lets in who has just proved who they are: a new session, the school kept in mind, and in by the front door. */
export async function enter(person: SignedInView): Promise<never> {
  await startSession(person);
  await rememberSchool({ code: person.schoolCode, name: person.schoolName });
  redirect('/');
}
