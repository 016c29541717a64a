import postgres from 'postgres';
import { seedDemo } from '@/db/seed';
import { migrateDatabase } from './migrate';

/** Somebody of the demo who can be signed in as: staff by email, students by school code and local ID. */
export interface DemoAccount {
  role: 'teacher' | 'student' | 'head' | 'aide' | 'admin';
  name: string;
  email: string | null;
  schoolCode: string | null;
  localId: string | null;
  password: string;
}

type DemoState = { accounts: DemoAccount[] } | 'half loaded' | 'none';

/** What a database holds of the demo; the mark stands in a schema of its own, beside the product's tables. */
async function demoState(owner: postgres.Sql): Promise<DemoState> {
  await owner`create schema if not exists demo`;
  await owner`create table if not exists demo.loads (started_at timestamptz not null default now(), accounts jsonb)`;
  const rows = await owner<{ accounts: DemoAccount[] | null }[]>`select accounts from demo.loads`;
  const [load] = rows;
  if (!load) return 'none';
  return load.accounts ? { accounts: load.accounts } : 'half loaded';
}

/**
 * Loads the demo into a database of our own cluster unless it is there; gives back its accounts.
 * A load that was cut short is begun again on a new database: nobody has worked on it.
 */
export async function ensureDemo(url: string, say: (line: string) => void): Promise<DemoAccount[]> {
  const owner = postgres(url, { max: 1, onnotice: () => {} });
  try {
    const state = await demoState(owner);
    if (typeof state === 'object') return state.accounts;
    if (state === 'half loaded') {
      say('Loading the demo was cut short last time; making its database anew ...');
      await owner.end();
      await recreateDatabase(url);
      return ensureDemo(url, say);
    }
    say('Loading the demo (once) ...');
    await owner`insert into demo.loads default values`;
    const accounts = await seedDemo(url);
    await owner`update demo.loads set accounts = ${owner.json(accounts.map((account) => ({ ...account })))}`;
    return accounts;
  } finally {
    await owner.end();
  }
}

async function recreateDatabase(url: string): Promise<void> {
  const target = new URL(url);
  const name = target.pathname.slice(1);
  target.pathname = '/postgres';
  const server = postgres(target.href, { max: 1, onnotice: () => {} });
  try {
    await server`drop database if exists ${server(name)} with (force)`;
    await server`create database ${server(name)}`;
  } finally {
    await server.end();
  }
  await migrateDatabase(url);
}

/** The accounts of a demo that has been loaded. */
export async function demoAccountsOf(url: string): Promise<DemoAccount[]> {
  const owner = postgres(url, { max: 1, onnotice: () => {} });
  try {
    const state = await demoState(owner);
    if (typeof state === 'string') throw new Error('There is no demo in this database.');
    return state.accounts;
  } finally {
    await owner.end();
  }
}

/** The demo's accounts as lines for the terminal. */
export function accountLines(accounts: DemoAccount[]): string[] {
  const width = Math.max(...accounts.map(({ name }) => name.length));
  return accounts.map(({ role, name, email, schoolCode, localId, password }) => {
    const who = email ?? `school code ${schoolCode}, ID ${localId}`;
    return `  ${role.padEnd(8)} ${name.padEnd(width)}  ${who}  /  ${password}`;
  });
}
