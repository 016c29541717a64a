import 'server-only';
import { sql } from 'drizzle-orm';
import { type Database, type DatabaseRole, openDatabase, type Transaction } from '@/db/client';
import { env } from '@/lib/env';

// One pool a role and process; kept on globalThis so that reloading modules in development opens no more.
const held = globalThis as typeof globalThis & { trymarkPools?: Map<DatabaseRole, Database> };

function pool(role: DatabaseRole): Database {
  const pools = held.trymarkPools ?? new Map<DatabaseRole, Database>();
  held.trymarkPools = pools;
  const open = pools.get(role) ?? openDatabase(env().DATABASE_URL, role);
  pools.set(role, open);
  return open;
}

/** The database as one school sees it, for one transaction. */
export function inSchool<T>(schoolId: string, work: (tx: Transaction) => Promise<T>): Promise<T> {
  return pool('trymark_app').transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.school_id', ${schoolId}, true)`);
    return work(tx);
  });
}

/** The database as sign-in sees it: people of all schools, and no record of anybody's work. */
export function authDatabase(): Database {
  return pool('trymark_auth');
}

/**
 * A failed query as an error that can be logged: its statement and code, without the values it was given, which are
 * people's names and addresses. Anything else passes unchanged.
 */
export function withoutValues(error: unknown): unknown {
  if (!(error instanceof Error) || !('query' in error)) return error;
  const { cause } = error;
  const code = cause instanceof Error && 'code' in cause ? String(cause.code) : 'unknown';
  return Object.assign(new Error(`A query failed (${code}): ${String(error.query)}`), { code });
}
