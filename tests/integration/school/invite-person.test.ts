import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { readInvitation } from '@/lib/data/account/read-link';
import { acceptInvitation } from '@/lib/data/account/use-link';
import { invitePerson } from '@/lib/data/school/invite-person';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  mailsTo,
  makeActor,
  makePerson,
  makeSchool,
  secretOf,
  whileLogFails,
} from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const HERE = '127.0.0.1';
const NOT_ADMIN: Role[] = ['teacher', 'student', 'head', 'aide'];

const sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const admin = await makeActor(school, 'admin', { givenName: 'Ada', familyName: 'Whitehorse' });
const _stranger = await makeActor(ardmore, 'admin');

afterAll(closeLimits);

const invitation = (more: Record<string, unknown> = {}) => ({
  givenName: 'Maja',
  familyName: 'Bergström',
  email: `maja.${randomUUID().slice(0, 8)}@cedarfork.example`,
  roles: ['teacher', 'head'],
  departmentId: school.departmentId,
  ...more,
});

const rolesOf = async (personId: string) => {
  const rows = await sql<
    { role: Role }[]
  >`select role from person_roles where person_id = ${personId} order by role`;
  return rows.map(({ role }) => role);
};

describe('inviting', () => {
  it('adds the person with roles and department, mails one link for seven days, and is logged', async () => {
    const typed = invitation();
    const made = await invitePerson(admin, typed);
    expect(made).toEqual({ ok: true, value: { personId: expect.any(String) } });
    const personId = made.ok ? made.value.personId : '';
    expect(await rolesOf(personId)).toEqual(['head', 'teacher']);
    const [mail, ...more] = await mailsTo(typed.email);
    expect(more).toEqual([]);
    expect(mail).toMatchObject({
      template: 'invitation',
      data: {
        givenName: 'Maja',
        schoolName: school.name,
        invitedBy: 'Ada Whitehorse',
        roles: ['teacher', 'department head'],
        days: 7,
      },
    });
    const secret = secretOf(mail);
    expect(await readInvitation({ secret }, HERE)).toMatchObject({ ok: true, value: { email: typed.email } });
    expect((await acceptInvitation({ secret, password: PASSWORD }, HERE)).ok).toBe(true);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'person.invite',
        actor_id: admin.personId,
        about_person_id: personId,
      }),
    );
  });

  it('says whose the email is when somebody of the school has it, in any case', async () => {
    const known = await makePerson(school, ['aide'], { givenName: 'Orla', familyName: 'Gallagher' });
    expect(await invitePerson(admin, invitation({ email: known.email?.toUpperCase() }))).toMatchObject({
      problem: {
        fields: { email: [expect.stringMatching(/^Orla Gallagher has this email already\. Change/)] },
      },
    });
  });

  it('offers to bring back who left with that email', async () => {
    const gone = await makePerson(school, ['aide'], { left: true });
    expect(await invitePerson(admin, invitation({ email: gone.email }))).toMatchObject({
      problem: { fields: { email: [expect.stringMatching(/Bring that person back/)] } },
    });
  });

  it('tells nothing about the person when the email is in use at another school', async () => {
    const elsewhere = await makePerson(ardmore, ['teacher'], { familyName: 'Secretname' });
    const refused = await invitePerson(admin, invitation({ email: elsewhere.email }));
    expect(refused).toMatchObject({ problem: { code: 'invalid', fields: { email: [expect.any(String)] } } });
    expect(JSON.stringify(refused)).not.toContain('Secretname');
  });

  it('takes no department of another school', async () => {
    expect(await invitePerson(admin, invitation({ departmentId: ardmore.departmentId }))).toMatchObject({
      problem: { fields: { departmentId: [expect.any(String)] } },
    });
  });

  it.each([
    ['email', { email: 'maja' }],
    ['givenName', { givenName: ' ' }],
    ['roles', { roles: [] }],
    ['departmentId', { departmentId: null }],
  ])('points to %s when it cannot be used', async (field, wrong) => {
    const refused = await invitePerson(admin, invitation(wrong));
    expect(refused).toMatchObject({
      problem: { code: 'invalid', fields: { [field]: [expect.any(String)] } },
    });
  });

  it.each(NOT_ADMIN)('is not for a %s', async (role) => {
    const typed = invitation();
    expect(await invitePerson(await makeActor(school, role), typed)).toMatchObject({
      problem: { code: 'forbidden' },
    });
    expect(await mailsTo(typed.email)).toEqual([]);
  });

  it('leaves neither person nor link nor mail when the last write fails', async () => {
    const typed = invitation();
    expect(await whileLogFails(() => invitePerson(admin, typed))).toBeInstanceOf(Error);
    expect((await sql`select 1 from people where email = ${typed.email}`).count).toBe(0);
    expect(await mailsTo(typed.email)).toEqual([]);
  });
});
