import { drizzle } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import type { Transaction } from '@/db/client';
import * as schema from '@/db/schema';
import { hashPassword } from '@/lib/auth/password';
import { seedSittingAccommodation, seedTermAccommodation } from './accommodations';
import { demoAccounts, STAFF_PASSWORD, STUDENT_PASSPHRASE } from './accounts';
import { makeNames } from './names';
import { type SeededSchool, seedSchool } from './people';
import { ARDMORE, CEDAR_FORK, SITTINGS } from './plan';
import { seedPracticals } from './practicals';
import { seedPublication } from './publications';
import { makeRandom, type Random } from './random';
import { seedSharing } from './sharing';
import { seedSitting } from './sittings';

const SEED = 20_261_201;
/** Of its own, so that what is shared can change without changing what was measured. */
const SHARING_SEED = 20_261_202;
const MODIFIED_SEED = 20_261_203;

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
        const school = await seedSchool(tx, random, plan, nextName, hashes);
        await seedWork(tx, random, school);
        schools.push(school);
      }
      return demoAccounts(schools);
    });
  } finally {
    await client.end();
  }
}

/** Everything the people of a school have made and recorded so far. */
async function seedWork(tx: Transaction, random: Random, school: SeededSchool): Promise<void> {
  const versions = await seedPracticals(tx, random, school);
  const modified = makeRandom(MODIFIED_SEED);
  await seedTermAccommodation(tx, modified, school);
  for (const plan of SITTINGS.filter(({ section }) => school.sections.has(section))) {
    const sitting = await seedSitting(tx, random, school, versions, plan);
    await seedSittingAccommodation(tx, modified, school, sitting);
    await seedPublication(tx, random, school, sitting);
  }
  if (school.plan === CEDAR_FORK) await seedSharing(tx, makeRandom(SHARING_SEED), school, versions);
}
