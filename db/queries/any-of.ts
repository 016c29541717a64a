import { type AnyColumn, type SQL, sql } from 'drizzle-orm';

/** One of these ids, however many: as a single parameter, where a list of them would be one each. */
export function anyOf(column: AnyColumn, ids: readonly string[]): SQL {
  return sql`${column} = any(${`{${ids.join(',')}}`}::uuid[])`;
}
