import { parseEnv } from '@/lib/env';
import { accountLines, ensureDemo } from './demo';
import { migrateDatabase } from './migrate';
import { makeSetupLink } from './setup-link';

/** Gets the database ready for a start: up to date, and then with the demo or with the link to the first school. */
async function prepare(): Promise<void> {
  const say = (line: string) => console.log(line);
  const { DATABASE_URL, APP_URL } = parseEnv(process.env);
  await migrateDatabase(DATABASE_URL);
  if (process.env.TRYMARK_DEMO === 'yes') {
    const accounts = await ensureDemo(DATABASE_URL, say);
    say('\nThe demo can be signed in to as:');
    for (const line of accountLines(accounts)) say(line);
    return;
  }
  const link = await makeSetupLink(DATABASE_URL, APP_URL);
  if (!link) return;
  say('\nThere is no school yet. This link makes the first one and its admin, once, within seven days:');
  say(`  ${link}`);
}

try {
  await prepare();
} catch (error) {
  const { message, code } =
    error instanceof Error
      ? { code: '', ...error, message: error.message }
      : { code: '', message: String(error) };
  console.error(message || code);
  process.exitCode = 1;
}
