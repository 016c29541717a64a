import { randomBytes } from 'node:crypto';
import { afterAll, beforeEach, expect, it } from 'vitest';
import { hashSecret, makeSecret } from '@/lib/auth/secret-links';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { readSetupLink } from '@/lib/data/account/read-link';
import { setUpSchool } from '@/lib/data/account/set-up-school';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { ownerSql } from '@/tests/support/database';
import { logOf, whileLogFails } from '@/tests/support/school';

const sql = ownerSql();
const HERE = '127.0.0.1';

afterAll(closeLimits);
beforeEach(async () => {
  await sql`delete from setup_tokens`;
});

async function makeSetupLink(minutes = 30): Promise<string> {
  const secret = makeSecret();
  const expires_at = new Date(Date.now() + minutes * 60_000);
  await sql`insert into setup_tokens ${sql({ secret_hash: hashSecret(secret), expires_at })}`;
  return secret;
}

function plan(secret: string, more: Record<string, unknown> = {}) {
  const tag = randomBytes(4).toString('hex');
  return {
    secret,
    schoolName: 'Cedar Fork High School',
    schoolCode: `cedar-fork-${tag}`,
    timeZone: 'America/Chicago',
    unit: 'in',
    departmentName: 'Wood and design',
    termName: 'Fall 2026',
    startsOn: '2026-08-24',
    endsOn: '2026-12-18',
    givenName: 'Rut',
    familyName: 'Lindqvist',
    email: `rut.${tag}@cedarfork.example`,
    password: 'plane with the grain',
    ...more,
  };
}

const countSchools = async () => (await sql`select 1 from schools`).count;

it('makes school, department, term and admin at once, logs it, and the admin can sign in', async () => {
  const typed = plan(await makeSetupLink(), { teaches: 'on', leads: 'on' });
  const made = await setUpSchool(typed, HERE);
  expect(made).toMatchObject({ ok: true, value: { role: 'teacher', schoolCode: typed.schoolCode } });
  const schoolId = made.ok ? made.value.schoolId : '';
  const [school] = await sql`select name, time_zone, unit from schools where id = ${schoolId}`;
  expect(school).toEqual({ name: typed.schoolName, time_zone: 'America/Chicago', unit: 'in' });
  const [term] =
    await sql`select name, starts_on::text, ends_on::text from terms where school_id = ${schoolId}`;
  expect(term).toEqual({ name: 'Fall 2026', starts_on: '2026-08-24', ends_on: '2026-12-18' });
  const roles = await sql`
    select role, department_id is not null as placed from person_roles where school_id = ${schoolId} order by role`;
  expect([...roles]).toEqual([
    { role: 'admin', placed: false },
    { role: 'head', placed: true },
    { role: 'teacher', placed: true },
  ]);
  expect(await logOf({ id: schoolId })).toEqual([expect.objectContaining({ action: 'school.set-up' })]);
  expect((await signInStaff({ email: typed.email, password: typed.password }, HERE)).ok).toBe(true);
});

it('makes an admin alone when nothing else is ticked', async () => {
  const made = await setUpSchool(plan(await makeSetupLink()), HERE);
  expect(made).toMatchObject({ ok: true, value: { role: 'admin' } });
});

it('works once, and ends every other set-up link: there is a school now', async () => {
  const [first, second] = [await makeSetupLink(), await makeSetupLink()];
  expect((await setUpSchool(plan(first), HERE)).ok).toBe(true);
  const schools = await countSchools();
  for (const secret of [first, second]) {
    expect(await setUpSchool(plan(secret), HERE)).toMatchObject({
      ok: false,
      problem: { code: 'conflict', message: expect.stringMatching(/used or replaced/) },
    });
  }
  expect(await countSchools()).toBe(schools);
});

it('makes one school when the form is sent twice at the same moment', async () => {
  const secret = await makeSetupLink();
  const schools = await countSchools();
  const both = await Promise.all([setUpSchool(plan(secret), HERE), setUpSchool(plan(secret), HERE)]);
  expect(both.filter(({ ok }) => ok)).toHaveLength(1);
  expect(await countSchools()).toBe(schools + 1);
});

it('is not used up by looking', async () => {
  const secret = await makeSetupLink();
  expect((await readSetupLink({ secret }, HERE)).ok).toBe(true);
  expect((await readSetupLink({ secret }, HERE)).ok).toBe(true);
  expect((await setUpSchool(plan(secret), HERE)).ok).toBe(true);
});

it.each([
  ['one that has ended', () => makeSetupLink(-1)],
  ['one that nobody made', async () => makeSecret()],
])('refuses %s', async (_, link) => {
  const schools = await countSchools();
  const secret = await link();
  expect((await readSetupLink({ secret }, HERE)).ok).toBe(false);
  expect((await setUpSchool(plan(secret), HERE)).ok).toBe(false);
  expect(await countSchools()).toBe(schools);
});

it('points to the code when another school has it', async () => {
  const typed = plan(await makeSetupLink());
  expect((await setUpSchool(typed, HERE)).ok).toBe(true);
  const again = await setUpSchool(plan(await makeSetupLink(), { schoolCode: typed.schoolCode }), HERE);
  expect(again).toMatchObject({
    ok: false,
    problem: { fields: { schoolCode: [expect.stringMatching(/Another school/)] } },
  });
});

it('points to the password when it is the school’s name, and keeps the link usable', async () => {
  const secret = await makeSetupLink();
  const refused = await setUpSchool(plan(secret, { password: 'Cedar Fork High School' }), HERE);
  expect(refused).toMatchObject({ ok: false, problem: { fields: { password: [expect.any(String)] } } });
  expect((await setUpSchool(plan(secret), HERE)).ok).toBe(true);
});

it('leaves nothing at all when the last write fails', async () => {
  const secret = await makeSetupLink();
  const typed = plan(secret);
  const schools = await countSchools();
  expect(await whileLogFails(() => setUpSchool(typed, HERE))).toBeInstanceOf(Error);
  expect(await countSchools()).toBe(schools);
  expect((await sql`select 1 from people where email = ${typed.email}`).count).toBe(0);
  expect((await setUpSchool(typed, HERE)).ok).toBe(true);
});
