import { hash, type Options, verify } from '@node-rs/argon2';

/** Argon2id with 19 MiB, 2 passes, 1 lane: the OWASP Password Storage Cheat Sheet's first choice (checked in the tests). */
export const ARGON2: Options = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'), ARGON2);
}

export function verifyPassword(storedHash: string, password: string): Promise<boolean> {
  return verify(storedHash, password.normalize('NFKC'));
}
