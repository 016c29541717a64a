import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { hashSecret, makeSecret } from '@/lib/auth/secret-links';
import { accountKey, closeLimits } from '@/lib/auth/sign-in-limits';
import { askReset } from '@/lib/data/account/ask-reset';
import { readInvitation, readResetLink } from '@/lib/data/account/read-link';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { acceptInvitation, resetPassword } from '@/lib/data/account/use-link';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  mailsTo,
  makePerson,
  makeSchool,
  secretOf,
  signIn,
  type TestPerson,
  whileLogFails,
} from '@/tests/support/school';

const OLD = 'plane with the grain';
const NEW = 'seven dull chisels in a row';

const sql = ownerSql();
const school = await makeSchool();
const address = () => `10.0.0.${randomUUID()}`;

afterAll(closeLimits);

async function makeLink(person: TestPerson, kind: 'invitation' | 'reset', minutes = 30): Promise<string> {
  const secret = makeSecret();
  await sql`insert into tokens ${sql({
    school_id: school.id,
    person_id: person.personId,
    kind,
    secret_hash: hashSecret(secret),
    expires_at: new Date(Date.now() + minutes * 60_000),
  })}`;
  return secret;
}

const canSignIn = async (person: TestPerson, password: string) =>
  (await signInStaff({ email: person.email, password }, address())).ok;

describe('an invitation', () => {
  it('sets the first password, signs its person in, is logged, and works once', async () => {
    const person = await makePerson(school, ['teacher']);
    const secret = await makeLink(person, 'invitation');
    expect(await acceptInvitation({ secret, password: NEW }, address())).toMatchObject({
      ok: true,
      value: { personId: person.personId, schoolId: school.id, role: 'teacher' },
    });
    expect(await canSignIn(person, NEW)).toBe(true);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'account.invitation', about_person_id: person.personId }),
    );
    expect(
      await acceptInvitation({ secret, password: 'another password altogether' }, address()),
    ).toMatchObject({
      ok: false,
      problem: {
        code: 'conflict',
        message: expect.stringMatching(/has been used or replaced.*send another/),
      },
    });
    expect(await canSignIn(person, NEW)).toBe(true);
  });

  it('is not used up by looking at it, however often', async () => {
    const person = await makePerson(school, ['teacher'], { givenName: 'Maja', familyName: 'Bergström' });
    const secret = await makeLink(person, 'invitation');
    for (let look = 0; look < 3; look += 1) {
      expect(await readInvitation({ secret }, address())).toEqual({
        ok: true,
        value: { givenName: 'Maja', familyName: 'Bergström', email: person.email, schoolName: school.name },
      });
    }
    expect((await acceptInvitation({ secret, password: NEW }, address())).ok).toBe(true);
  });

  it('keeps of its secret only the hash', async () => {
    const secret = await makeLink(await makePerson(school, ['teacher']), 'invitation');
    const [row] = await sql`select * from tokens where secret_hash = ${hashSecret(secret)}`;
    expect(JSON.stringify(row)).not.toContain(secret);
  });

  it('is used by one of two who press at the same moment', async () => {
    const person = await makePerson(school, ['teacher']);
    const secret = await makeLink(person, 'invitation');
    const both = await Promise.all([
      acceptInvitation({ secret, password: NEW }, address()),
      acceptInvitation({ secret, password: 'another password altogether' }, address()),
    ]);
    expect(both.filter(({ ok }) => ok)).toHaveLength(1);
  });

  it('that has ended says so and whom to ask', async () => {
    const secret = await makeLink(await makePerson(school, ['teacher']), 'invitation', -1);
    const ended = {
      ok: false,
      problem: { code: 'conflict', message: expect.stringMatching(/has ended. Ask the person who/) },
    };
    expect(await readInvitation({ secret }, address())).toMatchObject(ended);
    expect(await acceptInvitation({ secret, password: NEW }, address())).toMatchObject(ended);
  });

  it('of somebody who has left works no more', async () => {
    const secret = await makeLink(await makePerson(school, ['teacher'], { left: true }), 'invitation');
    expect((await acceptInvitation({ secret, password: NEW }, address())).ok).toBe(false);
  });

  it.each(['', 'short', makeSecret()])(
    'with the secret %j is not known, and says to check it',
    async (secret) => {
      expect((await readInvitation({ secret }, address())).ok).toBe(false);
      expect((await acceptInvitation({ secret, password: NEW }, address())).ok).toBe(false);
    },
  );

  it('is no reset link, and a reset link no invitation', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    expect((await readResetLink({ secret: await makeLink(person, 'invitation') }, address())).ok).toBe(false);
    expect((await readInvitation({ secret: await makeLink(person, 'reset') }, address())).ok).toBe(false);
  });

  it('refuses a password at its field and stays usable', async () => {
    const person = await makePerson(school, ['teacher']);
    const secret = await makeLink(person, 'invitation');
    const refused = await acceptInvitation({ secret, password: person.email }, address());
    expect(refused).toMatchObject({
      ok: false,
      problem: { code: 'invalid', fields: { password: [expect.any(String)] } },
    });
    expect((await acceptInvitation({ secret, password: NEW }, address())).ok).toBe(true);
  });

  it('leaves neither password nor used link when the last write fails', async () => {
    const person = await makePerson(school, ['teacher']);
    const secret = await makeLink(person, 'invitation');
    expect(await whileLogFails(() => acceptInvitation({ secret, password: NEW }, address()))).toBeInstanceOf(
      Error,
    );
    expect(await canSignIn(person, NEW)).toBe(false);
    expect((await acceptInvitation({ secret, password: NEW }, address())).ok).toBe(true);
  });
});

