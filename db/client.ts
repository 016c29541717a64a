import { drizzle } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import * as schema from './schema';

/**
 * The roles that the product takes on, none of them owner or superuser:
 * `app` sees one school at a time; `auth` serves sign-in, before a school is known; `worker` sweeps what has expired.
 */
export type DatabaseRole = 'trymark_app' | 'trymark_auth' | 'trymark_worker';

/** Opens a pool whose every connection runs as the given role. */
export function openDatabase(url: string, role: DatabaseRole, max = 10) {
  const client = postgres(url, {
    max,
    idle_timeout: 30,
    connect_timeout: 5,
    onnotice: () => {},
    connection: { role, application_name: role, statement_timeout: 15_000 },
  });
  return drizzle({ client, schema });
}

export type Database = ReturnType<typeof openDatabase>;
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];
