import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { listPeople } from '@/lib/data/school/list-people';
import { readPerson } from '@/lib/data/school/read-person';
import { ownerSql } from '@/tests/support/database';
import { logOf, makeActor, makePerson, makeSchool } from '@/tests/support/school';

const PASSWORD = 'plane with the grain';
const _HERE = '127.0.0.1';
const NOT_ADMIN: Role[] = ['teacher', 'student', 'head', 'aide'];

const _sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const admin = await makeActor(school, 'admin', { givenName: 'Ada', familyName: 'Whitehorse' });
const stranger = await makeActor(ardmore, 'admin');

afterAll(closeLimits);

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
