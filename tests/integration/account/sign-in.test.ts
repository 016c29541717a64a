import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { signInStudent } from '@/lib/data/account/sign-in-student';
import { ownerSql } from '@/tests/support/database';
import { logOf, makePerson, makeSchool, whileLogFails } from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const WORDS = 'maple otter quarter lagoon';

const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const address = () => `10.0.0.${randomUUID()}`;

afterAll(closeLimits);

describe('staff', () => {
  it('sign in by email and password, in any case of the address, and the log says so', async () => {
    const person = await makePerson(school, ['teacher'], { password: PASSWORD });
    const result = await signInStaff(
      { email: ` ${person.email?.toUpperCase()} `, password: PASSWORD },
      address(),
    );
    expect(result).toEqual({
      ok: true,
      value: {
        personId: person.personId,
        schoolId: school.id,
        role: 'teacher',
        schoolName: school.name,
        schoolCode: school.code,
      },
    });
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'account.sign-in', actor_id: person.personId }),
    );
  });

  it('begin in the role with the most to do when they hold several', async () => {
    const both = await makePerson(school, ['admin', 'head', 'teacher'], { password: PASSWORD });
    const result = await signInStaff({ email: both.email, password: PASSWORD }, address());
    expect(result).toMatchObject({ ok: true, value: { role: 'teacher' } });
  });

  it.each([
    ['a wrong password', { password: PASSWORD }, 'plane against the grain'],
    ['no password yet', {}, PASSWORD],
    ['somebody who left', { password: PASSWORD, left: true }, PASSWORD],
  ])('get one answer for %s as for an unknown address', async (_, choice, typed) => {
    const person = await makePerson(school, ['teacher'], choice);
    const known = await signInStaff({ email: person.email, password: typed }, address());
    const unknown = await signInStaff({ email: 'nobody@cedarfork.example', password: typed }, address());
    expect(known).toMatchObject({ ok: false, problem: { code: 'invalid' } });
    expect(known).toEqual(unknown);
    await ownerSql()`delete from rate_limits`;
  });

  it('cannot come in by an account that is a student’s alone', async () => {
    const person = await makePerson(school, ['student'], {
      email: 'wayra@cedarfork.example',
      password: WORDS,
    });
    expect((await signInStaff({ email: person.email, password: WORDS }, address())).ok).toBe(false);
  });

  it('are told which field is empty', async () => {
    const result = await signInStaff({ email: ' ', password: '' }, address());
    expect(result).toMatchObject({
      ok: false,
      problem: {
        code: 'invalid',
        fields: { email: ['Type your email.'], password: ['Type your password.'] },
      },
    });
  });

  it('wait about as long for an unknown address as for a wrong password', async () => {
    const person = await makePerson(school, ['teacher'], { password: PASSWORD });
    const timed = async (email: string | null) => {
      const began = performance.now();
      await signInStaff({ email, password: 'plane against the grain' }, address());
      return performance.now() - began;
    };
    const known: number[] = [];
    const unknown: number[] = [];
    for (let round = 0; round < 5; round += 1) {
      known.push(await timed(person.email));
      unknown.push(await timed(`nobody-${round}@cedarfork.example`));
      await ownerSql()`delete from rate_limits`;
    }
    const middle = (times: number[]) => times.toSorted((a, b) => a - b)[2] ?? 0;
    expect(middle(unknown)).toBeGreaterThan(middle(known) * 0.5);
    expect(middle(unknown)).toBeLessThan(middle(known) * 2);
  });
});

describe('students', () => {
  it('sign in by school code, ID and words, however a phone writes the words', async () => {
    const person = await makePerson(school, ['student'], { password: WORDS, mustChange: true });
    const typed = { schoolCode: school.code.toUpperCase(), localId: person.localId };
    for (const passphrase of [WORDS, 'Maple Otter Quarter Lagoon', ' maple-otter-quarter-lagoon ']) {
      const result = await signInStudent({ ...typed, passphrase }, address());
      expect(result).toMatchObject({ ok: true, value: { personId: person.personId, role: 'student' } });
    }
  });

  it('keep the zeros of their ID', async () => {
    const [withZeros, without] = await Promise.all([
      makePerson(school, ['student'], { localId: '00417', password: WORDS }),
      makePerson(school, ['student'], { localId: '417', password: 'another four word phrase' }),
    ]);
    const result = await signInStudent(
      { schoolCode: school.code, localId: '00417', passphrase: WORDS },
      address(),
    );
    expect(result).toMatchObject({ ok: true, value: { personId: withZeros.personId } });
    expect(without.personId).not.toBe(withZeros.personId);
  });

  it('are not let in at another school that uses the same ID', async () => {
    await makePerson(school, ['student'], { localId: '00500', password: WORDS });
    await makePerson(ardmore, ['student'], { localId: '00500', password: 'quarry biplane teapot gravel' });
    const typed = { localId: '00500', passphrase: WORDS };
    expect((await signInStudent({ ...typed, schoolCode: school.code }, address())).ok).toBe(true);
    expect((await signInStudent({ ...typed, schoolCode: ardmore.code }, address())).ok).toBe(false);
  });

  it('get one answer for a wrong passphrase, an unknown ID and an unknown school', async () => {
    const person = await makePerson(school, ['student'], { password: WORDS });
    const answers = [
      await signInStudent(
        { schoolCode: school.code, localId: person.localId, passphrase: 'four other words here' },
        address(),
      ),
      await signInStudent({ schoolCode: school.code, localId: 'nobody', passphrase: WORDS }, address()),
      await signInStudent(
        { schoolCode: 'no-such-school', localId: person.localId, passphrase: WORDS },
        address(),
      ),
    ];
    expect(answers[0]).toMatchObject({ ok: false, problem: { code: 'invalid' } });
    expect(answers[1]).toEqual(answers[0]);
    expect(answers[2]).toEqual(answers[0]);
  });
});

it('lets nobody in whose entry cannot be logged', async () => {
  const person = await makePerson(school, ['teacher'], { password: PASSWORD });
  const outcome = await whileLogFails(() =>
    signInStaff({ email: person.email, password: PASSWORD }, address()),
  );
  expect(outcome).toBeInstanceOf(Error);
});
