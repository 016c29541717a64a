import { drizzle } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import * as schema from '@/db/schema';
import { hashPassword } from '@/lib/auth/password';
import { demoAccounts, STAFF_PASSWORD, STUDENT_PASSPHRASE } from './accounts';
import { makeNames } from './names';
import { seedSchool } from './people';
import { ARDMORE, CEDAR_FORK } from './plan';
import { makeRandom } from './random';

const SEED = 20_261_201;

/**
 * Loads the invented demo into an empty, migrated database through the owner's connection and gives back the
 * accounts one can sign in with. The same seed makes the same demo everywhere.
 */
export async function seedDemo(databaseUrl: string) {
  const client = postgres(databaseUrl, { max: 1, onnotice: () => {} });
  const db = drizzle({ client, schema });
  const random = makeRandom(SEED);
  const nextName = makeNames(random);
  const hashes = {
    staff: await hashPassword(STAFF_PASSWORD),
    student: await hashPassword(STUDENT_PASSPHRASE),
  };
  try {
    return await db.transaction(async (tx) => {
      const schools = [];
      for (const plan of [CEDAR_FORK, ARDMORE]) {
        schools.push(await seedSchool(tx, random, plan, nextName, hashes));
      }
      return demoAccounts(schools);
    });
  } finally {
    await client.end();
  }
}
