import 'server-only';
import type { z } from 'zod';
import type { Database, Transaction } from '@/db/client';
import { accessLog } from '@/db/schema';
import type { Actor } from '@/lib/auth/actor';
import type { Role } from '@/lib/auth/roles';
import {
  type FieldErrors,
  invalid,
  type Problem,
  type ProblemCode,
  problem,
  type Result,
} from '@/lib/result';
import { authDatabase } from '../database';
import { databaseProblem, fieldErrors, Refusal } from '../verb';

interface Entry<Schema extends z.ZodType, View> {
  input: Schema;
  run(context: { input: z.output<Schema>; address: string; db: Database }): Promise<View>;
}

/**
 * Makes a verb for somebody who is not signed in: parse the contract, then work with what sign-in may see.
 * There is no actor to authorize; what is asked for is proved by a password or by the secret of a link.
 */
export function defineEntry<Schema extends z.ZodType, View>(entry: Entry<Schema, View>) {
  return async (raw: z.input<Schema> | unknown, address: string): Promise<Result<View>> => {
    const parsed = entry.input.safeParse(raw);
    if (!parsed.success) return invalid(fieldErrors(parsed.error));
    return answering(() => entry.run({ input: parsed.data, address, db: authDatabase() }));
  };
}

interface OwnEntry<Schema extends z.ZodType, View> {
  input: Schema;
  run(context: { actor: Actor; input: z.output<Schema>; address: string; db: Database }): Promise<View>;
}

/** Makes a verb on one's own account: it needs no role, and works before a handed-out passphrase is changed. */
export function defineOwnEntry<Schema extends z.ZodType, View>(entry: OwnEntry<Schema, View>) {
  return async (
    actor: Actor | null,
    raw: z.input<Schema> | unknown,
    address: string,
  ): Promise<Result<View>> => {
    if (!actor) return problem('unauthenticated', 'Sign in to go on.');
    const parsed = entry.input.safeParse(raw);
    if (!parsed.success) return invalid(fieldErrors(parsed.error));
    return answering(() => entry.run({ actor, input: parsed.data, address, db: authDatabase() }));
  };
}

/** Runs the work and turns what ended it early into an answer. */
export async function answering<View>(work: () => Promise<View>): Promise<Result<View>> {
  try {
    return { ok: true, value: await work() };
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, problem: error.problem };
    return databaseProblem(error);
  }
}

export function refuse(
  code: ProblemCode,
  message: string,
  more: Omit<Problem, 'code' | 'message'> = {},
): never {
  throw new Refusal({ code, message, ...more });
}

export function refuseFields(fields: FieldErrors): never {
  throw new Refusal(invalid(fields).problem);
}

/** Appends to the access log on behalf of a person who has just proved who they are, or of nobody. */
export async function logEntry(
  tx: Pick<Transaction, 'insert'>,
  row: {
    schoolId: string;
    personId: string;
    by: Role | 'link' | 'nobody';
    action: string;
    details?: Record<string, unknown>;
  },
): Promise<void> {
  const { schoolId, personId, by, action, details = {} } = row;
  await tx.insert(accessLog).values({
    schoolId,
    actorId: by === 'nobody' ? null : personId,
    actorRole: by === 'nobody' || by === 'link' ? null : by,
    action,
    subjectKind: 'person',
    subjectId: personId,
    aboutPersonId: personId,
    details,
  });
}
