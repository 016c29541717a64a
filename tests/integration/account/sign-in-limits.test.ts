import { randomUUID } from 'node:crypto';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { accountKey, beginTry, closeLimits, forgetFailures, tryFailed } from '@/lib/auth/sign-in-limits';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { signInStudent } from '@/lib/data/account/sign-in-student';
import { ownerSql } from '@/tests/support/database';
import { makePerson, makeSchool } from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const school = await makeSchool();
const CLASSROOM = '192.0.2.7';

/** Lets the running wait of an account be over. */
const waitIsOver = (account: string) =>
  ownerSql()`update rate_limits set expire = 0 where key = ${`wait:${account}`}`;

beforeEach(async () => {
  await ownerSql()`delete from rate_limits`;
});
afterAll(closeLimits);

describe('failures of one account', () => {
  it('make each next wait twice as long, and say how long', async () => {
    const { email } = await makePerson(school, ['teacher'], { password: PASSWORD });
    const account = accountKey({ email: email ?? '' });
    const fail = () => signInStaff({ email, password: 'plane against the grain' }, CLASSROOM);
    for (let slip = 1; slip <= 3; slip += 1) {
      expect(await fail()).toMatchObject({
        problem: { message: 'This email and password do not belong together.' },
      });
    }
    for (const wait of ['5 seconds', '10 seconds', '20 seconds', '40 seconds', '2 minutes']) {
      expect(await fail()).toMatchObject({
        problem: { code: 'invalid', message: expect.stringContaining(`again in ${wait}`) },
      });
      expect(await fail()).toMatchObject({
        problem: {
          code: 'rate_limited',
          message: expect.stringMatching(/^Too many tries\. Wait /),
          retryAfter: expect.any(Number),
        },
      });
      await waitIsOver(account);
    }
  });

  it('hold back the right password too while a wait lasts, and are forgotten once it is given after', async () => {
    const { email } = await makePerson(school, ['teacher'], { password: PASSWORD });
    const account = accountKey({ email: email ?? '' });
    for (let slip = 1; slip <= 4; slip += 1)
      await signInStaff({ email, password: 'wrong and long enough' }, CLASSROOM);
    expect(await signInStaff({ email, password: PASSWORD }, CLASSROOM)).toMatchObject({
      problem: { code: 'rate_limited' },
    });
    await waitIsOver(account);
    expect((await signInStaff({ email, password: PASSWORD }, CLASSROOM)).ok).toBe(true);
    expect((await ownerSql()`select 1 from rate_limits where key like ${`%${account}`}`).count).toBe(0);
  });

  it('count alike for an account that does not exist', async () => {
    const fail = () => signInStaff({ email: 'nobody@cedarfork.example', password: PASSWORD }, CLASSROOM);
    for (let slip = 1; slip <= 4; slip += 1) await fail();
    expect(await fail()).toMatchObject({ problem: { code: 'rate_limited' } });
  });

  it('close it after 100 in a row, even to the right password, until it is reset', async () => {
    const { email } = await makePerson(school, ['teacher'], { password: PASSWORD });
    const account = accountKey({ email: email ?? '' });
    await ownerSql()`insert into rate_limits (key, points) values (${`failures:${account}`}, 99)`;
    expect(await signInStaff({ email, password: 'the hundredth wrong one' }, CLASSROOM)).toMatchObject({
      problem: { code: 'invalid' },
    });
    await waitIsOver(account);
    expect(await signInStaff({ email, password: PASSWORD }, CLASSROOM)).toMatchObject({
      problem: { code: 'rate_limited', message: expect.stringMatching(/closed after too many wrong tries/) },
    });
    await forgetFailures(account);
    expect((await signInStaff({ email, password: PASSWORD }, CLASSROOM)).ok).toBe(true);
  });

  it('let no more than one of many tries at the same moment through while waits run', async () => {
    const account = accountKey({ email: 'target@cedarfork.example' });
    await ownerSql()`insert into rate_limits (key, points) values (${`failures:${account}`}, 10)`;
    const tries = await Promise.all(Array.from({ length: 12 }, () => beginTry(account, CLASSROOM)));
    expect(tries.filter(({ allowed }) => allowed)).toHaveLength(1);
    const [counted] = await ownerSql()`select points from rate_limits where key = ${`failures:${account}`}`;
    expect(counted?.points).toBe(11);
  });

  it('do not slow down anybody else behind the same address', async () => {
    const one = await makePerson(school, ['student'], { password: 'quarry biplane teapot gravel' });
    const other = await makePerson(school, ['student'], { password: 'maple otter quarter lagoon' });
    const wrong = { schoolCode: school.code, localId: one.localId, passphrase: 'four other words here' };
    for (let slip = 1; slip <= 5; slip += 1) await signInStudent(wrong, CLASSROOM);
    const right = {
      schoolCode: school.code,
      localId: other.localId,
      passphrase: 'maple otter quarter lagoon',
    };
    expect((await signInStudent(right, CLASSROOM)).ok).toBe(true);
  });
});

describe('failures of one address', () => {
  it('are let be for a whole classroom that mistypes all period', async () => {
    for (let slip = 1; slip <= 299; slip += 1) await tryFailed(CLASSROOM);
    expect(await beginTry(accountKey({ email: randomUUID() }), CLASSROOM)).toMatchObject({ allowed: true });
  });

  it('are stopped at 300 in a quarter of an hour, for that address alone', async () => {
    for (let slip = 1; slip <= 300; slip += 1) await tryFailed(CLASSROOM);
    const stopped = await beginTry(accountKey({ email: randomUUID() }), CLASSROOM);
    expect(stopped).toEqual({ allowed: false, waitSeconds: expect.any(Number) });
    expect(await beginTry(accountKey({ email: randomUUID() }), '192.0.2.8')).toMatchObject({ allowed: true });
  });
});

it('keeps no name in the counters, only a hash', async () => {
  await signInStaff({ email: 'nobody@cedarfork.example', password: PASSWORD }, CLASSROOM);
  const keys = await ownerSql()<{ key: string }[]>`select key from rate_limits`;
  expect(keys.length).toBeGreaterThan(0);
  expect(keys.some(({ key }) => key.includes('nobody'))).toBe(false);
});
