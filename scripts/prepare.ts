import { parseEnv } from '@/lib/env';
import { accountLines, ensureDemo } from './demo';
import { migrateDatabase } from './migrate';
import { makeSetupLink } from './setup-link';

/** Gets the database ready for a start. What it is doing goes to the error output, what people need to the other. */
async function prepare(): Promise<string[]> {
  const { DATABASE_URL, APP_URL } = parseEnv(process.env);
  await migrateDatabase(DATABASE_URL);
  if (process.env.TRYMARK_DEMO === 'yes') {
    const accounts = await ensureDemo(DATABASE_URL, (line) => console.error(line));
    return ['The demo can be signed in to as:', ...accountLines(accounts)];
  }
  const link = await makeSetupLink(DATABASE_URL, APP_URL);
  if (!link) return [];
  return [
    'There is no school yet. This link makes the first one and its admin, once, within seven days:',
    `  ${link}`,
  ];
}

/** A failure in one line, without the address's password. */
function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const code = 'code' in error ? String(error.code) : '';
  const isAway = /^(ECONN|ENOTFOUND|ETIMEDOUT|EHOSTUNREACH|CONNECT_TIMEOUT)/.test(code);
  if (!isAway || !process.env.DATABASE_URL) return error.message || code;
  return `The database at ${new URL(process.env.DATABASE_URL).host} does not answer (${code}).`;
}

try {
  for (const line of await prepare()) console.log(line);
} catch (error) {
  console.error(reasonOf(error));
  process.exitCode = 1;
}
