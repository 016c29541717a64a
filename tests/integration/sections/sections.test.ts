import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { createSection } from '@/lib/data/sections/create-section';
import { listSections } from '@/lib/data/sections/list-sections';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { readSectionChoices } from '@/lib/data/sections/read-section-choices';
import type { Result } from '@/lib/result';
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

let school: TestSchool;
let teacher: Actor;

beforeAll(async () => {
  school = await makeSchool();
  teacher = await makeActor(school, 'teacher');
});

function value<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result.value;
}

const code = (result: Result<unknown>) => (result.ok ? 'ok' : result.problem.code);

const input = (more: object = {}) => ({
  name: 'Woods 2',
  period: '3',
  departmentId: school.departmentId,
  termId: school.termId,
  ...more,
});

describe('createSection', () => {
  it('makes a section that its maker teaches, alone and at once', async () => {
    const { sectionId } = value(await createSection(teacher, input()));
    expect(value(await listSections(teacher, {}))).toMatchObject([
      {
        sectionId,
        name: 'Woods 2',
        period: '3',
        termName: 'this term',
        termWhen: 'now',
        studentCount: 0,
        sittings: 0,
      },
    ]);
    expect(value(await readSectionRoster(teacher, { sectionId })).students).toEqual([]);
    expect((await logOf(school)).map(({ action }) => action)).toContain('section.create');
  });

  it('makes a term with it, once of each name', async () => {
    const term = { termId: 'new', termName: 'Winter 2027', startsOn: '2027-01-04', endsOn: '2027-03-26' };
    const maker = await makeActor(school, 'teacher');
    value(await createSection(maker, input(term)));
    expect(value(await listSections(maker, {}))).toMatchObject([
      { termName: 'Winter 2027', termWhen: 'coming' },
    ]);
    expect(await createSection(maker, input(term))).toMatchObject({
      ok: false,
      problem: { code: 'invalid', fields: { termName: [expect.stringContaining('already')] } },
    });
  });

  it.each([
    [{ name: ' ' }, 'name'],
    [{ period: '' }, 'period'],
    [{ departmentId: '7d444840-9dc0-11d1-b245-5ffdce74fad2' }, 'departmentId'],
    [{ termId: '7d444840-9dc0-11d1-b245-5ffdce74fad2' }, 'termId'],
    [{ termId: 'new', termName: 'x', startsOn: '2027-02-01', endsOn: '2027-01-01' }, 'endsOn'],
    [{ termId: 'new', termName: '', startsOn: '2027-01-01', endsOn: '2027-02-01' }, 'termName'],
  ])('points at the field that is wrong: %j', async (more, field) => {
    const result = await createSection(teacher, input(more));
    expect(result.ok ? [] : Object.keys(result.problem.fields ?? {})).toEqual([field]);
  });

  it('takes no department that the teacher does not teach in', async () => {
    const [metal] = await ownerSql()<{ id: string }[]>`
      insert into departments (school_id, name) values (${school.id}, 'Metal') returning id`;
    expect(code(await createSection(teacher, input({ departmentId: metal?.id })))).toBe('invalid');
  });

  it('takes no department of another school', async () => {
    const other = await makeSchool('Ardmore Academy');
    expect(code(await createSection(teacher, input({ departmentId: other.departmentId })))).toBe('invalid');
    expect(code(await createSection(teacher, input({ termId: other.termId })))).toBe('invalid');
  });

  it('is refused to students, aides and heads', async () => {
    for (const role of ['student', 'aide', 'head'] as const) {
      expect(code(await createSection(await makeActor(school, role), input()))).toBe('forbidden');
    }
    expect(code(await createSection(null, input()))).toBe('unauthenticated');
  });

  it('leaves nothing behind when its last write fails', async () => {
    const maker = await makeActor(school, 'teacher');
    expect(await whileLogFails(() => createSection(maker, input()))).toBeInstanceOf(Error);
    expect(value(await listSections(maker, {}))).toEqual([]);
  });
});

describe('listSections and readSectionRoster', () => {
  it('show a teacher own sections alone, a head the department, an admin all', async () => {
    const elsewhere = await makeSchool();
    const own = await makeActor(elsewhere, 'teacher');
    const student = await makePerson(elsewhere, ['student']);
    const sectionId = await makeSection(elsewhere, {
      teacherIds: [own.personId],
      studentIds: [student.personId],
    });
    await makeSection(elsewhere, { teacherIds: [(await makeActor(elsewhere, 'teacher')).personId] });
    expect(value(await listSections(own, {})).map((row) => [row.sectionId, row.studentCount])).toEqual([
      [sectionId, 1],
    ]);
    expect(value(await listSections(await makeActor(elsewhere, 'head'), {}))).toHaveLength(2);
    expect(value(await listSections(await makeActor(elsewhere, 'admin'), {}))).toHaveLength(2);
    expect(code(await readSectionRoster(await makeActor(elsewhere, 'teacher'), { sectionId }))).toBe(
      'not_found',
    );
    expect(code(await readSectionRoster(teacher, { sectionId }))).toBe('not_found');
    expect(code(await readSectionRoster(await makeActor(elsewhere, 'head'), { sectionId }))).toBe(
      'forbidden',
    );
  });

  it('logs a look at a roster once an hour', async () => {
    const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
    const looks = async () => (await logOf(school)).filter(({ action }) => action === 'roster.read').length;
    const before = await looks();
    await readSectionRoster(teacher, { sectionId });
    await readSectionRoster(teacher, { sectionId });
    expect(await looks()).toBe(before + 1);
  });
});

describe('readSectionChoices', () => {
  it('offers the department that the person teaches in and the term that today lies in', async () => {
    expect(value(await readSectionChoices(teacher, {}))).toMatchObject({
      departments: [{ departmentId: school.departmentId }],
      currentTermId: school.termId,
    });
  });
});
