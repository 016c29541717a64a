import { randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import postgres from 'postgres';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { ownerSql } from '@/tests/support/database';

const statementsOf = (name: string) =>
  readFileSync(new URL(`../../../db/migrations/${name}.sql`, import.meta.url), 'utf8').split(
    '--> statement-breakpoint',
  );

const tag = randomBytes(4).toString('hex');
const database = `rubrics_${tag}`;
/** An owner as a hosted server has one: no superuser, and held by row security as everybody is. */
const role = `migrating_${tag}`;
let owner: postgres.Sql;
let keeper: postgres.Sql;

/** In one transaction, as migrating does. */
async function apply(name: string): Promise<void> {
  await owner.begin(async (tx) => {
    for (const statement of statementsOf(name)) await tx.unsafe(statement);
  });
}

const address = (user?: string) => {
  const url = new URL(inject('clusterUrl').replace('*', database));
  if (user) [url.username, url.password] = [user, 'of the tests'];
  return postgres(url.href, { max: 1, onnotice: () => {} });
};

/** Inserts a row and gives its id. */
async function row(table: string, values: Record<string, string | number | Date | null>): Promise<string> {
  const [made] = await keeper`insert into ${keeper(table)} ${keeper(values)} returning id`;
  return String(made?.id);
}

/** A school with a practical of each kind there could be: published, copied by oneself and by a colleague, put away. */
async function fillFirst(): Promise<void> {
  const school_id = await row('schools', { code: 'first', name: 'First', time_zone: 'UTC', unit: 'in' });
  const department_id = await row('departments', { school_id, name: 'Wood' });
  const person = (family_name: string) =>
    row('people', { school_id, family_name, given_name: 'Mo', local_id: family_name });
  const [mine, colleague] = [await person('Arden'), await person('Birch')];
  const practical = (title: string, owner_id: string, more: Record<string, string | Date> = {}) =>
    row('practicals', { school_id, department_id, owner_id, title, unit: 'in', ...more });
  const publish = (practical_id: string, published_by: string) =>
    row('rubric_versions', {
      ...{ school_id, practical_id, number: 1, engine_version: 1, published_by },
      ...{ task: '{}', form: '{}', rubric: '{}' },
    });
  const copied_from_version_id = await publish(await practical('caddy', mine), mine);
  await practical('draft', mine);
  await practical('own copy', mine, { copied_from_version_id });
  await publish(await practical('colleague’s copy', colleague, { copied_from_version_id }), colleague);
  await publish(await practical('put away', mine, { archived_at: new Date() }), mine);
}

beforeAll(async () => {
  const server = ownerSql();
  await server.unsafe(`create role ${role} login nosuperuser nobypassrls createrole password 'of the tests'`);
  await server.unsafe(`grant trymark_app, trymark_auth, trymark_worker to ${role}`);
  await server.unsafe(`create database ${database} owner ${role}`);
  owner = address(role);
  keeper = address();
  await apply('0000_station');
  await fillFirst();
});

afterAll(async () => {
  await Promise.all([owner.end(), keeper.end()]);
  const server = ownerSql();
  await server.unsafe(`drop database ${database} with (force)`);
  await server.unsafe(`drop role ${role}`);
});

describe('the tables of rubrics, laid over rows of the first version', () => {
  test('say of each practical what it is to its original, and keep on offer what could be copied', async () => {
    await apply('0001_rubrics');
    const rows = await keeper`
      select title, source_kind, offered_at is not null as offered from practicals order by created_at, title`;
    expect(rows.map(({ title, source_kind, offered }) => [title, source_kind, offered])).toEqual([
      ['caddy', null, true],
      ['draft', null, false],
      ['own copy', 'copy', false],
      ['colleague’s copy', 'adopted', true],
      ['put away', null, false],
    ]);
  });

  test('are walled off by school for their owner too, as all are', async () => {
    const rows = await keeper`select relname from pg_class join information_schema.columns c
      on c.table_name = relname and c.table_schema = 'public' and c.column_name = 'school_id'
      where relkind = 'r' and not (relrowsecurity and relforcerowsecurity)`;
    expect([...rows]).toEqual([]);
  });
});
