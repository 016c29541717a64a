import { z } from 'zod';

/** What the device keeps of a PIN: enough to check one, and how often a wrong one was tried. */
const lockSchema = z.object({
  salt: z.string().nullable(),
  hash: z.string().nullable(),
  locked: z.boolean(),
  wrong: z.number().int().min(0),
  waitUntil: z.number(),
});

export type Lock = z.infer<typeof lockSchema>;

export const NO_LOCK: Lock = { salt: null, hash: null, locked: false, wrong: 0, waitUntil: 0 };

export const SHORTEST_PIN = 4;
export const LONGEST_PIN = 8;

const ROUNDS = 250_000;
const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 120_000;
const FREE_TRIES = 2;

export function parseLock(value: unknown): Lock {
  return lockSchema.safeParse(value).data ?? NO_LOCK;
}

export async function choosePin(pin: string): Promise<Lock> {
  const salt = toHex(crypto.getRandomValues(new Uint8Array(16)));
  return { ...NO_LOCK, salt, hash: await hashPin(pin, salt) };
}

/** The lock after a try: open, or locked with a wait that grows from the third wrong one on. */
export async function tryPin(lock: Lock, pin: string, now: number): Promise<Lock> {
  if (lock.salt === null || (await hashPin(pin, lock.salt)) === lock.hash) {
    return { ...lock, locked: false, wrong: 0, waitUntil: 0 };
  }
  const wrong = lock.wrong + 1;
  const waits = wrong - FREE_TRIES;
  const wait = waits <= 0 ? 0 : Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** (waits - 1));
  return { ...lock, wrong, waitUntil: wait === 0 ? 0 : now + wait };
}

async function hashPin(pin: string, salt: string): Promise<string> {
  const key = await crypto.subtle.importKey('raw', new TextEncoder().encode(pin), 'PBKDF2', false, [
    'deriveBits',
  ]);
  const bits = await crypto.subtle.deriveBits(
    { name: 'PBKDF2', hash: 'SHA-256', salt: new TextEncoder().encode(salt), iterations: ROUNDS },
    key,
    256,
  );
  return toHex(new Uint8Array(bits));
}

function toHex(bytes: Uint8Array): string {
  return [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
