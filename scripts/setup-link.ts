import { sql } from 'drizzle-orm';
import { openDatabase } from '@/db/client';
import { schools, setupTokens } from '@/db/schema';
import { hashSecret, LINK_LIFE_MS, linkPath, makeSecret } from '@/lib/auth/secret-links';

/** A new one-time link that makes the first school and its admin; null once there is a school. */
export async function makeSetupLink(databaseUrl: string, appUrl: string): Promise<string | null> {
  const database = openDatabase(databaseUrl, 'trymark_auth', 1);
  try {
    const [school] = await database.select({ one: sql`1` }).from(schools).limit(1);
    if (school) return null;
    const secret = makeSecret();
    await database
      .insert(setupTokens)
      .values({ secretHash: hashSecret(secret), expiresAt: new Date(Date.now() + LINK_LIFE_MS.setup) });
    return new URL(linkPath('setup', secret), appUrl).href;
  } finally {
    await database.$client.end();
  }
}
