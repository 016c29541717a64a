import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { readInvitation } from '@/lib/data/account/read-link';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { acceptInvitation } from '@/lib/data/account/use-link';
import { bringBack } from '@/lib/data/school/bring-back';
import { changeRoles } from '@/lib/data/school/change-roles';
import { invitePerson } from '@/lib/data/school/invite-person';
import { listPeople } from '@/lib/data/school/list-people';
import { markLeft } from '@/lib/data/school/mark-left';
import { readPerson } from '@/lib/data/school/read-person';
import { resendInvitation } from '@/lib/data/school/resend-invitation';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  mailsTo,
  makeActor,
  makePerson,
  makeSchool,
  secretOf,
  signIn,
  whileLogFails,
} from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const HERE = '127.0.0.1';
const NOT_ADMIN: Role[] = ['teacher', 'student', 'head', 'aide'];

const sql = ownerSql();
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

  it('says whose the e-mail is when somebody of the school has it, in any case', async () => {
    const known = await makePerson(school, ['aide'], { givenName: 'Orla', familyName: 'Gallagher' });
    expect(await invitePerson(admin, invitation({ email: known.email?.toUpperCase() }))).toMatchObject({
      problem: {
        fields: { email: [expect.stringMatching(/^Orla Gallagher has this e-mail already\. Change/)] },
      },
    });
  });

  it('offers to bring back who left with that e-mail', async () => {
    const gone = await makePerson(school, ['aide'], { left: true });
    expect(await invitePerson(admin, invitation({ email: gone.email }))).toMatchObject({
      problem: { fields: { email: [expect.stringMatching(/Bring that person back/)] } },
    });
  });

  it('tells nothing about the person when the e-mail is in use at another school', async () => {
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

describe('changing roles', () => {
  it('gives and takes staff roles, leaves a student one, and is logged', async () => {
    const person = await makePerson(school, ['student', 'aide'], {
      localId: randomUUID().slice(0, 8),
      email: `${randomUUID()}@cedarfork.example`,
    });
    const typed = {
      personId: person.personId,
      roles: ['teacher', 'admin'],
      departmentId: school.departmentId,
    };
    expect(await changeRoles(admin, typed)).toEqual({ ok: true, value: null });
    expect(await rolesOf(person.personId)).toEqual(['admin', 'student', 'teacher']);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'person.change',
        about_person_id: person.personId,
        details: expect.objectContaining({ now: ['teacher', 'admin'] }),
      }),
    );
  });

  it('does not let an admin take that role from themselves', async () => {
    const typed = { personId: admin.personId, roles: ['teacher'], departmentId: school.departmentId };
    expect(await changeRoles(admin, typed)).toMatchObject({
      problem: { fields: { roles: [expect.any(String)] } },
    });
    expect(await rolesOf(admin.personId)).toEqual(['admin']);
  });

  it('is refused for who has no e-mail, and for a department of another school', async () => {
    const student = await makePerson(school, ['student']);
    expect(await changeRoles(admin, { personId: student.personId, roles: ['aide'] })).toMatchObject({
      problem: { code: 'conflict' },
    });
    const { personId } = await makePerson(school, ['teacher']);
    expect(
      await changeRoles(admin, { personId, roles: ['teacher'], departmentId: ardmore.departmentId }),
    ).toMatchObject({ problem: { code: 'invalid' } });
    expect(await changeRoles(admin, { personId, roles: ['owner'] })).toMatchObject({
      problem: { code: 'invalid' },
    });
  });

  it('is not for an admin of another school, nor for other roles', async () => {
    const { personId } = await makePerson(school, ['aide']);
    const typed = { personId, roles: ['admin'] };
    expect(await changeRoles(stranger, typed)).toMatchObject({ problem: { code: 'not_found' } });
    for (const role of NOT_ADMIN) {
      expect(await changeRoles(await makeActor(school, role), typed)).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
    expect(await rolesOf(personId)).toEqual(['aide']);
  });

  it('leaves the roles as they were when the last write fails', async () => {
    const { personId } = await makePerson(school, ['aide']);
    expect(await whileLogFails(() => changeRoles(admin, { personId, roles: ['admin'] }))).toBeInstanceOf(
      Error,
    );
    expect(await rolesOf(personId)).toEqual(['aide']);
  });
});

