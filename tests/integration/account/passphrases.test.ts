import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { accountKey, closeLimits } from '@/lib/auth/sign-in-limits';
import { makePassphrases } from '@/lib/data/account/make-passphrases';
import { resetPassphrase } from '@/lib/data/account/reset-passphrase';
import { signInStudent } from '@/lib/data/account/sign-in-student';
import { ownerSql } from '@/tests/support/database';
import {
  actorOf,
  logOf,
  makeActor,
  makePerson,
  makeSchool,
  makeSection,
  signIn,
  whileLogFails,
} from '@/tests/support/school';

const OLD = 'quarry biplane teapot gravel';
const HERE = '127.0.0.1';

const sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const teacher = await makeActor(school, 'teacher');
const colleague = await makeActor(school, 'teacher');

afterAll(closeLimits);

async function studentIn(password?: string) {
  const student = await makePerson(school, ['student'], password ? { password } : {});
  const sectionId = await makeSection(school, {
    teacherIds: [teacher.personId],
    studentIds: [student.personId],
  });
  return { student, sectionId };
}

const lets = async (localId: string | null, passphrase: string) =>
  (await signInStudent({ schoolCode: school.code, localId, passphrase }, HERE)).ok;

describe('new words at the bench', () => {
  it('are shown once, replace the old ones, and must be changed at the next sign-in', async () => {
    const { student } = await studentIn(OLD);
    const made = await resetPassphrase(teacher, { studentId: student.personId });
    expect(made).toMatchObject({
      ok: true,
      value: {
        studentId: student.personId,
        localId: student.localId,
        words: expect.stringMatching(/^(\w+ ){3}\w+$/),
      },
    });
    const words = made.ok ? made.value.words : '';
    expect(await lets(student.localId, OLD)).toBe(false);
    expect(await lets(student.localId, words)).toBe(true);
    const [kept] =
      await sql`select must_change, password_hash from credentials where person_id = ${student.personId}`;
    expect(kept?.must_change).toBe(true);
    const stored = await sql`select details from access_log where about_person_id = ${student.personId}`;
    expect(JSON.stringify([kept, stored])).not.toContain(words);
  });

  it('end the student’s sessions, open a closed account, and are logged', async () => {
    const { student } = await studentIn(OLD);
    await signIn(school, student.personId, 'student');
    const account = accountKey({ schoolCode: school.code, localId: student.localId ?? '' });
    await sql`insert into rate_limits (key, points) values (${`failures:${account}`}, 101)`;
    const made = await resetPassphrase(teacher, { studentId: student.personId });
    expect((await sql`select 1 from sessions where user_id = ${student.personId}`).count).toBe(0);
    expect(await lets(student.localId, made.ok ? made.value.words : '')).toBe(true);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'passphrase.reset',
        actor_id: teacher.personId,
        about_person_id: student.personId,
      }),
    );
  });

  it('are a first passphrase for a student who had none', async () => {
    const { student } = await studentIn();
    const made = await resetPassphrase(teacher, { studentId: student.personId });
    expect(await lets(student.localId, made.ok ? made.value.words : '')).toBe(true);
  });

  it('may be given by an admin of the school', async () => {
    const { student } = await studentIn(OLD);
    const admin = await makeActor(school, 'admin');
    expect((await resetPassphrase(admin, { studentId: student.personId })).ok).toBe(true);
  });

  it.each(['aide', 'head', 'student'] as const)('are not for a %s to give', async (role) => {
    const { student } = await studentIn(OLD);
    const other = await makeActor(school, role);
    expect(await resetPassphrase(other, { studentId: student.personId })).toMatchObject({
      problem: { code: 'forbidden' },
    });
    expect(await lets(student.localId, OLD)).toBe(true);
  });

  it('are not for another teacher, nor for one whose section the student has left', async () => {
    const { student, sectionId } = await studentIn(OLD);
    const asOther = await resetPassphrase(colleague, { studentId: student.personId });
    expect(asOther).toMatchObject({ problem: { code: 'not_found' } });
    await sql`update enrollments set left_on = current_date - 1 where section_id = ${sectionId}`;
    expect(await resetPassphrase(teacher, { studentId: student.personId })).toMatchObject({
      problem: { code: 'not_found' },
    });
    expect(await lets(student.localId, OLD)).toBe(true);
  });

  it('are not for a teacher whose days in the section are over, neither one nor for all', async () => {
    const { student, sectionId } = await studentIn(OLD);
    await sql`update section_staff set to_day = current_date - 2 where section_id = ${sectionId}`;
    const refused = { problem: { code: 'not_found' } };
    expect(await resetPassphrase(teacher, { studentId: student.personId })).toMatchObject(refused);
    expect(await makePassphrases(teacher, { sectionId })).toMatchObject(refused);
    expect(await lets(student.localId, OLD)).toBe(true);
  });

  it('are not for anybody of another school', async () => {
    const { student } = await studentIn(OLD);
    const stranger = await makeActor(ardmore, 'admin');
    expect(await resetPassphrase(stranger, { studentId: student.personId })).toMatchObject({
      problem: { code: 'not_found' },
    });
  });

  it('cannot take over the account of a student who also works here', async () => {
    const both = await makePerson(school, ['student', 'admin'], {
      localId: randomUUID().slice(0, 8),
      password: OLD,
    });
    await makeSection(school, { teacherIds: [teacher.personId], studentIds: [both.personId] });
    expect(await resetPassphrase(teacher, { studentId: both.personId })).toMatchObject({
      problem: { code: 'forbidden', message: expect.stringMatching(/by email/) },
    });
  });

  it.each(['', 'not an id', randomUUID()])('need a student: %j is none', async (studentId) => {
    expect((await resetPassphrase(teacher, { studentId })).ok).toBe(false);
  });

  it('leave the old words standing when the last write fails', async () => {
    const { student } = await studentIn(OLD);
    await signIn(school, student.personId, 'student');
    const outcome = await whileLogFails(() => resetPassphrase(teacher, { studentId: student.personId }));
    expect(outcome).toBeInstanceOf(Error);
    expect(await lets(student.localId, OLD)).toBe(true);
    expect((await sql`select 1 from sessions where user_id = ${student.personId}`).count).toBe(1);
  });
});

