import postgres from 'postgres';
import { describe, expect, it } from 'vitest';
import { ownerSql } from '@/tests/support/database';
import { fillEveryTable } from '@/tests/support/every-table';

const owner = ownerSql();
const rows = await fillEveryTable(owner, 'cedar-fork');
const schoolId = String(rows.get('schools')?.id);

async function codeOf(
  role: string,
  work: (sql: postgres.TransactionSql) => Promise<unknown>,
): Promise<string> {
  try {
    await owner.begin(async (sql) => {
      await sql`select set_config('app.school_id', ${schoolId}, true)`;
      if (role !== 'owner') await sql`set local role ${sql(role)}`;
      await work(sql);
      throw new Error('taken back');
    });
  } catch (error) {
    return error instanceof postgres.PostgresError ? error.code : 'allowed';
  }
  return 'allowed';
}

const DENIED = '42501';

describe('the product’s own role', () => {
  it('cannot read a password hash, by name or with all the rest', async () => {
    expect(await codeOf('trymark_app', (sql) => sql`select password_hash from credentials`)).toBe(DENIED);
    expect(await codeOf('trymark_app', (sql) => sql`select * from credentials`)).toBe(DENIED);
    expect(
      await codeOf('trymark_app', (sql) => sql`select person_id from credentials order by password_hash`),
    ).toBe(DENIED);
    expect(await codeOf('trymark_app', (sql) => sql`select person_id, must_change from credentials`)).toBe(
      'allowed',
    );
  });

  it('cannot read or make sessions of its own, nor see set-up links and sign-in counters', async () => {
    expect(await codeOf('trymark_app', (sql) => sql`select active_role from sessions`)).toBe(DENIED);
    expect(await codeOf('trymark_app', (sql) => sql`update sessions set active_role = 'admin'`)).toBe(DENIED);
    expect(await codeOf('trymark_app', (sql) => sql`select 1 from setup_tokens`)).toBe(DENIED);
    expect(await codeOf('trymark_app', (sql) => sql`select 1 from rate_limits`)).toBe(DENIED);
  });

  it.each(['trymark_app', 'trymark_auth', 'trymark_worker'])(
    '%s is no superuser and passes no wall',
    async (role) => {
      const [found] = await owner`
      select rolsuper, rolbypassrls, rolcanlogin, rolcreaterole from pg_roles where rolname = ${role}`;
      expect(found).toEqual({
        rolsuper: false,
        rolbypassrls: false,
        rolcanlogin: false,
        rolcreaterole: false,
      });
      expect((await owner`select 1 from pg_class where relowner = ${role}::regrole`).count).toBe(0);
    },
  );
});

describe('sign-in and the worker', () => {
  const reachable = async (role: string) => {
    const found = await owner<{ name: string }[]>`
      select relname as name from pg_class
      where relnamespace = 'public'::regnamespace and relkind = 'r'
        and has_any_column_privilege(${role}, oid, 'SELECT, INSERT, UPDATE') order by 1`;
    return found.map(({ name }) => name);
  };

  it('sign-in reaches people and their accounts, and no record of anybody’s work', async () => {
    expect(await reachable('trymark_auth')).toEqual([
      'access_log',
      'credentials',
      'departments',
      'people',
      'person_roles',
      'rate_limits',
      'schools',
      'sessions',
      'setup_tokens',
      'tokens',
    ]);
    expect(await codeOf('trymark_auth', (sql) => sql`select 1 from access_log`)).toBe(DENIED);
  });

  it('the worker reaches only what it sweeps', async () => {
    expect(await reachable('trymark_worker')).toEqual(['rate_limits', 'sessions', 'tokens']);
  });
});

describe('what was recorded or published', () => {
  const kept = [
    ...['rubric_versions', 'reading_events', 'publications', 'results', 'access_log', 'export_files'],
    'accommodation_reasons',
  ];

  it.each(kept)('%s cannot be changed or deleted, even by the owner of the tables', async (table) => {
    expect((await owner`select 1 from ${owner(table)}`).count).toBeGreaterThan(0);
    expect(await codeOf('owner', (sql) => sql`update ${sql(table)} set school_id = school_id`)).toBe('23000');
    expect(await codeOf('owner', (sql) => sql`delete from ${sql(table)}`)).toBe('23000');
  });

  it.each([
    ['accommodations', 'ended_at', 'ended_by', 'made_by'],
    ['rubric_approvals', 'ended_at', 'ended_by', 'approved_by'],
    ['sitting_moves', 'undone_at', 'undone_by', 'moved_by'],
  ])('%s can be ended once, and nothing else of them be changed', async (table, at, by, maker) => {
    const change = (sql: postgres.TransactionSql, values: string) =>
      sql.unsafe(`update ${table} set ${values} where ${at} is null`);
    const end = `${at} = now(), ${by} = ${maker}`;
    const standing = (sql: postgres.TransactionSql) =>
      sql.unsafe(`select 1 from ${table} where ${at} is null`).then(({ count }) => expect(count).toBe(1));
    expect(await codeOf('trymark_app', standing)).toBe('allowed');
    expect(await codeOf('trymark_app', (sql) => change(sql, end))).toBe('allowed');
    expect(await codeOf('trymark_app', (sql) => change(sql, `${maker} = ${maker}`))).toBe(DENIED);
    expect(
      await codeOf('trymark_app', async (sql) => {
        await change(sql, end);
        await sql.unsafe(`update ${table} set ${at} = null, ${by} = null`);
      }),
    ).toBe('23000');
  });

  it('other rows can be, so that the refusal above means something', async () => {
    expect(await codeOf('owner', (sql) => sql`update terms set name = name`)).toBe('allowed');
  });
});
