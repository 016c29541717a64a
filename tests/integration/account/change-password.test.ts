import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { changePassword, choosePassphrase } from '@/lib/data/account/change-password';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { signInStudent } from '@/lib/data/account/sign-in-student';
import { ownerSql } from '@/tests/support/database';
import { actorOf, logOf, makePerson, makeSchool, signIn, whileLogFails } from '@/tests/support/school';

const OLD = 'plane with the grain';
const NEW = 'seven dull chisels in a row';
const HERE = '127.0.0.1';

const sql = ownerSql();
const school = await makeSchool();

afterAll(closeLimits);
beforeEach(async () => {
  await sql`delete from rate_limits`;
});

async function teacher() {
  const person = await makePerson(school, ['teacher'], { password: OLD });
  return { person, actor: actorOf(school, person, 'teacher') };
}

async function newStudent() {
  const person = await makePerson(school, ['student'], { password: OLD, mustChange: true });
  return { person, actor: { ...actorOf(school, person, 'student'), mustChangePassword: true } };
}

describe('changing one’s own password', () => {
  it('needs the present one, ends every session, and is logged', async () => {
    const { person, actor } = await teacher();
    await Promise.all([
      signIn(school, person.personId, 'teacher'),
      signIn(school, person.personId, 'teacher'),
    ]);
    expect(await changePassword(actor, { current: OLD, password: NEW }, HERE)).toEqual({
      ok: true,
      value: null,
    });
    expect((await sql`select 1 from sessions where user_id = ${person.personId}`).count).toBe(0);
    expect((await signInStaff({ email: person.email, password: OLD }, HERE)).ok).toBe(false);
    expect((await signInStaff({ email: person.email, password: NEW }, HERE)).ok).toBe(true);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'account.change-password', actor_id: person.personId }),
    );
  });

  it('refuses a wrong present one at its field, with growing delays', async () => {
    const { actor } = await teacher();
    const fail = () => changePassword(actor, { current: 'not the present one', password: NEW }, HERE);
    expect(await fail()).toMatchObject({
      problem: { code: 'invalid', fields: { current: [expect.any(String)] } },
    });
    for (let slip = 2; slip <= 4; slip += 1) await fail();
    expect(await fail()).toMatchObject({ problem: { code: 'rate_limited' } });
  });

  it('refuses a weak new one at its field and keeps the old', async () => {
    const { person, actor } = await teacher();
    expect(await changePassword(actor, { current: OLD, password: 'too short' }, HERE)).toMatchObject({
      problem: { code: 'invalid', fields: { password: [expect.stringMatching(/15 characters/)] } },
    });
    expect((await signInStaff({ email: person.email, password: OLD }, HERE)).ok).toBe(true);
  });

  it('is for those who are signed in', async () => {
    expect(await changePassword(null, { current: OLD, password: NEW }, HERE)).toMatchObject({
      problem: { code: 'unauthenticated' },
    });
  });

  it('leaves password and sessions as they were when the log cannot be written', async () => {
    const { person, actor } = await teacher();
    await signIn(school, person.personId, 'teacher');
    const outcome = await whileLogFails(() => changePassword(actor, { current: OLD, password: NEW }, HERE));
    expect(outcome).toBeInstanceOf(Error);
    expect((await sql`select 1 from sessions where user_id = ${person.personId}`).count).toBe(1);
    expect((await signInStaff({ email: person.email, password: OLD }, HERE)).ok).toBe(true);
  });
});

describe('a student’s first choice', () => {
  it('replaces the words that were handed out, once', async () => {
    const { person, actor } = await newStudent();
    expect(await choosePassphrase(actor, { password: NEW }, HERE)).toEqual({ ok: true, value: null });
    const typed = { schoolCode: school.code, localId: person.localId };
    expect((await signInStudent({ ...typed, passphrase: NEW }, HERE)).ok).toBe(true);
    expect((await signInStudent({ ...typed, passphrase: OLD }, HERE)).ok).toBe(false);
    const [kept] = await sql`select must_change from credentials where person_id = ${person.personId}`;
    expect(kept?.must_change).toBe(false);
  });

  it('follows the same rules as any password', async () => {
    const { actor } = await newStudent();
    expect(await choosePassphrase(actor, { password: 'short' }, HERE)).toMatchObject({
      problem: { code: 'invalid', fields: { password: [expect.any(String)] } },
    });
  });

  it('does not let somebody change a password of their own choosing without the present one', async () => {
    const { actor } = await teacher();
    expect(await choosePassphrase(actor, { password: NEW }, HERE)).toMatchObject({
      problem: { code: 'forbidden' },
    });
  });
});