describe('first words for a section', () => {
  async function classOfThree() {
    const students = [
      await makePerson(school, ['student'], { familyName: 'Aguilar' }),
      await makePerson(school, ['student'], { familyName: 'Boateng', password: OLD }),
      await makePerson(school, ['student'], { familyName: 'Castellanos' }),
    ];
    const sectionId = await makeSection(school, {
      teacherIds: [teacher.personId],
      studentIds: students.map(({ personId }) => personId),
    });
    return { students, sectionId };
  }

  it('go to those who have none, by name, and let each of them in', async () => {
    const { students, sectionId } = await classOfThree();
    const made = await makePassphrases(teacher, { sectionId });
    expect(made).toMatchObject({
      ok: true,
      value: {
        schoolName: school.name,
        schoolCode: school.code,
        sectionName: 'Woods 2',
        period: '3',
        slips: [{ familyName: 'Aguilar' }, { familyName: 'Castellanos' }],
      },
    });
    for (const slip of made.ok ? made.value.slips : [])
      expect(await lets(slip.localId, slip.words)).toBe(true);
    expect(await lets(students[1]?.localId ?? null, OLD)).toBe(true);
    const logged = await logOf(school);
    expect(logged.map((entry) => entry.about_person_id)).toEqual(
      expect.arrayContaining([students[0]?.personId, students[2]?.personId]),
    );
  });

  it('are made once: asked again, there is nobody left', async () => {
    const { sectionId } = await classOfThree();
    await makePassphrases(teacher, { sectionId });
    expect(await makePassphrases(teacher, { sectionId })).toMatchObject({ ok: true, value: { slips: [] } });
  });

  it('are given once when asked for twice at the same moment', async () => {
    const { sectionId } = await classOfThree();
    const both = await Promise.all([
      makePassphrases(teacher, { sectionId }),
      makePassphrases(teacher, { sectionId }),
    ]);
    const given = both.flatMap((made) => (made.ok ? made.value.slips : []));
    expect(given).toHaveLength(2);
    for (const slip of given) expect(await lets(slip.localId, slip.words)).toBe(true);
  });

  it('do not go to those who left, nor to staff who are enrolled', async () => {
    const gone = await makePerson(school, ['student'], { left: true });
    const aide = await makePerson(school, ['student', 'aide'], {
      localId: randomUUID().slice(0, 8),
      email: `${randomUUID()}@cedarfork.example`,
    });
    const sectionId = await makeSection(school, {
      teacherIds: [teacher.personId],
      studentIds: [gone.personId, aide.personId],
    });
    expect(await makePassphrases(teacher, { sectionId })).toMatchObject({ ok: true, value: { slips: [] } });
  });

  it('are not for another teacher, another role or another school to give', async () => {
    const { sectionId } = await classOfThree();
    expect(await makePassphrases(colleague, { sectionId })).toMatchObject({ problem: { code: 'not_found' } });
    const aide = await makeActor(school, 'aide');
    expect(await makePassphrases(aide, { sectionId })).toMatchObject({ problem: { code: 'forbidden' } });
    const stranger = await makeActor(ardmore, 'teacher');
    expect(await makePassphrases(stranger, { sectionId })).toMatchObject({ problem: { code: 'not_found' } });
    expect(await makePassphrases(teacher, { sectionId: 'period 3' })).toMatchObject({
      problem: { code: 'invalid' },
    });
  });

  it('leave nobody with words that nobody saw when the last write fails', async () => {
    const { students, sectionId } = await classOfThree();
    expect(await whileLogFails(() => makePassphrases(teacher, { sectionId }))).toBeInstanceOf(Error);
    const ids = students.map(({ personId }) => personId);
    expect((await sql`select 1 from credentials where person_id in ${sql(ids)}`).count).toBe(1);
  });

  it('may be refused before the actor’s own handed-out password is changed', async () => {
    const { sectionId } = await classOfThree();
    const unready = {
      ...actorOf(school, await makePerson(school, ['teacher']), 'teacher'),
      mustChangePassword: true,
    };
    expect(await makePassphrases(unready, { sectionId })).toMatchObject({ problem: { code: 'forbidden' } });
  });
});