describe('marking as left', () => {
  it('ends sessions, links and sign-in, keeps the person, is logged, and can be undone', async () => {
    const person = await makePerson(school, ['teacher'], { password: PASSWORD });
    await signIn(school, person.personId, 'teacher');
    expect(await markLeft(admin, { personId: person.personId })).toEqual({ ok: true, value: null });
    expect((await sql`select 1 from sessions where user_id = ${person.personId}`).count).toBe(0);
    expect((await signInStaff({ email: person.email, password: PASSWORD }, HERE)).ok).toBe(false);
    expect(await bringBack(admin, { personId: person.personId })).toEqual({ ok: true, value: null });
    expect((await signInStaff({ email: person.email, password: PASSWORD }, HERE)).ok).toBe(true);
    const logged = (await logOf(school)).filter(({ about_person_id }) => about_person_id === person.personId);
    expect(logged.map(({ details }) => details)).toEqual(
      expect.arrayContaining([{ left: true }, { left: false }]),
    );
  });

  it('is not something an admin does to themselves', async () => {
    expect(await markLeft(admin, { personId: admin.personId })).toMatchObject({
      problem: { code: 'conflict' },
    });
  });

  it('is not for an admin of another school, nor for other roles; nor is bringing back', async () => {
    const { personId } = await makePerson(school, ['teacher']);
    const gone = await makePerson(school, ['teacher'], { left: true });
    expect(await markLeft(stranger, { personId })).toMatchObject({ problem: { code: 'not_found' } });
    expect(await bringBack(stranger, { personId: gone.personId })).toMatchObject({
      problem: { code: 'not_found' },
    });
    for (const role of NOT_ADMIN) {
      const actor = await makeActor(school, role);
      expect(await markLeft(actor, { personId })).toMatchObject({ problem: { code: 'forbidden' } });
      expect(await bringBack(actor, { personId: gone.personId })).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
    expect(await markLeft(admin, { personId: 'somebody' })).toMatchObject({ problem: { code: 'invalid' } });
    expect(await bringBack(admin, { personId: randomUUID() })).toMatchObject({
      problem: { code: 'not_found' },
    });
  });

  it('changes nothing when the last write fails', async () => {
    const person = await makePerson(school, ['teacher'], { password: PASSWORD });
    await signIn(school, person.personId, 'teacher');
    expect(await whileLogFails(() => markLeft(admin, { personId: person.personId }))).toBeInstanceOf(Error);
    expect((await sql`select 1 from sessions where user_id = ${person.personId}`).count).toBe(1);
    const gone = await makePerson(school, ['teacher'], { left: true });
    expect(await whileLogFails(() => bringBack(admin, { personId: gone.personId }))).toBeInstanceOf(Error);
    const [row] = await sql`select left_at from people where id = ${gone.personId}`;
    expect(row?.left_at).not.toBeNull();
  });
});

describe('looking at people', () => {
  it('lists staff, students and who left, by name, with how far each has come', async () => {
    const own = await makeSchool('Whole School');
    const boss = await makeActor(own, 'admin', { familyName: 'Aabel', password: PASSWORD });
    await makePerson(own, ['teacher'], { familyName: 'Castellanos', givenName: 'Noor' });
    await makePerson(own, ['student'], { familyName: 'Dang', localId: '00453' });
    await makePerson(own, ['student'], { familyName: 'Eklund', localId: '00460', password: PASSWORD });
    await makePerson(own, ['aide'], { familyName: 'Ferreira', left: true });
    const staff = await listPeople(boss, { shown: 'staff' });
    expect(staff).toMatchObject({
      ok: true,
      value: {
        total: 2,
        people: [
          { familyName: 'Aabel', state: 'active', roles: ['admin'], department: null, isSelf: true },
          {
            familyName: 'Castellanos',
            state: 'invitation ended',
            roles: ['teacher'],
            department: { departmentId: own.departmentId, name: 'Wood and design' },
            isSelf: false,
          },
        ],
      },
    });
    expect(await listPeople(boss, { shown: 'students' })).toMatchObject({
      value: {
        people: [
          { familyName: 'Dang', localId: '00453', state: 'no passphrase' },
          { familyName: 'Eklund', state: 'active' },
        ],
      },
    });
    expect(await listPeople(boss, { shown: 'left' })).toMatchObject({
      value: { people: [{ state: 'left' }], total: 1 },
    });
    expect(await listPeople(boss, { shown: 'students', search: '0453' })).toMatchObject({
      value: { total: 1 },
    });
    expect(await listPeople(boss, { shown: 'students', search: '%' })).toMatchObject({ value: { total: 0 } });
    expect(await logOf(own)).toContainEqual(
      expect.objectContaining({ action: 'person.list', actor_id: boss.personId }),
    );
  });

  it('gives a page of fifty at a time', async () => {
    const own = await makeSchool('Large School');
    const boss = await makeActor(own, 'admin');
    await Promise.all(Array.from({ length: 52 }, () => makePerson(own, ['student'])));
    const second = await listPeople(boss, { shown: 'students', page: 2 });
    expect(second).toMatchObject({ value: { total: 52, page: 2, pageCount: 2 } });
    expect(second.ok && second.value.people).toHaveLength(2);
  });

  it('shows one person, logs whose record was looked at, and hands out no hash', async () => {
    const person = await makePerson(school, ['teacher'], { password: PASSWORD });
    const shown = await readPerson(admin, { personId: person.personId });
    expect(shown).toMatchObject({ ok: true, value: { personId: person.personId, state: 'active' } });
    expect(JSON.stringify(shown)).not.toContain('argon2');
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'person.list', about_person_id: person.personId }),
    );
  });

  it('is not for other roles or schools', async () => {
    const { personId } = await makePerson(school, ['teacher']);
    expect(await readPerson(stranger, { personId })).toMatchObject({ problem: { code: 'not_found' } });
    for (const role of NOT_ADMIN) {
      const actor = await makeActor(school, role);
      expect(await readPerson(actor, { personId })).toMatchObject({ problem: { code: 'forbidden' } });
      expect(await listPeople(actor, {})).toMatchObject({ problem: { code: 'forbidden' } });
    }
  });
});
