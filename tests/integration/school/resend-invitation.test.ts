import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { readInvitation } from '@/lib/data/account/read-link';
import { invitePerson } from '@/lib/data/school/invite-person';
import { resendInvitation } from '@/lib/data/school/resend-invitation';
import { ownerSql } from '@/tests/support/database';
import { mailsTo, makeActor, makePerson, makeSchool, secretOf, whileLogFails } from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const HERE = '127.0.0.1';
const NOT_ADMIN: Role[] = ['teacher', 'student', 'head', 'aide'];

const _sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const admin = await makeActor(school, 'admin', { givenName: 'Ada', familyName: 'Whitehorse' });
const stranger = await makeActor(ardmore, 'admin');

afterAll(closeLimits);

const invitation = (more: Record<string, unknown> = {}) => ({
  givenName: 'Maja',
  familyName: 'Bergström',
  email: `maja.${randomUUID().slice(0, 8)}@cedarfork.example`,
  roles: ['teacher', 'head'],
  departmentId: school.departmentId,
  ...more,
});

describe('sending an invitation again', () => {
  it('mails a new link and ends the one before', async () => {
    const typed = invitation();
    const made = await invitePerson(admin, typed);
    const personId = made.ok ? made.value.personId : '';
    expect(await resendInvitation(admin, { personId })).toEqual({ ok: true, value: { email: typed.email } });
    const [first, second] = await mailsTo(typed.email);
    expect((await readInvitation({ secret: secretOf(first) }, HERE)).ok).toBe(false);
    expect((await readInvitation({ secret: secretOf(second) }, HERE)).ok).toBe(true);
  });

  it('is refused for who has accepted, who left, and students', async () => {
    const people = [
      await makePerson(school, ['teacher'], { password: PASSWORD }),
      await makePerson(school, ['teacher'], { left: true }),
      await makePerson(school, ['student']),
    ];
    for (const { personId } of people) {
      expect(await resendInvitation(admin, { personId })).toMatchObject({ problem: { code: 'conflict' } });
    }
  });

  it('is not for an admin of another school, nor for other roles', async () => {
    const { personId } = await makePerson(school, ['teacher']);
    expect(await resendInvitation(stranger, { personId })).toMatchObject({ problem: { code: 'not_found' } });
    for (const role of NOT_ADMIN) {
      expect(await resendInvitation(await makeActor(school, role), { personId })).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
  });

  it('leaves the earlier link working when the last write fails', async () => {
    const typed = invitation();
    const made = await invitePerson(admin, typed);
    const personId = made.ok ? made.value.personId : '';
    expect(await whileLogFails(() => resendInvitation(admin, { personId }))).toBeInstanceOf(Error);
    const mails = await mailsTo(typed.email);
    expect(mails).toHaveLength(1);
    expect((await readInvitation({ secret: secretOf(mails[0]) }, HERE)).ok).toBe(true);
  });
});
