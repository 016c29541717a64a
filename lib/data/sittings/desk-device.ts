import { createHash } from 'node:crypto';

/**
 * The device under which a person's own acts at the desk are kept beside those of the tablets: the same UUID (version
 * 8, made from school and person) at any time and on any server, so that its numbers run on.
 */
export function deskDeviceId(schoolId: string, personId: string): string {
  const digest = createHash('sha256').update(`trymark desk\n${schoolId}\n${personId}`).digest('hex');
  const variant = (8 | (Number.parseInt(digest.slice(16, 17), 16) & 3)).toString(16);
  return [
    digest.slice(0, 8),
    digest.slice(8, 12),
    `8${digest.slice(13, 16)}`,
    `${variant}${digest.slice(17, 20)}`,
    digest.slice(20, 32),
  ].join('-');
}
