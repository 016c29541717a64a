import 'server-only';
import { notFound, redirect } from 'next/navigation';
import type { Actor } from '@/lib/auth/actor';
import { currentActor } from '@/lib/auth/session';
import type { Result } from '@/lib/result';

/** The signed-in person of a page; sends everybody else to sign in, and a handed-out passphrase to be changed. */
export async function pageActor(): Promise<Actor> {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in');
  if (actor.mustChangePassword) redirect('/account/new-passphrase');
  return actor;
}

/** A verb's answer on a page: what is not to be seen becomes "not found", a dead database the error page. */
export function pageValue<T>(result: Result<T>): T {
  if (result.ok) return result.value;
  const { code, message } = result.problem;
  switch (code) {
    case 'unauthenticated':
      redirect('/sign-in');
      break;
    case 'forbidden':
    case 'not_found':
    case 'invalid':
      notFound();
      break;
    case 'conflict':
    case 'stale':
    case 'rate_limited':
    case 'unavailable':
      throw new Error(message);
  }
}
