import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/postgres-js';
import { migrate } from 'drizzle-orm/postgres-js/migrator';
import { Logger, runMigrations } from 'graphile-worker';
import postgres from 'postgres';

const MIGRATIONS = fileURLToPath(new URL('../db/migrations', import.meta.url));
const JOB_QUEUE = readFileSync(new URL('./job-queue.sql', import.meta.url), 'utf8');
/** Any number that nothing else in the database locks. */
const MIGRATING = 7_249_015;

/** Brings the tables and the job queue of a database up to this version; one instance at a time, the others wait. */
export async function migrateDatabase(url: string): Promise<void> {
  const owner = postgres(url, { max: 1, onnotice: () => {}, connect_timeout: 10 });
  try {
    await owner`select pg_advisory_lock(${MIGRATING})`;
    await migrate(drizzle({ client: owner }), { migrationsFolder: MIGRATIONS });
    await runMigrations({ connectionString: url, logger: new Logger(() => () => {}) });
    await owner.begin((tx) => tx.unsafe(JOB_QUEUE));
  } finally {
    await owner.end();
  }
}
