import 'server-only';
import type { Database, Transaction } from '@/db/client';
import { selectLink, selectSetupLink } from '@/db/queries/account';
import { hashSecret } from '@/lib/auth/secret-links';
import { refuse } from './entry';

export type LinkKind = 'invitation' | 'reset';

const AGAIN: Record<LinkKind | 'setup', string> = {
  invitation: 'Ask the person who invited you to send another.',
  reset: 'Ask for another with “forgotten password”.',
  setup: 'Start the server again: it prints another as long as there is no school.',
};

/** The link with its person if it can be used now; otherwise ends with what is wrong with it and what to do. */
export async function openLink(db: Database | Transaction, kind: LinkKind, secret: string, lock: boolean) {
  const row = await selectLink(db, kind, hashSecret(secret), lock);
  return usable(kind, row?.leftAt ? { ...row, expiresAt: row.leftAt } : row);
}

export async function openSetupLink(
  db: Database | Transaction,
  secret: string,
  lock: boolean,
): Promise<void> {
  usable('setup', await selectSetupLink(db, hashSecret(secret), lock));
}

function usable<Link extends { expiresAt: Date; usedAt: Date | null }>(
  kind: LinkKind | 'setup',
  link: Link | undefined,
): Link {
  if (!link) {
    return refuse('not_found', `This link is not known here: check that it was copied whole. ${AGAIN[kind]}`);
  }
  if (link.usedAt) refuse('conflict', `This link has been used or replaced; each works once. ${AGAIN[kind]}`);
  if (link.expiresAt.getTime() <= Date.now()) refuse('conflict', `This link has ended. ${AGAIN[kind]}`);
  return link;
}
