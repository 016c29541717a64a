import { beforeAll, describe, expect, test } from 'vitest';
import { seedDemo } from '@/db/seed';
import { scoreSheetSchema } from '@/lib/contracts/results';
import { scoreAttempt } from '@/lib/scoring';
import { modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { attemptSchema, rubricSchema } from '@/lib/scoring/schemas';
import { databaseUrl, ownerSql } from '../../support/database';

const FINGERPRINT_TABLES = [
  'people',
  'enrollments',
  'practicals',
  'practical_drafts',
  'rubric_approvals',
  'rubric_versions',
  'attempts',
  'reading_events',
  'results',
  'accommodations',
  'accommodation_reasons',
];

/** The rows of a table as one hash, without the columns that salt or the clock fill. */
async function fingerprint(table: string): Promise<string> {
  const sql = ownerSql();
  const [row] = await sql<{ hash: string }[]>`
    select md5(string_agg(row, '|' order by row)) as hash from (
      select (to_jsonb(t) - '{created_at,password_hash}'::text[])::text as row from ${sql(table)} t) rows`;
  return row?.hash ?? '';
}

async function fingerprints(): Promise<string[]> {
  return Promise.all(FINGERPRINT_TABLES.map(fingerprint));
}

let accounts: Awaited<ReturnType<typeof seedDemo>>;

beforeAll(async () => {
  accounts = await seedDemo(databaseUrl());
});

describe('the demo', () => {
  test('has two schools, nine sections and about two hundred students', async () => {
    const [counts] = await ownerSql()`select
      (select count(*)::int from schools) as schools, (select count(*)::int from sections) as sections,
      (select count(*)::int from person_roles where role = 'student') as students`;
    expect(counts).toEqual({ schools: 2, sections: 9, students: 200 });
  });

  test('has four practicals measured and two of them published', async () => {
    const rows = await ownerSql()<{ title: string; published: boolean }[]>`
      select p.title, bool_or(s.state = 'published') as published
      from score_sheets h join attempts a on a.id = h.attempt_id join sittings s on s.id = a.sitting_id
      join practicals p on p.id = s.practical_id
      where h.side = 'bench' and h.finished group by p.title
      having count(*) > 20 order by p.title`;
    expect(rows.map(({ title, published }) => `${title}${published ? ', published' : ''}`)).toEqual([
      'Bench-hook kit, published',
      'Desk caddy',
      'Gauge kit',
      'Six-stick puzzle, published',
    ]);
  });

  test('holds the disorder of real life', async () => {
    const [found] = await ownerSql()`select
      (select count(*)::int from attempts where standing = 'absent') as absent,
      (select count(*)::int from attempts where standing = 'zero') as zero,
      (select count(*)::int from enrollments where left_on is not null) as left_a_section,
      (select count(*)::int from reading_events where value->>'kind' = 'spoiled') as split,
      (select count(*)::int from reading_events where value->>'state' = 'held') as held,
      (select sum(conflicts)::int from score_sheets) as conflicts,
      (select count(*)::int from attempts where number = 2) as redone,
      (select count(*)::int from rubric_versions where number = 2) as corrected,
      (select count(*)::int from reading_events e join sittings s on s.id = e.sitting_id
        join practicals p on p.id = s.practical_id
        where p.unit = 'in' and e.unit = 'mm') > 0 as caliper_in_mm,
      (select count(*)::int from in_hand) as tablets_not_heard_of`;
    expect(found).toEqual({
      absent: 2,
      zero: 1,
      left_a_section: 1,
      split: 1,
      held: 1,
      conflicts: 2,
      redone: 2,
      corrected: 1,
      caliper_in_mm: true,
      tablets_not_heard_of: 1,
    });
  });

  test('stores the sheets that the engine makes of what is recorded', async () => {
    const rows = await ownerSql()`select h.recorded, h.sheet, v.rubric, a.modification
      from score_sheets h join rubric_versions v on v.id = h.rubric_version_id
      left join accommodations a on a.id = h.accommodation_id`;
    expect(rows.length).toBeGreaterThan(300);
    for (const { recorded, sheet, rubric, modification } of rows) {
      const [prices, attempt] = [rubricSchema.parse(rubric), attemptSchema.parse(recorded)];
      const modified = modification === null ? null : modificationSchema.parse(modification);
      expect(scoreSheetSchema.parse(sheet)).toEqual(
        modified
          ? scoreAttempt(modifyRubric(prices, modified), modifyAttempt(prices, attempt, modified))
          : scoreAttempt(prices, attempt),
      );
    }
  });

  test('prices one student by a modified rubric for the term and one in a sitting, each with its reason', async () => {
    const rows = await ownerSql()`
      select a.sitting_id is null as term, length(r.reason) > 20 as reasoned,
        (select count(*)::int from score_sheets h where h.accommodation_id = a.id and h.side = 'bench') as sheets,
        (select count(*)::int from results t where t.accommodation_id = a.id) as results
      from accommodations a join accommodation_reasons r on r.accommodation_id = a.id
      where a.ended_at is null order by term`;
    expect(rows).toEqual([
      { term: false, reasoned: true, sheets: 1, results: 0 },
      { term: true, reasoned: true, sheets: 4, results: 2 },
    ]);
  });

  test('shares practicals: on offer, copied, one approved, and a difference with its reason', async () => {
    const [found] = await ownerSql()`select
      (select array_agg(title order by title) from practicals where offered_at is not null) as offered,
      (select count(*)::int from practicals where source_kind = 'adopted') as adopted,
      (select array_agg(p.title || ' ' || v.number) from rubric_approvals a
        join rubric_versions v on v.id = a.rubric_version_id join practicals p on p.id = a.practical_id
        where a.ended_at is null) as approved,
      (select count(*)::int from rubric_versions where difference_reason is not null) as reasons`;
    expect(found).toEqual({
      offered: ['Bench-hook kit', 'Desk caddy', 'Gauge kit', 'Six-stick puzzle'],
      adopted: 3,
      approved: ['Desk caddy 1'],
      reasons: 1,
    });
  });

  test('has an account of every role to sign in with', () => {
    expect(new Set(accounts.map(({ role }) => role))).toEqual(
      new Set(['teacher', 'student', 'head', 'aide', 'admin']),
    );
  });

  test('is the same wherever it is loaded', async () => {
    const first = await fingerprints();
    await ownerSql()`truncate schools cascade`;
    await seedDemo(databaseUrl());
    expect(await fingerprints()).toEqual(first);
  });
});
