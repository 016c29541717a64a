import { sql } from 'drizzle-orm';
import postgres from 'postgres';
import { type Database, type DatabaseRole, openDatabase, type Transaction } from '@/db/client';

const opened: { end(): Promise<void> }[] = [];
let owner: postgres.Sql | undefined;
let app: Database | undefined;

/** Address of this test file's database. */
export function databaseUrl(): string {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('There is a database in integration tests alone.');
  return url;
}

/** The owner's connection: sees and changes everything, to arrange and to look behind the product's back. */
export function ownerSql(): postgres.Sql {
  if (!owner) {
    owner = postgres(databaseUrl(), { max: 2, onnotice: () => {} });
    opened.push(owner);
  }
  return owner;
}

/** A pool in one of the product's roles. */
export function databaseAs(role: DatabaseRole): Database {
  const database = openDatabase(databaseUrl(), role, 2);
  opened.push(database.$client);
  return database;
}

/** Runs work as the product does: in its own role, seeing one school, or none when that is null. */
export async function inSchoolAs<T>(
  schoolId: string | null,
  work: (tx: Transaction) => Promise<T>,
): Promise<T> {
  app ??= databaseAs('trymark_app');
  return app.transaction(async (tx) => {
    if (schoolId) await tx.execute(sql`select set_config('app.school_id', ${schoolId}, true)`);
    return work(tx);
  });
}
/** Ends every connection of this file, the product's own pools included. */
export async function closeDatabases(): Promise<void> {
  const held = globalThis as typeof globalThis & { trymarkPools?: Map<DatabaseRole, Database> };
  const pools = [...(held.trymarkPools?.values() ?? [])].map(({ $client }) => $client);
  await Promise.all([...opened, ...pools].map((client) => client.end()));
}
