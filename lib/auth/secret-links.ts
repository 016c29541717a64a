import { createHash, randomBytes } from 'node:crypto';

/** How long each kind of link can be used. */
export const LINK_LIFE_MS = {
  invitation: 7 * 24 * 3_600_000,
  reset: 3_600_000,
  setup: 7 * 24 * 3_600_000,
} as const;

/** A new secret of 256 random bits, as it stands in the link. */
export function makeSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** What is stored of a secret: its SHA-256 in hex. The secret has entropy enough to need no salt. */
export function hashSecret(secret: string): string {
  return createHash('sha256').update(secret, 'utf8').digest('hex');
}

/** Path of the page that a link opens. */
export function linkPath(kind: keyof typeof LINK_LIFE_MS, secret: string): string {
  const page = { invitation: 'invitation', reset: 'reset', setup: 'set-up' }[kind];
  return `/${page}/${secret}`;
}
