import { hashRaw } from '@node-rs/argon2';
import { expect, it } from 'vitest';
import { ARGON2, hashPassword, verifyPassword } from '@/lib/auth/password';

it('makes the Argon2id hash that other programs make', async () => {
  // The value on which Debian's argon2 and hash-wasm agree for 19 MiB, 2 passes, 1 lane, 32 bytes.
  const raw = await hashRaw('password', { ...ARGON2, salt: Buffer.from('somesaltsomesalt'), outputLen: 32 });
  expect(raw.toString('hex')).toBe('2b5dc4054886ec957ef59c73b661c54dd6fb274590b278f657c6d96aac8fa6d1');
});

it('hashes with Argon2id, 19 MiB, 2 passes and 1 lane: OWASP Password Storage Cheat Sheet', async () => {
  expect(await hashPassword('plane with the grain')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
});

it('salts each hash anew', async () => {
  const [one, two] = await Promise.all([
    hashPassword('plane with the grain'),
    hashPassword('plane with the grain'),
  ]);
  expect(one).not.toBe(two);
});

it('accepts the same password and no other, to the last of 256 characters', async () => {
  const long = `${'plane with the grain '.repeat(12)}end`.slice(0, 256);
  const stored = await hashPassword(long);
  expect(await verifyPassword(stored, long)).toBe(true);
  expect(await verifyPassword(stored, `${long.slice(0, -1)}!`)).toBe(false);
});

it('takes an accent for the same however the keyboard composes it', async () => {
  const stored = await hashPassword('caf\u00e9 au lait at seven');
  expect(await verifyPassword(stored, 'cafe\u0301 au lait at seven')).toBe(true);
});
