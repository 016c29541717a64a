import 'server-only';
import type { Database } from '@/db/client';
import { deleteSessions, endLinks, selectOwner } from '@/db/queries/account';
import type { Actor } from '@/lib/auth/actor';
import { savePassword } from '@/lib/auth/credentials';
import { tidyPassphrase } from '@/lib/auth/passphrase';
import { passwordProblem } from '@/lib/auth/password-rules';
import { ownKey } from '@/lib/auth/sign-in-limits';
import { changePasswordInput, choosePassphraseInput } from '@/lib/contracts/account';
import { defineOwnEntry, logEntry, refuse, refuseFields } from './entry';
import { provePerson } from './prove-person';

/** Changes one's own password, proved by the present one. Every session of the person ends. */
export const changePassword = defineOwnEntry({
  input: changePasswordInput,
  async run({ actor, input, address, db }): Promise<null> {
    await provePerson(db, {
      account: ownKey(actor.personId),
      address,
      person: actor,
      passwords: [...new Set([input.current, tidyPassphrase(input.current)])],
      wrong: 'The one you use now is not right.',
      closed: 'Too many wrong tries. Sign out and have your password reset.',
      field: 'current',
    });
    return replacePassword(db, actor, input.password);
  },
});

/** Replaces a passphrase that was handed out by one's own choice; every session of the person ends. */
export const choosePassphrase = defineOwnEntry({
  input: choosePassphraseInput,
  async run({ actor, input, db }): Promise<null> {
    if (!actor.mustChangePassword) {
      refuse('forbidden', 'You have chosen already. To change it again, use your account page.');
    }
    return replacePassword(db, actor, input.password);
  },
});

function replacePassword(db: Database, actor: Actor, password: string): Promise<null> {
  const { schoolId, personId } = actor;
  return db.transaction(async (tx) => {
    const owner = await selectOwner(tx, schoolId, personId);
    if (!owner) return refuse('unauthenticated', 'Sign in to go on.');
    const wrong = passwordProblem(password, owner);
    if (wrong) refuseFields({ password: [wrong] });
    await savePassword(tx, owner, password, false);
    await endLinks(tx, schoolId, personId);
    await deleteSessions(tx, schoolId, personId);
    await logEntry(tx, { schoolId, personId, by: actor.role, action: 'account.change-password' });
    return null;
  });
}
