import { expect, it } from 'vitest';
import { hashSecret, LINK_LIFE_MS, linkPath, makeSecret } from '@/lib/auth/secret-links';

it('makes secrets of 256 bits that fit into a link, each different', () => {
  const made = Array.from({ length: 100 }, makeSecret);
  expect(new Set(made).size).toBe(100);
  expect(made.every((secret) => /^[\w-]{43}$/.test(secret))).toBe(true);
});

it('keeps SHA-256 of a secret (the digest of "abc" in FIPS 180-4, from memory)', () => {
  expect(hashSecret('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
});

it('lets an invitation live for seven days and a reset for one hour', () => {
  expect(LINK_LIFE_MS.invitation).toBe(7 * 24 * 60 * 60 * 1000);
  expect(LINK_LIFE_MS.reset).toBe(60 * 60 * 1000);
});

it('leads each kind of link to its page', () => {
  expect(linkPath('invitation', 'x')).toBe('/invitation/x');
  expect(linkPath('reset', 'x')).toBe('/reset/x');
  expect(linkPath('setup', 'x')).toBe('/set-up/x');
});
