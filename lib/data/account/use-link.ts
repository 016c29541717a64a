import 'server-only';
import type { Database } from '@/db/client';
import { deleteCounters, deleteSessions, endLinks, selectOwner } from '@/db/queries/account';
import { savePassword } from '@/lib/auth/credentials';
import { passwordProblem } from '@/lib/auth/password-rules';
import { accountKey, counterKeys } from '@/lib/auth/sign-in-limits';
import { newPasswordInput } from '@/lib/contracts/account';
import { defineEntry, logEntry, refuse, refuseFields } from './entry';
import { type LinkKind, openLink } from './open-link';
import { firstStaffRole, type SignedInView } from './sign-in-staff';

/** Accepts an invitation: sets the first password and uses the link up. */
export const acceptInvitation = defineEntry({
  input: newPasswordInput,
  run: ({ input, db }) => usePasswordLink(db, 'invitation', input),
});

/** Sets a forgotten password anew: uses the link up, ends all sessions, opens a closed account. */
export const resetPassword = defineEntry({
  input: newPasswordInput,
  run: ({ input, db }) => usePasswordLink(db, 'reset', input),
});

function usePasswordLink(
  db: Database,
  kind: LinkKind,
  { secret, password }: { secret: string; password: string },
): Promise<SignedInView> {
  return db.transaction(async (tx) => {
    const { schoolId, personId, email } = await openLink(tx, kind, secret, true);
    const owner = await selectOwner(tx, schoolId, personId);
    const role = firstStaffRole(owner?.roles ?? []);
    if (!owner || !role)
      return refuse('conflict', 'This account has no role at the school any more. Ask its admin.');
    const wrong = passwordProblem(password, owner);
    if (wrong) return refuseFields({ password: [wrong] });
    await savePassword(tx, owner, password, false);
    await endLinks(tx, schoolId, personId);
    await deleteSessions(tx, schoolId, personId);
    if (email) await deleteCounters(tx, counterKeys(accountKey({ email })));
    await logEntry(tx, { schoolId, personId, by: 'link', action: `account.${kind}` });
    const { schoolName, schoolCode } = owner;
    return { personId, schoolId, role, schoolName, schoolCode };
  });
}
