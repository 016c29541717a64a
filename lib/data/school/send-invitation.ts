import 'server-only';
import type { Transaction } from '@/db/client';
import { endLinks, insertLink } from '@/db/queries/account';
import type { Actor } from '@/lib/auth/actor';
import { ROLE_NAMES, type Role } from '@/lib/auth/roles';
import { hashSecret, LINK_LIFE_MS, linkPath, makeSecret } from '@/lib/auth/secret-links';
import { env } from '@/lib/env';
import { queueMail } from '@/lib/mail/queue-mail';

interface Invited {
  personId: string;
  givenName: string;
  email: string;
  roles: readonly Role[];
}

/** Makes an invitation link, ends the ones before it, and queues its mail, all in the caller's transaction. */
export async function sendInvitation(tx: Transaction, actor: Actor, invited: Invited): Promise<void> {
  const { schoolId } = actor;
  const secret = makeSecret();
  await endLinks(tx, schoolId, invited.personId);
  await insertLink(tx, {
    schoolId,
    personId: invited.personId,
    kind: 'invitation',
    secretHash: hashSecret(secret),
    expiresAt: new Date(Date.now() + LINK_LIFE_MS.invitation),
  });
  await queueMail(tx, {
    to: invited.email,
    template: 'invitation',
    data: {
      givenName: invited.givenName,
      schoolName: actor.schoolName,
      invitedBy: `${actor.givenName} ${actor.familyName}`.trim(),
      roles: invited.roles.map((role) => ROLE_NAMES[role]),
      link: new URL(linkPath('invitation', secret), env().APP_URL).href,
      days: LINK_LIFE_MS.invitation / 86_400_000,
    },
  });
}
