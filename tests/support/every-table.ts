import { randomUUID } from 'node:crypto';
import type postgres from 'postgres';

export type Row = Record<string, unknown>;

interface Column {
  name: string;
  type: string;
  required: boolean;
}

interface Table {
  name: string;
  columns: Column[];
  links: { to: string; from: string[]; target: string[] }[];
  choices: Map<string, string>;
}

/** What a check of the table asks for beyond its type; everything else follows from the catalog. */
const ASKED: Record<string, Row> = {
  people: { local_id: '00417' },
  terms: { starts_on: '2026-08-24', ends_on: '2026-12-18' },
  results: { score_points: 97 },
};

/** Every tenant table of the database: those with a school_id. */
export async function tenantTables(owner: postgres.Sql): Promise<string[]> {
  const rows = await owner<{ name: string }[]>`
    select c.table_name as name from information_schema.columns c
    join information_schema.tables t using (table_schema, table_name)
    where c.table_schema = 'public' and c.column_name = 'school_id' and t.table_type = 'BASE TABLE'
    order by 1`;
  return rows.map(({ name }) => name);
}

/** Puts one row of a new school into every tenant table, following the foreign keys; returns the rows by table. */
export async function fillEveryTable(owner: postgres.Sql, code: string): Promise<Map<string, Row>> {
  const schoolId = randomUUID();
  const [school] = await owner<Row[]>`
    insert into schools (id, code, name, time_zone, unit)
    values (${schoolId}, ${code}, ${code}, 'America/Chicago', 'in') returning *`;
  const rows = new Map<string, Row>([['schools', school ?? {}]]);
  const waiting = await Promise.all((await tenantTables(owner)).map((name) => describeTable(owner, name)));
  while (waiting.length > 0) {
    const next = waiting.findIndex((table) =>
      table.links.every(({ to }) => to === table.name || rows.has(to)),
    );
    const [table] = waiting.splice(next, 1);
    if (next < 0 || !table) throw new Error('The foreign keys run in a circle.');
    const [made] = await owner<
      Row[]
    >`insert into ${owner(table.name)} ${owner(makeRow(table, rows, schoolId))} returning *`;
    rows.set(table.name, made ?? {});
  }
  return rows;
}

function makeRow(table: Table, rows: Map<string, Row>, schoolId: string): Row {
  const row: Row = { school_id: schoolId };
  for (const { name, type, required } of table.columns) {
    if (required && !(name in row)) row[name] = table.choices.get(name) ?? exampleOf(type);
  }
  for (const { to, from, target } of table.links) {
    const other = rows.get(to);
    from.forEach((column, index) => {
      if (column in row || table.columns.some(({ name, required }) => name === column && required)) {
        row[column] = other?.[target[index] ?? ''];
      }
    });
  }
  return { ...row, ...ASKED[table.name] };
}

function exampleOf(type: string): unknown {
  switch (type) {
    case 'uuid':
      return randomUUID();
    case 'text':
      return `row ${randomUUID().slice(0, 8)}`;
    case 'integer':
    case 'bigint':
      return 1;
    case 'boolean':
      return false;
    case 'date':
      return '2026-12-01';
    case 'jsonb':
      return '{}';
    case 'timestamp with time zone':
      return '2026-12-01T14:00:00Z';
    default:
      throw new Error(`There is no example of the type ${type} yet.`);
  }
}

async function describeTable(owner: postgres.Sql, name: string): Promise<Table> {
  const columns = await owner<Column[]>`
    select column_name as name, data_type as type, is_nullable = 'NO' and column_default is null as required
    from information_schema.columns where table_schema = 'public' and table_name = ${name}`;
  const links = await owner<Table['links']>`
    select c.confrelid::regclass::text as to,
      array(select attname::text from unnest(c.conkey) with ordinality k(num, pos)
        join pg_attribute on attrelid = c.conrelid and attnum = k.num order by k.pos) as from,
      array(select attname::text from unnest(c.confkey) with ordinality k(num, pos)
        join pg_attribute on attrelid = c.confrelid and attnum = k.num order by k.pos) as target
    from pg_constraint c where c.conrelid = ${name}::regclass and c.contype = 'f'`;
  const checks = await owner<{ definition: string }[]>`
    select pg_get_constraintdef(oid) as definition from pg_constraint
    where conrelid = ${name}::regclass and contype = 'c'`;
  const choices = new Map<string, string>();
  for (const { definition } of checks) {
    const [, column, first] = /^CHECK \(\((\w+) = ANY \(ARRAY\['([^']+)'/.exec(definition) ?? [];
    if (column && first) choices.set(column, first);
  }
  return { name, columns: [...columns], links: [...links], choices };
}
