import 'server-only';
import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import { wasViewLogged } from '@/db/queries/log';
import * as schema from '@/db/schema';
import type { Actor } from '@/lib/auth/actor';
import { type Action, may, mayEver, type Subject } from '@/lib/auth/policy';
import {
  type FieldErrors,
  invalid,
  type Problem,
  type ProblemCode,
  problem,
  type Result,
} from '@/lib/result';
import { inSchool, withoutValues } from './database';

export interface LogEntry {
  subjectKind: string;
  subjectId?: string | null;
  aboutPersonId?: string | null;
  details?: Record<string, unknown>;
}

/** How whoever runs a long verb hears how far it has come, and calls it off. */
export interface Following {
  onProgress?(done: number, of: number): void;
  signal?: AbortSignal;
}

/** What a verb's body works with, inside its transaction. */
export interface Context<Input> {
  actor: Actor;
  input: Input;
  tx: Transaction;
  following: Following;
  /** Ends the verb with "not found" unless the policy allows the action on this row. */
  authorize(subject: Subject): void;
  /** The same for a row that may be absent; returns the row. */
  found<Row>(row: Row | null | undefined): Row;
  /** Ends the verb with a problem; what was written is rolled back. */
  refuse(code: ProblemCode, message: string, more?: Omit<Problem, 'code' | 'message'>): never;
  /** Ends the verb with messages at fields. */
  refuseFields(fields: FieldErrors): never;
  /** Appends to the access log in the same transaction. */
  log(entry: LogEntry): Promise<void>;
  /** The same for a look at records, once an hour: a refresh goes on with the same view. */
  logView(entry: LogEntry & { subjectId: string }, action?: Action): Promise<void>;
}

interface Verb<Schema extends z.ZodType, View> {
  action: Action;
  input: Schema;
  run(context: Context<z.output<Schema>>): Promise<View>;
}

/** Ends a verb; thrown inside its transaction, so that what was written is rolled back. */
export class Refusal extends Error {
  constructor(readonly problem: Problem) {
    super(problem.message);
  }
}

const NOT_FOUND = 'There is nothing here, or it is not yours to see.';

/**
 * Makes a verb: authorize the role, parse the contract, open the transaction; then the body loads by id and scope,
 * checks the policy on what it loaded, works, writes and logs. Any refusal rolls back.
 */
export function defineVerb<Schema extends z.ZodType, View>(verb: Verb<Schema, View>) {
  return async (
    actor: Actor | null,
    raw: z.input<Schema> | unknown,
    following: Following = {},
  ): Promise<Result<View>> => {
    if (!actor) return problem('unauthenticated', 'Sign in to go on.');
    if (actor.mustChangePassword || !mayEver(actor.role, verb.action)) {
      return problem('forbidden', 'Your role does not include this.');
    }
    const parsed = verb.input.safeParse(raw);
    if (!parsed.success) return invalid(fieldErrors(parsed.error));
    try {
      const value = await inSchool(actor.schoolId, (tx) =>
        verb.run({ ...context(verb.action, actor, parsed.data, tx), following }),
      );
      return { ok: true, value };
    } catch (error) {
      if (error instanceof Refusal) return { ok: false, problem: error.problem };
      return databaseProblem(error);
    }
  };
}

function context<Input>(
  action: Action,
  actor: Actor,
  input: Input,
  tx: Transaction,
): Omit<Context<Input>, 'following'> {
  const refuse = (
    code: ProblemCode,
    message: string,
    more: Omit<Problem, 'code' | 'message'> = {},
  ): never => {
    throw new Refusal({ code, message, ...more });
  };
  return {
    actor,
    input,
    tx,
    refuse,
    authorize: (subject) => {
      if (!may(actor, action, subject)) refuse('not_found', NOT_FOUND);
    },
    found: (row) => row ?? refuse('not_found', NOT_FOUND),
    refuseFields: (fields) => {
      throw new Refusal(invalid(fields).problem);
    },
    log: (entry) => appendLog(tx, actor, action, entry),
    logView: async (entry, as = action) => {
      const view = { actorId: actor.personId, action: as, subjectId: entry.subjectId };
      if (!(await wasViewLogged(tx, actor.schoolId, view))) await appendLog(tx, actor, as, entry);
    },
  };
}

export async function appendLog(
  tx: Transaction,
  actor: Actor,
  action: string,
  entry: LogEntry,
): Promise<void> {
  await tx.insert(schema.accessLog).values({
    schoolId: actor.schoolId,
    actorId: actor.personId,
    actorRole: actor.role,
    action,
    subjectKind: entry.subjectKind,
    subjectId: entry.subjectId ?? null,
    aboutPersonId: entry.aboutPersonId ?? null,
    details: entry.details ?? {},
  });
}

/** Zod's issues as messages by dotted path. */
export function fieldErrors(error: z.ZodError): FieldErrors {
  const fields: FieldErrors = {};
  for (const issue of error.issues) {
    const path = issue.path.join('.');
    fields[path] = [...(fields[path] ?? []), issue.message];
  }
  return fields;
}

const CONNECTION_CODES = /^(08|57P|57014|53|ECONN|CONNECT|EPIPE|ETIMEDOUT|EHOST|ENET|ENOTFOUND|EAI_AGAIN)/;

/** A database that is away, or a constraint that a simultaneous change ran into; anything else is a bug. */
export function databaseProblem(error: unknown): { ok: false; problem: Problem } {
  const code = codeOf(error);
  if (CONNECTION_CODES.test(code)) {
    return problem(
      'unavailable',
      'The database does not answer. Nothing was changed; try again in a moment.',
      {
        retryAfter: 5,
      },
    );
  }
  if (code === '23505' || code === '40001' || code === '40P01') {
    return problem(
      'conflict',
      'Somebody changed this at the same moment. Look at it again and repeat the change.',
    );
  }
  throw withoutValues(error);
}

/** The code of an error or of what caused it; by shape, for a bundle can hold one error class several times. */
function codeOf(error: unknown): string {
  if (typeof error !== 'object' || error === null) return '';
  if ('code' in error) return String(error.code);
  return 'cause' in error ? codeOf(error.cause) : '';
}
