import 'server-only';
import { setTimeout as wait } from 'node:timers/promises';
import type { Database } from '@/db/client';
import { insertLink, selectByEmail } from '@/db/queries/account';
import { hashSecret, LINK_LIFE_MS, linkPath, makeSecret } from '@/lib/auth/secret-links';
import { sayWait } from '@/lib/auth/sign-in-delays';
import { accountKey, mayAskReset } from '@/lib/auth/sign-in-limits';
import { askResetInput } from '@/lib/contracts/account';
import { env } from '@/lib/env';
import { queueMail } from '@/lib/mail/queue-mail';
import { defineEntry, logEntry, refuse } from './entry';
import { firstStaffRole } from './sign-in-staff';

/** Longer than either way through takes, so that the time does not tell whether there is an account. */
const ANSWER_AFTER_MS = 400;

/** Sends a reset link if the address has an account; answers the same, after the same time, if it has none. */
export const askReset = defineEntry({
  input: askResetInput,
  async run({ input, address, db }): Promise<null> {
    const [result] = await Promise.allSettled([sendLink(db, input.email, address), wait(ANSWER_AFTER_MS)]);
    if (result.status === 'rejected') throw result.reason;
    return null;
  },
});

async function sendLink(db: Database, email: string, address: string): Promise<void> {
  const asked = await mayAskReset(accountKey({ email }), address);
  if (asked.address !== null) {
    const seconds = asked.address;
    refuse('rate_limited', `Too many requests from here. Wait ${sayWait(seconds)}, then try again.`, {
      retryAfter: seconds,
    });
  }
  const person = await selectByEmail(db, email);
  if (!asked.account || !person?.email || !firstStaffRole(person.roles)) return;
  const { schoolId, personId, givenName, schoolName, email: to } = person;
  const secret = makeSecret();
  await db.transaction(async (tx) => {
    const expiresAt = new Date(Date.now() + LINK_LIFE_MS.reset);
    await insertLink(tx, { schoolId, personId, kind: 'reset', secretHash: hashSecret(secret), expiresAt });
    await logEntry(tx, { schoolId, personId, by: 'nobody', action: 'account.ask-reset' });
    await queueMail(tx, {
      to,
      template: 'password-reset',
      data: {
        givenName,
        schoolName,
        link: new URL(linkPath('reset', secret), env().APP_URL).href,
        minutes: LINK_LIFE_MS.reset / 60_000,
      },
    });
  });
}