describe('a reset', () => {
  it('mails a link that lives an hour and sets the password anew', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    const email = person.email ?? '';
    expect(await askReset({ email: email.toUpperCase() }, address())).toEqual({ ok: true, value: null });
    const [mail, ...more] = await mailsTo(email);
    expect(more).toEqual([]);
    expect(mail).toMatchObject({
      template: 'password-reset',
      data: { givenName: person.givenName, minutes: 60 },
    });
    const secret = secretOf(mail);
    expect(mail?.data.link).toBe(`http://127.0.0.1:3000/reset/${secret}`);
    const [link] = await sql`
      select expires_at - created_at as life from tokens where secret_hash = ${hashSecret(secret)}`;
    expect(String(link?.life)).toMatch(/^(00:59:59|01:00:00)/);
    expect((await resetPassword({ secret, password: NEW }, address())).ok).toBe(true);
    expect(await canSignIn(person, OLD)).toBe(false);
    expect(await canSignIn(person, NEW)).toBe(true);
  });

  it('answers the same whether or not there is an account, and mails nothing where there is none', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    const known = await askReset({ email: person.email }, address());
    const unknown = await askReset({ email: 'nobody@cedarfork.example' }, address());
    expect(unknown).toEqual(known);
    expect(await mailsTo('nobody@cedarfork.example')).toEqual([]);
  });

  it('takes the same time whether or not there is an account', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    const timed = async (email: string | null) => {
      const began = performance.now();
      await askReset({ email }, address());
      return performance.now() - began;
    };
    expect(await timed(person.email)).toBeGreaterThanOrEqual(395);
    expect(await timed('nobody.else@cedarfork.example')).toBeGreaterThanOrEqual(395);
  });

  it('mails an account at most five links an hour', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    await Promise.all(Array.from({ length: 7 }, () => askReset({ email: person.email }, address())));
    expect(await mailsTo(person.email ?? '')).toHaveLength(5);
  });

  it('is not for students: their teacher gives them new words', async () => {
    const student = await makePerson(school, ['student'], { email: 'dara@cedarfork.example', password: OLD });
    await askReset({ email: student.email }, address());
    expect(await mailsTo('dara@cedarfork.example')).toEqual([]);
  });

  it('ends every session and every other link of the person, and opens a closed account', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    await signIn(school, person.personId, 'teacher');
    const other = await makeLink(person, 'reset');
    const secret = await makeLink(person, 'reset');
    const account = accountKey({ email: person.email ?? '' });
    await sql`insert into rate_limits (key, points) values (${`failures:${account}`}, 101)`;
    expect((await resetPassword({ secret, password: NEW }, address())).ok).toBe(true);
    expect((await sql`select 1 from sessions where user_id = ${person.personId}`).count).toBe(0);
    expect((await resetPassword({ secret: other, password: OLD }, address())).ok).toBe(false);
    expect(await canSignIn(person, NEW)).toBe(true);
  });

  it('says at the field what is no email address', async () => {
    expect(await askReset({ email: 'rut at cedarfork' }, address())).toMatchObject({
      ok: false,
      problem: { code: 'invalid', fields: { email: [expect.stringMatching(/not an email address/)] } },
    });
  });

  it('leaves neither link nor mail when the log cannot be written', async () => {
    const person = await makePerson(school, ['teacher'], { password: OLD });
    expect(await whileLogFails(() => askReset({ email: person.email }, address()))).toBeInstanceOf(Error);
    expect(await mailsTo(person.email ?? '')).toEqual([]);
    expect((await sql`select 1 from tokens where person_id = ${person.personId}`).count).toBe(0);
  });
});
