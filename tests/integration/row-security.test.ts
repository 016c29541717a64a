import postgres from 'postgres';
import { describe, expect, it } from 'vitest';
import { ownerSql } from '@/tests/support/database';
import { fillEveryTable, type Row, tenantTables } from '@/tests/support/every-table';

const owner = ownerSql();
const tables = [...(await tenantTables(owner)), 'schools'];
const ours = await fillEveryTable(owner, 'cedar-fork');
const theirs = await fillEveryTable(owner, 'ardmore');
const ourSchool = String(ours.get('schools')?.id);
const theirSchool = String(theirs.get('schools')?.id);

// With every grant given, whatever is refused here is refused by the wall between the schools alone.
await owner`grant all on all tables in schema public to trymark_app`;

const ROW_REFUSED = '42501';
const NEVER_CHANGED = '23000';

class RolledBack extends Error {}

/** Works as the product's role in one school, or in none, and takes back all of it. */
async function asProduct<T>(
  schoolId: string | null,
  work: (sql: postgres.TransactionSql) => Promise<T>,
): Promise<T> {
  let value: T | undefined;
  try {
    await owner.begin(async (sql) => {
      await sql`set local role trymark_app`;
      if (schoolId) await sql`select set_config('app.school_id', ${schoolId}, true)`;
      value = await work(sql);
      throw new RolledBack();
    });
  } catch (error) {
    if (!(error instanceof RolledBack)) throw error;
  }
  return value as T;
}

/** The code that the database refuses the work with, or `kept` when it does not. */
async function refusal(
  schoolId: string | null,
  work: (sql: postgres.TransactionSql) => Promise<unknown>,
): Promise<string> {
  try {
    await asProduct(schoolId, work);
    return 'kept';
  } catch (error) {
    if (error instanceof postgres.PostgresError) return error.code;
    throw error;
  }
}

const keyOf = (table: string) => (table === 'schools' ? 'id' : 'school_id');

function rowOf(rows: Map<string, Row>, table: string): Row {
  const row = rows.get(table);
  if (!row) throw new Error(`${table} holds no row to test with.`);
  const asJson = Object.entries(row).map(([name, value]) => [
    name,
    value !== null && typeof value === 'object' && !Array.isArray(value) && !(value instanceof Date)
      ? JSON.stringify(value)
      : value,
  ]);
  return Object.fromEntries(asJson);
}

it('covers every table that a school’s rows are kept in', () => {
  expect(tables.length).toBeGreaterThanOrEqual(23);
  expect([...ours.keys()].sort()).toEqual([...tables].sort());
});

describe.each(tables)('%s', (table) => {
  const key = keyOf(table);
  const read = (sql: postgres.TransactionSql) => sql`select ${sql(key)} as school from ${sql(table)}`;
  const insertOurs = (sql: postgres.TransactionSql) =>
    sql`insert into ${sql(table)} ${sql(rowOf(ours, table))}`;

  it('has row-level security on, and forced on its owner too', async () => {
    const [state] = await owner`
      select relrowsecurity as on, relforcerowsecurity as forced from pg_class where oid = ${table}::regclass`;
    expect(state).toEqual({ on: true, forced: true });
  });

  it('shows each school its own row', async () => {
    expect(await asProduct(ourSchool, read)).toEqual([{ school: ourSchool }]);
    expect(await asProduct(theirSchool, read)).toEqual([{ school: theirSchool }]);
  });

  it('shows, changes and deletes nothing without a school', async () => {
    expect(await asProduct(null, read)).toEqual([]);
    const changed = await asProduct(null, (sql) => sql`update ${sql(table)} set ${sql(key)} = ${sql(key)}`);
    expect(changed.count).toBe(0);
    expect((await asProduct(null, (sql) => sql`delete from ${sql(table)}`)).count).toBe(0);
  });

  it('takes no row without a school', async () => {
    expect(await refusal(null, insertOurs)).toBe(ROW_REFUSED);
  });

  it('changes and deletes nothing of another school', async () => {
    const changed = await asProduct(
      theirSchool,
      (sql) => sql`update ${sql(table)} set ${sql(key)} = ${sql(key)} where ${sql(key)} = ${ourSchool}`,
    );
    expect(changed.count).toBe(0);
    const deleted = await asProduct(
      theirSchool,
      (sql) => sql`delete from ${sql(table)} where ${sql(key)} = ${ourSchool}`,
    );
    expect(deleted.count).toBe(0);
  });

  it('takes no row for another school, and lets none be moved there', async () => {
    expect(await refusal(theirSchool, insertOurs)).toBe(ROW_REFUSED);
    const moved = await refusal(
      theirSchool,
      (sql) => sql`update ${sql(table)} set ${sql(key)} = ${ourSchool}`,
    );
    expect([ROW_REFUSED, NEVER_CHANGED]).toContain(moved);
  });

  it('would have taken the same row for its own school, were it not there already', async () => {
    expect(await refusal(ourSchool, insertOurs)).toBe('23505');
  });
});
