import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { closeLimits } from '@/lib/auth/sign-in-limits';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { bringBack } from '@/lib/data/school/bring-back';
import { markLeft } from '@/lib/data/school/mark-left';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  makeActor,
  makePerson,
  makeSchool,
  makeSection,
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

  it('takes a student off every roster from that day on', async () => {
    const student = await makePerson(school, ['student']);
    const sectionId = await makeSection(school, { studentIds: [student.personId] });
    await markLeft(admin, { personId: student.personId });
    const [row] =
      await sql`select left_on >= joined_on and left_on <= current_date + 1 as left from enrollments
      where section_id = ${sectionId} and student_id = ${student.personId}`;
    expect(row).toEqual({ left: true });
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
