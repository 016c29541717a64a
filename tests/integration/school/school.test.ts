import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import type { Role } from '@/lib/auth/roles';
import { addDepartment } from '@/lib/data/school/add-department';
import { addTerm } from '@/lib/data/school/add-term';
import { changeSchool } from '@/lib/data/school/change-school';
import { changeTerm } from '@/lib/data/school/change-term';
import { listAllSections } from '@/lib/data/school/list-all-sections';
import { listDepartments } from '@/lib/data/school/list-departments';
import { listTerms } from '@/lib/data/school/list-terms';
import { readSchool } from '@/lib/data/school/read-school';
import { renameDepartment } from '@/lib/data/school/rename-department';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  makeActor,
  makePerson,
  makeSchool,
  makeSection,
  type TestSchool,
  whileLogFails,
} from '@/tests/support/school';

const sql = ownerSql();
const school = await makeSchool();
const ardmore = await makeSchool('Ardmore Academy');
const admin = await makeActor(school, 'admin');

const DAYS = { startsOn: '2027-01-11', endsOn: '2027-06-04' };

async function expectForbidden(roles: Role[], verb: (actor: Actor) => Promise<unknown>) {
  for (const role of roles) {
    expect(await verb(await makeActor(school, role))).toMatchObject({ problem: { code: 'forbidden' } });
  }
}

describe('the overview', () => {
  it('counts what the school has and what is waiting', async () => {
    const own: TestSchool = await makeSchool('Counted School');
    const boss = await makeActor(own, 'admin', { password: 'plane with the grain' });
    const teacher = await makePerson(own, ['teacher'], { givenName: 'Noor', familyName: 'Castellanos' });
    const student = await makePerson(own, ['student']);
    await makePerson(own, ['student'], { left: true });
    await makeSection(own, { teacherIds: [teacher.personId], studentIds: [student.personId] });
    expect(await readSchool(boss, {})).toEqual({
      ok: true,
      value: {
        name: 'Counted School',
        code: own.code,
        timeZone: 'America/Chicago',
        unit: 'in',
        today: expect.stringMatching(/^\d{4}-\d\d-\d\d$/),
        currentTerm: expect.objectContaining({ name: 'this term' }),
        departmentCount: 1,
        teacherCount: 1,
        studentCount: 1,
        sectionCount: 1,
        waitingCount: 1,
      },
    });
    expect(await listAllSections(boss, {})).toMatchObject({
      value: [
        {
          name: 'Woods 2',
          period: '3',
          termName: 'this term',
          departmentName: 'Wood and design',
          teachers: ['Noor Castellanos'],
          studentCount: 1,
          sittingCount: 0,
        },
      ],
    });
  });

  it('is the admin’s alone', async () => {
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) => readSchool(actor, {}));
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) => listAllSections(actor, {}));
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) => listDepartments(actor, {}));
  });
});

describe('the school’s own settings', () => {
  const typed = { name: 'Cedar Fork High', timeZone: 'America/Denver', unit: 'mm' };

  it('change together, are logged, and leave the code alone', async () => {
    const own = await makeSchool();
    expect(await changeSchool(await makeActor(own, 'admin'), typed)).toEqual({ ok: true, value: null });
    const [row] = await sql`select name, time_zone, unit, code from schools where id = ${own.id}`;
    expect(row).toEqual({ name: 'Cedar Fork High', time_zone: 'America/Denver', unit: 'mm', code: own.code });
    expect(await logOf(own)).toContainEqual(expect.objectContaining({ action: 'school.change' }));
  });

  it('are refused at their fields, and to other roles', async () => {
    expect(await changeSchool(admin, { ...typed, name: ' ', timeZone: 'Mars/Olympus' })).toMatchObject({
      problem: { fields: { name: [expect.any(String)], timeZone: [expect.any(String)] } },
    });
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) => changeSchool(actor, typed));
  });

  it('stay as they were when the log cannot be written', async () => {
    const own = await makeSchool();
    const boss = await makeActor(own, 'admin');
    expect(await whileLogFails(() => changeSchool(boss, typed))).toBeInstanceOf(Error);
    const [row] = await sql`select name from schools where id = ${own.id}`;
    expect(row?.name).toBe(own.name);
  });
});

