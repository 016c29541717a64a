import 'server-only';
import { selectOwner } from '@/db/queries/account';
import type { Actor } from '@/lib/auth/actor';
import { problem, type Result } from '@/lib/result';
import { authDatabase } from '../database';
import { answering, refuse } from './entry';

export interface AccountView {
  email: string | null;
  /** The ID that a student signs in with; null for staff. */
  localId: string | null;
  schoolCode: string;
}

/** How the person signs in; of their own account alone. */
export async function readAccount(actor: Actor | null): Promise<Result<AccountView>> {
  if (!actor) return problem('unauthenticated', 'Sign in to go on.');
  return answering(async () => {
    const owner = await selectOwner(authDatabase(), actor.schoolId, actor.personId);
    if (!owner) return refuse('not_found', 'There is nothing here, or it is not yours to see.');
    const isStudent = owner.roles.every((role) => role === 'student');
    return { email: owner.email, localId: isStudent ? owner.localId : null, schoolCode: owner.schoolCode };
  });
}
