import { randomUUID } from 'node:crypto';
import postgres from 'postgres';
import type { Actor } from '@/lib/auth/actor';
import { AXES, type Rubric, type SizeRule } from '@/lib/scoring';
import { defaultForm, defaultRubric, defaultTask } from '@/tests/support/rubrics';

export const ATTEMPTS = 10_000;

export interface Stage {
  actor: Actor;
  sittingId: string;
  /** The version that the sitting is moved to. */
  versionId: string;
  to: Rubric;
}

/** What is short costs at half the distance, what is long at twice: some gain and some lose. */
function otherPrices(rubric: Rubric): Rubric {
  const scale = (bands: { within: number; lose: number }[], factor: number) =>
    bands.map(({ within, lose }) => ({ within: within * factor, lose }));
  const size = (rule: SizeRule) => ({ ...rule, over: scale(rule.over, 2), under: scale(rule.under, 0.5) });
  return {
    ...rubric,
    lines: rubric.lines.map((line) => {
      const { thickness, width, length } = line.sizes;
      return { ...line, sizes: { thickness: size(thickness), width: size(width), length: size(length) } };
    }),
  };
}

/**
 * One sitting of 10 000 students in an empty database, its events made by the database itself: every one of 27 sizes
 * read, up to 3/64 in off the target. The sheets are still to be built.
 */
export async function layStage(url: string): Promise<Stage> {
  const sql = postgres(url, { max: 1, onnotice: () => {} });
  const ids = new Map<string, string>();
  const id = (name: string) => {
    const known = ids.get(name) ?? randomUUID();
    ids.set(name, known);
    return known;
  };
  const [from, to] = [defaultRubric(), otherPrices(defaultRubric())];
  const json = (value: unknown) => JSON.stringify(value);
  try {
    await sql.begin(async (tx) => {
      await tx`select setseed(0.20261201)`;
      await tx`insert into schools (id, code, name, time_zone, unit)
        values (${id('school')}, 'bench', 'Bench', 'America/Chicago', 'in')`;
      await tx`insert into departments (school_id, id, name) values (${id('school')}, ${id('department')}, 'Wood')`;
      await tx`insert into terms (school_id, id, name, starts_on, ends_on)
        values (${id('school')}, ${id('term')}, 'term', current_date - 60, current_date + 60)`;
      await tx`insert into people (school_id, id, given_name, family_name, email)
        values (${id('school')}, ${id('teacher')}, 'Rut', 'Lindqvist', 'rut@bench.example')`;
      await tx`insert into people (school_id, id, given_name, family_name, local_id)
        select ${id('school')}, gen_random_uuid(), 'Student', 'No. ' || n, lpad(n::text, 6, '0')
        from generate_series(1, ${ATTEMPTS}::int) n`;
      await tx`insert into sections (school_id, id, department_id, term_id, name, period)
        values (${id('school')}, ${id('section')}, ${id('department')}, ${id('term')}, 'Woods', '1')`;
      await tx`insert into section_staff (school_id, section_id, person_id, duty)
        values (${id('school')}, ${id('section')}, ${id('teacher')}, 'teacher')`;
      await tx`insert into enrollments (school_id, section_id, student_id, joined_on)
        select school_id, ${id('section')}, id, current_date - 30 from people where local_id is not null`;
      await tx`insert into practicals (school_id, id, department_id, owner_id, title, unit)
        values (${id('school')}, ${id('practical')}, ${id('department')}, ${id('teacher')}, 'Desk caddy', 'in')`;
      for (const [name, number, rubric] of [
        ['v1', 1, from],
        ['v2', 2, to],
      ] as const) {
        await tx`insert into rubric_versions
            (school_id, id, practical_id, number, task, form, rubric, engine_version, published_by)
          values (${id('school')}, ${id(name)}, ${id('practical')}, ${number}, ${json(defaultTask())}::text::jsonb,
            ${json(defaultForm())}::text::jsonb, ${json(rubric)}::text::jsonb, 1, ${id('teacher')})`;
      }
      await tx`insert into sittings (school_id, id, section_id, practical_id, rubric_version_id, opened_by)
        values (${id('school')}, ${id('sitting')}, ${id('section')}, ${id('practical')}, ${id('v1')}, ${id('teacher')})`;
      await tx`insert into attempts (school_id, sitting_id, student_id, number)
        select school_id, ${id('sitting')}, id, 1 from people where local_id is not null`;
    });
    // Without knowing how many attempts there are, the database would look each of them up by reading them all.
    await sql`vacuum analyze`;
    await sql.begin((tx) => readEverything(tx, from, id));
    await sql`vacuum analyze`;
  } finally {
    await sql.end();
  }
  return { actor: teacherOf(id), sittingId: id('sitting'), versionId: id('v2'), to };
}

async function readEverything(
  tx: postgres.TransactionSql,
  { lines, workChecks }: Rubric,
  id: (name: string) => string,
): Promise<void> {
  const sizes = lines.flatMap(({ id: line, quantity, target }) =>
    Array.from({ length: quantity }, (_, at) =>
      AXES.map((what) => ({ line, ordinal: at + 1, what, target: target[what] })),
    ).flat(),
  );
  await tx`
    insert into reading_events (school_id, id, sitting_id, attempt_id, side, line_id, ordinal, what, value,
      reading_ticks, typed, unit, instrument, device_id, sequence, captured_at, author_id, sender_id)
    select school_id, gen_random_uuid(), sitting_id, attempt_id, 'bench', line, ordinal, what,
      jsonb_build_object('kind', 'value', 'ticks', ticks), ticks, 'read', 'in', 'rule', ${id('device')},
      row_number() over (), now(), ${id('teacher')}, ${id('teacher')}
    from (
      select a.school_id, a.sitting_id, a.id as attempt_id, s.line, s.ordinal, s.what,
        s.target + round((random() + random() + random() - 1.5) * 7937500)::bigint as ticks
      from attempts a, jsonb_to_recordset(${JSON.stringify(sizes)}::text::jsonb)
        as s (line text, ordinal int, what text, target bigint)) read`;
  await tx`
    insert into reading_events (school_id, id, sitting_id, attempt_id, side, line_id, ordinal, what, value,
      device_id, sequence, captured_at, author_id, sender_id)
    select a.school_id, gen_random_uuid(), a.sitting_id, a.id, 'bench', '', 0, c.id, '{"kind":"level","level":0}',
      ${id('device')}, 1000000 + row_number() over (), now(), ${id('teacher')}, ${id('teacher')}
    from attempts a, jsonb_to_recordset(${JSON.stringify(workChecks)}::text::jsonb) as c (id text)`;
}

function teacherOf(id: (name: string) => string): Actor {
  return {
    personId: id('teacher'),
    schoolId: id('school'),
    role: 'teacher',
    roles: ['teacher'],
    departmentId: id('department'),
    givenName: 'Rut',
    familyName: 'Lindqvist',
    schoolName: 'Bench',
    mustChangePassword: false,
  };
}