describe('departments', () => {
  it('are added and renamed, each logged', async () => {
    const made = await addDepartment(admin, { name: ' Metal ' });
    expect(made).toMatchObject({ ok: true });
    const departmentId = made.ok ? made.value.departmentId : '';
    expect(await renameDepartment(admin, { departmentId, name: 'Metal and design' })).toEqual({
      ok: true,
      value: null,
    });
    expect(await listDepartments(admin, {})).toMatchObject({
      value: expect.arrayContaining([{ departmentId, name: 'Metal and design', sectionCount: 0, heads: [] }]),
    });
    const logged = (await logOf(school)).filter(({ action }) => action === 'school.change');
    expect(logged.map(({ details }) => details)).toEqual([
      { added: 'Metal' },
      { was: 'Metal', now: 'Metal and design' },
    ]);
  });

  it('show their heads, those who left not among them', async () => {
    const own = await makeSchool();
    await makePerson(own, ['head'], { givenName: 'Orla', familyName: 'Gallagher' });
    await makePerson(own, ['head'], { left: true });
    expect(await listDepartments(await makeActor(own, 'admin'), {})).toMatchObject({
      value: [{ heads: ['Orla Gallagher'] }],
    });
  });

  it('have different names, whatever the case', async () => {
    expect(await addDepartment(admin, { name: 'WOOD AND DESIGN' })).toMatchObject({
      problem: { fields: { name: [expect.stringMatching(/already/)] } },
    });
    const made = await addDepartment(admin, { name: 'Ceramics' });
    const departmentId = made.ok ? made.value.departmentId : '';
    expect(await renameDepartment(admin, { departmentId, name: 'wood and design' })).toMatchObject({
      problem: { code: 'invalid' },
    });
    expect(await renameDepartment(admin, { departmentId, name: 'CERAMICS' })).toEqual({
      ok: true,
      value: null,
    });
  });

  it('of another school are not found, and other roles may not change them', async () => {
    const typed = { departmentId: ardmore.departmentId, name: 'Ours now' };
    expect(await renameDepartment(admin, typed)).toMatchObject({ problem: { code: 'not_found' } });
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) =>
      addDepartment(actor, { name: 'Mine' }),
    );
    await expectForbidden(['teacher', 'student', 'head', 'aide'], (actor) =>
      renameDepartment(actor, { departmentId: school.departmentId, name: 'Mine' }),
    );
  });

  it('are neither made nor renamed when the log cannot be written', async () => {
    expect(await whileLogFails(() => addDepartment(admin, { name: 'Never' }))).toBeInstanceOf(Error);
    const typed = { departmentId: school.departmentId, name: 'Never' };
    expect(await whileLogFails(() => renameDepartment(admin, typed))).toBeInstanceOf(Error);
    expect((await sql`select 1 from departments where name = 'Never'`).count).toBe(0);
  });
});

describe('terms', () => {
  it('are added by admin or teacher, changed, told from today, and logged', async () => {
    const own = await makeSchool();
    const teacher = await makeActor(own, 'teacher');
    const made = await addTerm(teacher, {
      termName: 'Spring 2099',
      startsOn: '2099-01-11',
      endsOn: '2099-06-04',
    });
    const termId = made.ok ? made.value.termId : '';
    const boss = await makeActor(own, 'admin');
    const typed = { termId, termName: 'Spring 1999', startsOn: '1999-01-11', endsOn: '1999-06-04' };
    expect(await listTerms(teacher, {})).toMatchObject({
      value: [{ when: 'coming' }, { name: 'this term', when: 'now' }],
    });
    expect(await changeTerm(boss, typed)).toEqual({ ok: true, value: null });
    expect(await listTerms(boss, {})).toMatchObject({
      value: [
        { name: 'this term' },
        { name: 'Spring 1999', startsOn: '1999-01-11', endsOn: '1999-06-04', when: 'past', sectionCount: 0 },
      ],
    });
    expect((await logOf(own)).map(({ action }) => action)).toEqual(['term.add', 'term.change']);
  });

  it('need an order of days and a name of their own', async () => {
    expect(
      await addTerm(admin, { termName: 'Backwards', startsOn: '2027-06-04', endsOn: '2027-01-11' }),
    ).toMatchObject({
      problem: { fields: { endsOn: [expect.stringMatching(/must come after/)] } },
    });
    expect(await addTerm(admin, { termName: 'THIS TERM', ...DAYS })).toMatchObject({
      problem: { fields: { termName: [expect.stringMatching(/already/)] } },
    });
    expect(await addTerm(admin, { termName: 'No days', startsOn: 'soon', endsOn: '' })).toMatchObject({
      problem: { fields: { startsOn: [expect.any(String)], endsOn: [expect.any(String)] } },
    });
  });

  it('of another school are not found, and other roles may not change them', async () => {
    const typed = { termId: ardmore.termId, termName: 'Ours now', ...DAYS };
    expect(await changeTerm(admin, typed)).toMatchObject({ problem: { code: 'not_found' } });
    expect(await changeTerm(admin, { ...typed, termId: randomUUID() })).toMatchObject({
      problem: { code: 'not_found' },
    });
    await expectForbidden(['student', 'head', 'aide'], (actor) =>
      addTerm(actor, { termName: 'Mine', ...DAYS }),
    );
    await expectForbidden(['student', 'head', 'aide', 'teacher'], (actor) =>
      changeTerm(actor, { termId: school.termId, termName: 'Mine', ...DAYS }),
    );
  });

  it('are neither made nor changed when the log cannot be written', async () => {
    expect(await whileLogFails(() => addTerm(admin, { termName: 'Never', ...DAYS }))).toBeInstanceOf(Error);
    const typed = { termId: school.termId, termName: 'Never', ...DAYS };
    expect(await whileLogFails(() => changeTerm(admin, typed))).toBeInstanceOf(Error);
    expect((await sql`select 1 from terms where name = 'Never'`).count).toBe(0);
  });
});
