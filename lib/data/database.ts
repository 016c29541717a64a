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
