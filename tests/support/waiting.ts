import { ownerSql } from './database';

/** Resolves once as many wait for a lock as the test has sent to wait for one. */
export async function untilWaiting(count = 1): Promise<void> {
  const [row] = await ownerSql()`
    select count(*)::int as waiting from pg_stat_activity
    where datname = current_database() and wait_event_type = 'Lock'`;
  if (row?.waiting < count) await untilWaiting(count);
}
