import 'server-only';
import { sql } from 'drizzle-orm';
import type { DatabaseRole, Transaction } from '@/db/client';

const SET_ROLE: Record<DatabaseRole, ReturnType<typeof sql>> = {
  trymark_app: sql`set local role trymark_app`,
  trymark_auth: sql`set local role trymark_auth`,
  trymark_worker: sql`set local role trymark_worker`,
};

/**
 * Goes on in the same transaction as another of the product's roles, inside one school: for the few changes that must
 * be kept or dropped together although no single role may make them all.
 */
export async function asRole<T>(
  tx: Transaction,
  schoolId: string,
  [role, back]: [DatabaseRole, DatabaseRole],
  work: () => Promise<T>,
): Promise<T> {
  await tx.execute(SET_ROLE[role]);
  await tx.execute(sql`select set_config('app.school_id', ${schoolId}, true)`);
  const value = await work();
  await tx.execute(SET_ROLE[back]);
  return value;
}
