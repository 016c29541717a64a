import 'server-only';
import { sql } from 'drizzle-orm';
import { authDatabase } from '@/lib/data/database';

/** Whether the database answers now; asked by load balancers and by the start command, so without an actor. */
export async function checkDatabase(): Promise<boolean> {
  try {
    await authDatabase().execute(sql`select 1`);
    return true;
  } catch {
    return false;
  }
}
