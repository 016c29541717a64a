import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { changeRoles } from '@/lib/data/school/change-roles';
import { ownerSql } from '@/tests/support/database';
import { logOf, makeActor, makePerson, makeSchool, whileLogFails } from '@/tests/support/school';

const _PASSWORD = 'plane with the grain';
const _HERE = '127.0.0.1';
const NOT_ADMIN: Role[] = ['teacher', 'student', 'head', 'aide'];

const sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const admin = await makeActor(school, 'admin', { givenName: 'Ada', familyName: 'Whitehorse' });
const stranger = await makeActor(ardmore, 'admin');

afterAll(closeLimits);

const rolesOf = async (personId: string) => {
  const rows = await sql<
    { role: Role }[]
  >`select role from person_roles where person_id = ${personId} order by role`;
  return rows.map(({ role }) => role);
};

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

  it('is refused for who has no email, and for a department of another school', async () => {
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
