import 'server-only';
import { randomBytes } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { credentials } from '@/db/schema';
import { hashPassword, verifyPassword } from './password';

export interface Person {
  schoolId: string;
  personId: string;
}

const NOBODY: Person = {
  schoolId: '00000000-0000-0000-0000-000000000000',
  personId: '00000000-0000-0000-0000-000000000000',
};

let decoy: Promise<string> | undefined;

/**
 * Whether one of the passwords opens the person's account. Takes as long for nobody, or for somebody who has no
 * password yet, as for a wrong password.
 */
export async function provePassword(
  db: Database,
  person: Person | null,
  passwords: readonly string[],
): Promise<boolean> {
  decoy ??= hashPassword(randomBytes(32).toString('base64url'));
  const { schoolId, personId } = person ?? NOBODY;
  const [[row], decoyHash] = await Promise.all([
    db
      .select({ hash: credentials.passwordHash })
      .from(credentials)
      .where(and(eq(credentials.schoolId, schoolId), eq(credentials.personId, personId))),
    decoy,
  ]);
  let proved = false;
  for (const password of passwords) {
    proved = (await verifyPassword(row?.hash ?? decoyHash, password)) || proved;
  }
  return proved && row !== undefined;
}

/** Sets a person's password, whether they had one or not. */
export async function savePassword(
  tx: Transaction,
  person: Person,
  password: string,
  mustChange: boolean,
): Promise<void> {
  const passwordHash = await hashPassword(password);
  const changedAt = new Date();
  await tx
    .insert(credentials)
    .values({ schoolId: person.schoolId, personId: person.personId, passwordHash, mustChange, changedAt })
    .onConflictDoUpdate({
      target: [credentials.schoolId, credentials.personId],
      set: { passwordHash, mustChange, changedAt },
    });
}

/** Gives first passwords to people who have none; two at the same moment cannot both succeed. */
export async function saveFirstPasswords(
  tx: Transaction,
  schoolId: string,
  given: readonly { personId: string; password: string }[],
): Promise<void> {
  if (given.length === 0) return;
  const rows = await Promise.all(
    given.map(async ({ personId, password }) => ({
      schoolId,
      personId,
      passwordHash: await hashPassword(password),
      mustChange: true,
    })),
  );
  await tx.insert(credentials).values(rows);
}
